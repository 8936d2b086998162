#include "dropfront/scoring/bounds/charge.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/scoring/bounds/clamp_heat.hpp"
#include "dropfront/scoring/recipes.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring {

std::array<ChargeLine, 2> charge_lines(const BoxQuestion& question) {
  const auto& ends = question.ends;
  const auto& line = question.supply.lean;
  const double drop_V = ends.least(Figure::drop_V);
  const double chain_S = 1 / ends.least(Figure::chain_low_ohm);
  const double g = chain_S / line.omega;
  const double period_s = 1 / line.frequency_Hz;
  // The film's loss resistance carries tan(delta)·g of the chain's current on the capacitor.
  const double film_loss = 1 + ends.greatest(Figure::loss_tangent) * g / ends.least(Figure::lean_F);
  // What stands behind the dropper in reverse: a drop, or the rail with its drops. The rail is below the
  // hottest rich clamp; a fifth more covers a tempco that raises a low clamp in the cold.
  const double reverse_drop_V = ends.greatest(Figure::drop_V) + 0.2;  // 100 K below 25 degC
  const double behind_V = question.full_wave()
                              ? 1.2 * ends.greatest(Figure::rich_clamp_V) +
                                    ends.greatest(Figure::clamp_ohm) * ends.peak_A() + 2 * reverse_drop_V
                              : reverse_drop_V;
  // Without the tones: no more than the line's own positive half is on the chain, mean |v| <= r.m.s.
  const double simple_As =
      chain_S * period_s * (0.5 * line.voltage_Vrms + (question.full_wave() ? 0 : reverse_drop_V));
  const auto line_at = [&](double capacitance_F) {
    const double tones_As = 2 * line.fundamental_V * (std::hypot(capacitance_F, g) - capacitance_F) +
                            g * line.chain_tones_V + chain_S * period_s * behind_V;
    const double film_As_per_V =
        line.frequency_Hz * (question.full_wave() ? 2 : 1) * capacitance_F * film_loss;
    const double drops_V = (question.full_wave() ? 4 : 2) * drop_V;
    const double chain_A = line.frequency_Hz * (question.full_wave() ? 2 : 1) * std::min(simple_As, tones_As);
    return ChargeLine{film_As_per_V * (line.rises_V - drops_V) + chain_A,
                      film_As_per_V * (question.full_wave() ? 2 : 1)};
  };
  return {line_at(ends.greatest(Figure::lean_F)), line_at(ends.least(Figure::lean_F))};
}

double charge_ceiling_A(const BoxQuestion& question, double rail_V) {
  const auto lines = charge_lines(question);
  return std::max({0.0, lines[0].at_A(rail_V), lines[1].at_A(rail_V)});
}

namespace {

const Line& line_of(const BoxQuestion& question, BoxCorner corner) {
  return corner == BoxCorner::rich ? question.supply.rich : question.supply.standby;
}

/// Least clamp threshold asleep: the charge the rail does not draw passes the clamp and warms it.
double self_heated_least_V(const BoxQuestion& question, const CornerCharge& charge, double load_A) {
  const double share = question.ahead() && question.full_wave() ? 0.5 : 1.0;  // two parts take turns
  const double spare_A = share * std::max(0.0, charge.both_A - load_A);
  const double forward_A = question.ahead() ? (question.full_wave() ? spare_A : charge.each_way_A) : 0;
  return question.least_over(question.box.clamps, [&](const parts::Clamp* part) {
    return self_heated_V(*part, kStandby_degC - kSettled_K, spare_A, charge.drop_least_V * forward_A);
  });
}

}  // namespace

