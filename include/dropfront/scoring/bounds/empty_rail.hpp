#pragma once
#include "dropfront/scoring/bounds/charge.hpp"

namespace dropfront::scoring {

/// Least of the greatest rail a rich, unloaded member reaches (rail_greatest_V). The clamp must conduct once
/// a period while the least charge exceeds what the empty rail draws; then the rail stands at its threshold,
/// ahead: what the diodes on the way carry below it, their thresholds being counted in. `clamp_V`: least
/// threshold. 0 where that is not shown. Theorem.
double empty_rail_V(const BoxQuestion& question, const CornerCharge& charge, double clamp_V);

/// First moment of a plug-in: the line at its crest, the film at the opposite one, the reservoir full.
struct FirstMoment {
  double line_A = 0;  ///< no member's low-ended series resistor carries less
  double rail_V = 0;  ///< nor stands a rail of reservoirs of this ESR lower
};
/// Line current (2·Vcrest - V0 - k·Vd)/(Rs + slope + k·rd), k the diodes on the way to the clamp; of it the
/// reservoir, standing at p, takes i = (slope·I - (p + drops - clamp))/(slope + drops + ESR), and the rail is
/// p + ESR·i: least with the least ESR, slope and p. Symmetric waveforms only, else 0. Theorem.
FirstMoment first_moment(const BoxQuestion& question, const CornerCharge& charge, double clamp_V,
                         double esr_ohm);

}  // namespace dropfront::scoring
