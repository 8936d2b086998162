#include "dropfront/scoring/bounds/empty_rail.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring::bounds {

/// The rail at the first moment of a plug-in (empty_rail.hpp), hot or cold, over the surge voltage of the
/// same reservoir or the best input_max, whichever is broken further. Ratings not given count as unlimited.
/// Theorem.
double rail_transient(const BoxQuestion& question) {
  const auto& ends = question.ends;
  if (!ends.known_circuit()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  const double cold_degC =
      question.context.ambient_low_degC() + ends.hottest_air_degC() - question.context.ambient_high_degC();
  const bool two_ambients = question.context.ambient_low_degC() != question.context.ambient_high_degC();
  const double input_most_V =
      question.greatest_over(question.box.output_stages, [](const parts::OutputStage* stage) {
        const bool rated = has_input_rating(*stage) && stage->input_max_V;
        return rated ? *stage->input_max_V : std::numeric_limits<double>::infinity();
      });
  return question.least_share(question.box.reservoirs, [&](const parts::Reservoir* part) {
    const double hot_ohm = reservoir_greatest_esr_ohm(*part, true, ends.hottest_air_degC());
    double rail_V = first_moment(question, charge, charge.clamp_V, hot_ohm).rail_V;
    if (two_ambients) {
      const double cold_ohm = reservoir_greatest_esr_ohm(*part, true, cold_degC);
      const double cold_V = ends.least(Figure::cold_clamp_V);
      rail_V = std::max(rail_V, first_moment(question, charge, cold_V, cold_ohm).rail_V);
    }
    const double can_use = part->surge_voltage_V ? rail_V / *part->surge_voltage_V : 0;
    return std::max(can_use, rail_V / input_most_V);
  });
}

}  // namespace dropfront::scoring::bounds
