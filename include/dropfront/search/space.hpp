#pragma once
#include <cstdint>
#include <string>
#include <vector>

namespace dropfront::search {

/// One slot of the problem: a list of options. `coordinate` (natural logarithm of the part's value) places
/// each option on the slot's continuous axis; a category slot (arrangement, output stage) has no axis and its
/// options are never mixed in a relaxation.
struct Slot {
  std::string name;
  int size = 0;
  bool category = false;
  std::vector<double> coordinate;  ///< size entries, or empty for category slots and slots of one option
  /// size entries, or empty: options of one group may share a box of the proof. Left empty, those of a
  /// category slot may not and all others may.
  std::vector<int> group;
};

/// A choice: one option index a slot.
using Choice = std::vector<std::int32_t>;

struct Space {
  std::vector<Slot> slots;
  /// Pairs of slots whose values act together; closing tries their two-part changes.
  std::vector<std::pair<int, int>> coupled;
  double size() const {
    double n = 1;
    for (const auto& s : slots) n *= s.size;
    return n;
  }
};

}  // namespace dropfront::search