CornerCharge corner_charge(const BoxQuestion& question, BoxCorner corner) {
  const auto& ends = question.ends;
  const auto& line = line_of(question, corner);
  const bool rich = corner == BoxCorner::rich;
  const auto film = rich ? Figure::rich_F : Figure::new_F;
  const auto clamp = rich ? Figure::rich_clamp_V : Figure::new_clamp_V;
  const auto drop = rich ? Figure::least_drop_V : Figure::drop_V;
  const double peak_A = ends.peak_A();
  CornerCharge charge;
  charge.clamp_V = ends.least(clamp);
  charge.drop_least_V = ends.least(drop);
  charge.drop_most_V = ends.greatest(drop);
  const double drop_V = charge.drop_most_V + ends.greatest(Figure::drop_ohm) * peak_A;
  const int drops = question.full_wave() ? (question.ahead() ? 1 : 2) : (question.ahead() ? 0 : 1);
  charge.node_most_V = ends.greatest(clamp) + ends.greatest(Figure::clamp_ohm) * peak_A + drops * drop_V;
  charge.reverse_most_V = question.full_wave() ? charge.node_most_V : drop_V;
  if (!line.symmetric) return charge;
  const auto can = rich ? Figure::aged_can_F : Figure::new_can_F;
  const auto can_ohm = rich ? Figure::aged_can_ohm : Figure::new_can_ohm;
  const double chain_S = 1 / ends.least(Figure::chain_low_ohm);
  const double load_A = load_most_A(question, corner, 1);
  const double fall_V_per_s = load_A / ends.least(can);
  const auto each_way_A = [&](double capacitance_F) {
    const double resistance_ohm = ends.greatest(Figure::series_high_ohm) + ends.greatest(Figure::clamp_ohm) +
                                  ends.greatest(Figure::loss_tangent) / (line.omega * capacitance_F) +
                                  2 * ends.greatest(Figure::drop_ohm) + ends.greatest(can_ohm);
    const double lag_s = resistance_ohm * capacitance_F;
    const double lag_V = lag_s * (lag_s * line.bend_V_per_s2 + fall_V_per_s);
    const double swing_V = 2 * line.crest_V - 2 * lag_V - charge.node_most_V - charge.reverse_most_V;
    const double chain_As = chain_S * (charge.node_most_V / (2 * line.frequency_Hz) + line.crest_area_Vs);
    return line.frequency_Hz * (capacitance_F * swing_V - chain_As) / (1 + chain_S * resistance_ohm);
  };
  charge.each_way_A = std::max(0.0, std::min(each_way_A(ends.least(film)), each_way_A(ends.greatest(film))));
  charge.both_A = (question.full_wave() ? 2 : 1) * charge.each_way_A;
  if (!rich) charge.clamp_V = std::max(charge.clamp_V, self_heated_least_V(question, charge, load_A));
  return charge;
}

const CornerCharge& BoxQuestion::charge(BoxCorner corner) const {
  auto& known = charges_[corner == BoxCorner::rich ? 1 : 0];
  if (!known) known = corner_charge(*this, corner);
  return *known;
}

double load_most_A(const BoxQuestion& question, BoxCorner corner, double share) {
  const auto& loads = question.context.loads;
  const bool rich = corner == BoxCorner::rich;
  const double output_A = rich ? share * loads.heaviest_output_A() : loads.standby_A;
  const double stage_A = question.greatest_over(question.box.output_stages, [&](const auto* stage) {
    // Below V_required a step-down stage draws what it draws there.
    const double least_V = required_rail_V(*stage, question.context.requirement->output, loads).value_or(0);
    return stage_current_A(*stage, output_A, least_V, rich ? Quiescent::least : Quiescent::dropout,
                           rich ? End::high : End::low);
  });
  const double leakage_A = question.ends.greatest(Figure::leakage_A);
  if (!rich) return stage_A + leakage_A + loads.rail_A;
  return stage_A + std::max(1e-7, 0.1 * leakage_A) + loads.rail_A + share * loads.burst_mean_rail_A;
}

double rail_floor_V(const BoxQuestion& question, BoxCorner corner, const CornerCharge& charge,
                    double load_A) {
  if (!(charge.both_A > load_A)) return 0;
  const auto& ends = question.ends;
  const bool rich = corner == BoxCorner::rich;
  const double peak_A = ends.peak_A();
  double held_V = charge.clamp_V;
  if (question.ahead()) held_V -= charge.drop_most_V + 2 * ends.greatest(Figure::drop_ohm) * peak_A;
  const double can_ohm = ends.greatest(rich ? Figure::aged_can_ohm : Figure::new_can_ohm);
  const double can_F = ends.least(rich ? Figure::aged_can_F : Figure::new_can_F);
  const double floor_V =
      held_V - can_ohm * (peak_A + load_A) - load_A / (can_F * line_of(question, corner).frequency_Hz);
  return std::max(0.0, floor_V);
}

}  // namespace dropfront::scoring
