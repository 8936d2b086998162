#include "dropfront/scoring/bounds/empty_rail.hpp"

#include <algorithm>

namespace dropfront::scoring {

double empty_rail_V(const BoxQuestion& question, const CornerCharge& charge, double clamp_V) {
  if (!(charge.both_A > load_most_A(question, BoxCorner::rich, 0))) return 0;
  if (!question.ahead()) return clamp_V;
  const double slope_V = question.ends.greatest(Figure::drop_ohm) * question.ends.peak_A();
  // Back to back, one more threshold stands in the clamp's path, and an idle diode's 0.3 V is counted in.
  if (question.full_wave()) return clamp_V + charge.drop_least_V + 0.3 - 2 * slope_V;
  return clamp_V - slope_V;
}

FirstMoment first_moment(const BoxQuestion& question, const CornerCharge& charge, double clamp_V,
                         double esr_ohm) {
  FirstMoment first;
  const auto& ends = question.ends;
  const auto& line = question.supply.rich;
  if (!line.symmetric) return first;
  const double slope_ohm = ends.greatest(Figure::clamp_ohm);
  const double drop_ohm = ends.greatest(Figure::drop_ohm);
  const int diodes = question.full_wave() ? (question.ahead() ? 1 : 2) : (question.ahead() ? 0 : 1);
  const double clamp_most_V = ends.greatest(Figure::cold_clamp_V) + diodes * charge.drop_most_V;
  first.line_A = std::max(0.0, 2 * line.crest_V - clamp_most_V) /
                 (ends.greatest(Figure::series_low_ohm) + slope_ohm + diodes * drop_ohm);
  const double full_V = empty_rail_V(question, charge, clamp_V);
  if (!(full_V > 0)) return first;
  // From the clamp's own terminals on to the rail.
  const int onward = question.ahead() ? (question.full_wave() ? 2 : 1) : 0;
  const double in_clamp_V = question.ahead() && question.full_wave() ? charge.drop_most_V : 0;
  const double least_slope_ohm = ends.least(Figure::clamp_ohm);
  const double reach_V = least_slope_ohm * first.line_A -
                         std::max(0.0, full_V - clamp_V - in_clamp_V + onward * charge.drop_most_V);
  const double into_A = reach_V / (least_slope_ohm + onward * drop_ohm + esr_ohm);
  first.rail_V = full_V + esr_ohm * std::max(0.0, into_A);
  return first;
}

}  // namespace dropfront::scoring
