#pragma once
#include <array>
#include <cstdint>
#include <optional>
#include <vector>

#include "dropfront/search/box.hpp"

namespace dropfront::search {

/// Numbers of designs, one a BoundKind.
using ByKind = std::array<double, 3>;

/// The certificate of a front: what became of every design of the space. Counts are doubles, exact below
/// 2^53.
///
/// space = reduced + broken + undefined + dominated + scored + left, each over all kinds and checks.
struct Proof {
  bool complete = false;    ///< nothing is left: the front is the front of the space
  bool enumerated = false;  ///< every design was looked at one by one; no boxes were made
  double space = 0;
  ByKind reduced{};             ///< replaced at no loss by another design with one part changed
  std::vector<ByKind> broken;   ///< discarded because they break a limit, one entry a check name
  double undefined = 0;         ///< discarded because a figure is not given
  ByKind dominated{};           ///< discarded because the front dominates what they could be at best
  double scored = 0;            ///< evaluated one by one, by the search before or by the proof
  double left = 0;              ///< in boxes still open
  std::int64_t boxes = 0;       ///< boxes bounded
  std::int64_t open_boxes = 0;  ///< and still open
  /// The least value of each objective that an open box could still hold; -infinity: not known. Empty when
  /// none is open.
  std::vector<double> open_bounds;

  /// Everything but `left`.
  double settled() const;
  /// The weakest kind of reasoning that discarded anything.
  BoundKind weakest() const;
};

}  // namespace dropfront::search
