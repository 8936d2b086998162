#include <algorithm>
#include <cmath>

#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring::bounds {

namespace {

constexpr double kLeft = 0.9975;     // 1 - exp(-6): what three time constants dissipate
constexpr double kChainLeft = 0.98;  // the chain's current is a ten thousandth of the pulse's

/// Least energy per farad at the resistance `series_ohm`: what stands behind it is at most the clamp's
/// threshold and slope, so the pulse is at least that of R, slope and C from 2·Vcrest less the threshold and
/// what the line has fallen by after three time constants: ½·dV²·R/(R + slope).
double energy_per_F(const BoxQuestion& question, const CornerCharge& charge, double series_ohm) {
  const auto& ends = question.ends;
  const auto& line = question.supply.rich;
  const int diodes = question.full_wave() ? (question.ahead() ? 1 : 2) : (question.ahead() ? 0 : 1);
  const double behind_ohm = ends.greatest(Figure::clamp_ohm) + diodes * ends.greatest(Figure::drop_ohm);
  const double pulse_s = 3 * (series_ohm + behind_ohm) * ends.greatest(Figure::rich_F);
  if (!line.symmetric || !(pulse_s < 0.5 / line.frequency_Hz)) return 0;
  const double step_V = 2 * line.crest_V - 0.5 * line.bend_V_per_s2 * pulse_s * pulse_s -
                        ends.greatest(Figure::cold_clamp_V) - diodes * charge.drop_most_V;
  if (!(step_V > 0)) return 0;
  return kLeft * kChainLeft * 0.5 * step_V * step_V * series_ohm / (series_ohm + behind_ohm);
}

}  // namespace

/// Plug-in energy over the part's rating at the worse end. A wirewound part holds joules, so C is the least;
/// a film part's rating grows with the root of R·C, so the use grows with the root of C. Theorem.
double resistor_pulse(const BoxQuestion& question) {
  const auto& ends = question.ends;
  if (!ends.known_circuit()) return 0;
  const auto charge = question.charge(BoxCorner::rich);
  const double least_F = ends.least(Figure::rich_F);
  const auto greatest_F = [&](const parts::Dropper& part) {
    return std::max(dropper_F(part, End::high, false, question.context.ambient_low_degC()),
                    dropper_F(part, End::high, false, question.context.ambient_high_degC()));
  };
  const double film_share = question.least_over(question.box.droppers, [&](const parts::Dropper* part) {
    const double pulse_F = std::min(dropper_F(*part, End::high, false, ends.hottest_air_degC()),
                                    dropper_F(*part, End::high, false, question.context.ambient_high_degC()));
    return pulse_F / std::sqrt(greatest_F(*part));
  });
  return question.least_share(question.box.series_resistors, [&](const parts::Resistor* part) {
    if (!part->pulse_energy_J) return 0.0;
    double use = 0;
    for (const End end : {End::low, End::high}) {
      const double series_ohm = resistor_ohm(*part, end);
      const double per_F = energy_per_F(question, charge, series_ohm);
      const bool film = part->construction == parts::Construction::film;
      // Rating at one farad: the root of C is in film_share.
      const auto rating_J = pulse_energy_limit_J(*part, series_ohm, 1);
      use = std::max(use, per_F * (film ? film_share : least_F) / *rating_J);
    }
    return use;
  });
}

}  // namespace dropfront::scoring::bounds
