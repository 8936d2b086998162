#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring::bounds {

/// 2·Vcrest/(Rs·C) over the rating: Rs the greatest low end of the list, C and rating of one dropper.
/// Theorem.
double dropper_slew(const BoxQuestion& question) {
  if (!question.ends.known_circuit() && !question.ends.known_shunt()) return 0;
  const double series_ohm = question.ends.greatest(Figure::series_low_ohm);
  const double step_V = 2 * question.supply.rich.crest_V;
  const double hot_degC = question.context.ambient_high_degC();
  return question.least_share(question.box.droppers, [&](const parts::Dropper* part) {
    if (!part->slew_V_per_s) return 0.0;
    return step_V / (series_ohm * dropper_F(*part, End::low, true, hot_degC)) / *part->slew_V_per_s;
  });
}

}  // namespace dropfront::scoring::bounds
