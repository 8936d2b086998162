#include "dropfront/scoring/bounds/fundamental.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace dropfront::scoring {

Fundamental fundamental(const BoxQuestion& question, BoxCorner corner, const CornerCharge& charge,
                        double series_ohm) {
  const auto& ends = question.ends;
  const bool rich = corner == BoxCorner::rich;
  const Line& line = rich ? question.supply.rich : question.supply.standby;
  const double C = ends.least(rich ? Figure::rich_F : Figure::new_F);
  const double C_most = ends.greatest(rich ? Figure::rich_F : Figure::new_F);
  const double tan_most = ends.greatest(Figure::loss_tangent);
  const double B = line.omega * C / (1 + tan_most * tan_most);
  const double chain_least_S = 1 / ends.greatest(Figure::chain_low_ohm);
  const double chain_most_S = 1 / ends.least(Figure::chain_low_ohm);
  const double tan_least = ends.least(Figure::loss_tangent);
  const double G = chain_least_S + line.omega * C * tan_least / (1 + tan_least * tan_least);
  const double G_most = chain_most_S + line.omega * C_most * tan_most;
  Fundamental answer;
  if (!(ends.greatest(Figure::series_high_ohm) * line.omega * C_most < 1)) return answer;
  const double behind_V = 2 / std::numbers::pi * (charge.node_most_V + charge.reverse_most_V);
  const double left_V = std::max(0.0, line.fundamental_V - behind_V);
  const double g = 1 + series_ohm * G;
  const double b = series_ohm * B;
  answer.least_loss_W = 0.5 * left_V * left_V * (G * g + b * B) / (g * g + b * b);
  const double g_most = 1 + series_ohm * G_most;
  const double divider = 1 / std::sqrt(g_most * g_most + b * b);
  answer.line_Arms = left_V * B * divider / std::numbers::sqrt2;
  const double b_most = series_ohm * line.omega * C_most;
  answer.chain_Vrms = left_V / std::numbers::sqrt2 / std::sqrt(g_most * g_most + b_most * b_most);
  return answer;
}

}  // namespace dropfront::scoring
