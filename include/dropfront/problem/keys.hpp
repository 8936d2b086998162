#pragma once
#include <string>
#include <string_view>
#include <vector>

namespace dropfront::problem {

/// The keys one kind of object takes. The reader refuses all others; the JSON Schemas in docs/ name the same.
struct KeySet {
  std::string_view object;  ///< what a message calls it; also the name of its schema definition
  std::vector<std::string> required;
  std::vector<std::string> optional;

  bool knows(std::string_view key) const;
  std::vector<std::string> all() const;
};

namespace keys {
extern const KeySet problem, supply, spread, harmonic, output, load, surroundings, ambient, connection,
    limits, discharge_rule, surge, dip, derating, slots, resolution, range, design;
/// Slot options by slot name; null for an unknown slot.
const KeySet* slot(std::string_view name);
/// Every set above, slots included.
const std::vector<const KeySet*>& every();
}  // namespace keys

/// "a, b or c".
std::string either(const std::vector<std::string>& words);

}  // namespace dropfront::problem
