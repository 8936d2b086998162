#pragma once
#include <cstdint>
#include <vector>

#include "dropfront/search/space.hpp"

namespace dropfront::search {

/// How often evaluations with each option broke a check: a guess at whether one more will.
class OptionRecord {
 public:
  explicit OptionRecord(const Space& space) {
    for (const Slot& slot : space.slots) counts_.emplace_back(slot.size);
  }

  void note(const Choice& choice, bool broke) {
    for (std::size_t s = 0; s < choice.size(); ++s) {
      auto& count = counts_[s][choice[s]];
      ++(broke ? count.broke : count.held);
    }
  }

  /// Chance in (0, 1) that `choice` holds all checks, given that `parent` does: the product over the slots in
  /// which they differ, each option's share of designs that held with one of each kind added.
  double chance(const Choice& parent, const Choice& choice) const {
    double product = 1;
    for (std::size_t s = 0; s < choice.size(); ++s) {
      if (parent[s] == choice[s]) continue;
      const auto& count = counts_[s][choice[s]];
      product *= (count.held + 1.0) / (count.held + count.broke + 2.0);
    }
    return product;
  }

 private:
  struct Count {
    double held = 0, broke = 0;
  };
  std::vector<std::vector<Count>> counts_;
};

}  // namespace dropfront::search
