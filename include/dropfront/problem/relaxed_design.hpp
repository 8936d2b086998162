#pragma once
#include <optional>

#include "dropfront/problem/ladder.hpp"
#include "dropfront/problem/slot_space.hpp"
#include "dropfront/problem/stress.hpp"

namespace dropfront::problem {

/// Parts made for one relaxed design; the design points into it.
struct RelaxedParts {
  parts::Dropper dropper;
  parts::Resistor series_resistor;
  parts::Clamp clamp;
  parts::Reservoir reservoir;
  parts::Resistor discharge;
};

/// Makes designs whose parts lie between the offered ones.
class RelaxedDesigns {
 public:
  RelaxedDesigns(const Problem& problem, const SlotSpace& slots);

  /// Positions: one a slot with coordinates, in slot order, clamped to [0, 1]. Slots without an axis and no
  /// category (rectifier, fuse, ...) take their first option. Positions beyond the greatest chain, half way
  /// to an empty discharge slot and further, leave that slot empty. `parts` must outlive the design.
  scoring::Design make(const search::Choice& categories, const std::vector<double>& position,
                       RelaxedParts& parts) const;
  /// Line current, no series element but the dropper (or the resistor that stands in for it) taken in.
  double current_Arms(const scoring::Design& design) const;

 private:
  double position_of(SlotId id, const std::vector<double>& position) const;
  void make_chain(double position, RelaxedParts& parts, scoring::Design& design) const;

  struct Total {
    double ohm;
    Offers::Chain chain;
  };

  const Problem& problem_;
  const SlotSpace& slots_;
  Stress stress_;
  Ladder<parts::Dropper> droppers_;
  Ladder<parts::Resistor> series_resistors_;
  Ladder<parts::Clamp> clamps_;
  Ladder<parts::Reservoir> reservoirs_;
  std::vector<Total> totals_;  ///< chains by total resistance, then price
  bool chain_optional_ = false;
};

}  // namespace dropfront::problem
