#pragma once
#include <cstdint>
#include <vector>

#include "dropfront/problem/slot_space.hpp"
#include "dropfront/search/box.hpp"

namespace dropfront::problem {

/// Cost and area of designs together. Both are sums over slots, and cheap parts tend to be large: the least
/// cost and the least area of a box hardly ever belong to one member. Every member costs and covers at least
/// as much as one of the box's steps.
class CostArea {
 public:
  struct Step {
    std::int64_t cost_micro = 0, area_um2 = 0;
  };

  /// `problem` must outlive it.
  CostArea(const Problem& problem, const SlotSpace& slots);

  /// Ascending in cost, descending in area; at most kMostSteps (the rest drawn together, each step then
  /// below those it stands for). Empty: a price or size is not given, nothing is known.
  std::vector<Step> steps(const search::Box& box) const;

  static constexpr std::size_t kMostSteps = 48;

 private:
  /// What an option adds to the design of first options of one arrangement.
  struct Part {
    bool known = false;
    Step adds;
  };
  struct Wiring {
    bool known = false;
    Step base;
    std::vector<std::vector<Part>> parts;  ///< slot, option
  };
  Wiring wiring(const Problem& problem, const SlotSpace& slots, std::int32_t arrangement) const;

  int arrangement_slot_ = -1;
  std::vector<Wiring> wirings_;  ///< by arrangement option
};

}  // namespace dropfront::problem
