#pragma once
#include <vector>

#include "dropfront/problem/problem.hpp"
#include "dropfront/search/space.hpp"

namespace dropfront::problem {

enum class SlotId {
  arrangement,
  output_stage,
  dropper,
  series_resistor,
  clamp,
  reservoir,
  discharge,
  rectifier,
  varistor,
  fuse,
  ceramic
};

/// The offers as the search sees them (an arrangement's own thyristor and gate resistor come with it): slots
/// that offer something, in the order of SlotId. Coordinates are natural logarithms of capacitance,
/// resistance, voltage, and of the chain's total resistance; an empty discharge slot stands a factor e above
/// the greatest chain. Output stages are grouped by kind.
struct SlotSpace {
  search::Space space;
  std::vector<SlotId> ids;  ///< one a slot of the space
};

SlotSpace make_space(const Offers& offers);

/// The design of one choice (one option index a slot of the space).
scoring::Design design_of(const Offers& offers, const std::vector<SlotId>& ids, const search::Choice& choice);

}  // namespace dropfront::problem
