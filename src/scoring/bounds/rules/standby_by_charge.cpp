#include <algorithm>
#include <cmath>

#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/bounds/fundamental.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Two losses no clamped member escapes. On the mains side, what the fundamental leaves in series resistor,
/// film and chain: ½·(A1 - behind)²·Re 1/Z (fundamental.hpp). Behind the dropper the current of each
/// direction meets at least the least voltage there: half-wave (v + Vd)·I, bridge 2·v·I, I the least charge
/// and v the least rail with its drops, or the clamp's threshold where that is ahead. Theorem.
std::optional<double> standby_by_charge(const BoxQuestion& question) {
  const auto& ends = question.ends;
  if (!ends.known_circuit()) return std::nullopt;
  const auto charge = question.charge(BoxCorner::standby);
  const double drop_V = charge.drop_least_V;
  const double floor_V =
      rail_floor_V(question, BoxCorner::standby, charge, load_most_A(question, BoxCorner::standby, 1));
  const double behind_W = [&] {
    if (question.full_wave()) {
      const double rail_V = floor_V + 2 * drop_V;
      const double node_V = question.ahead() ? std::min(rail_V, charge.clamp_V + drop_V) : rail_V;
      return 2 * charge.each_way_A * node_V;
    }
    const double node_V = question.ahead() ? std::min(floor_V + drop_V, charge.clamp_V) : floor_V + drop_V;
    return charge.each_way_A * (node_V + drop_V);
  }();
  const double series_ohm = ends.least(Figure::series_high_ohm);
  return std::max(0.0, behind_W) + fundamental(question, BoxCorner::standby, charge, series_ohm).least_loss_W;
}

}  // namespace dropfront::scoring::bounds
