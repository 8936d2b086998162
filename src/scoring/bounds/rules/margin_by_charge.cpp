#include <algorithm>
#include <cmath>

#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/bounds/clamp_heat.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring::bounds {

namespace {

/// What the solver's own tolerances may leave above the truth.
constexpr double kSolved_A = 1e-7;
constexpr double kSolvedShare = 3e-6;

/// Greatest rail minimum a step-down stage can work at: the clamp's low curve at its peak current. A junction
/// warmed by current the stage leaves raises the rail by less than that current was worth while
/// tempco·V·Rth·I < 1; the forward direction of a clamp ahead warms it whatever the load.
double highest_rail_V(const BoxQuestion& question, double all_A) {
  const auto& ends = question.ends;
  const double peak_A = ends.peak_A();
  const double forward_W =
      question.ahead()
          ? all_A * (ends.greatest(Figure::drop_V) + 0.2 + ends.greatest(Figure::drop_ohm) * peak_A)
          : 0;
  return question.greatest_over(question.box.clamps, [&](const parts::Clamp* part) {
    const double least_ohm = zener_curve(*part, ZenerCurve::low_slope, 25).main.slope_ohm;
    const double most_ohm = std::max(least_ohm, part->slope_resistance_ohm);
    ClampHeat heat;
    heat.coolest_degC = question.context.ambient_low_degC();
    heat.air_degC = ends.hottest_air_degC() + part->thermal_resistance_K_per_W * forward_W;
    const double gain =
        part->temperature_coefficient_per_K * part->thermal_resistance_K_per_W * part->voltage_min_V * all_A;
    if (!(gain < 1)) heat.air_degC = kHottest_degC;
    return clamp_span(*part, part->voltage_min_V, most_ohm, least_ohm, heat).greatest_V + least_ohm * peak_A;
  });
}

/// No rail of a member stands higher: its clamp's low curve, warmed by all the charge there is, at its peak
/// current; behind a clamp of two zeners their forward drop as well.
double clamped_rail_V(const BoxQuestion& question, double all_A) {
  const auto& ends = question.ends;
  ClampHeat heat;
  heat.coolest_degC = question.context.ambient_low_degC();
  heat.air_degC = ends.hottest_air_degC();
  heat.mean_A = 2 * all_A;  // both ways
  heat.peak_A = ends.peak_A();
  heat.forward_V = ends.greatest(Figure::drop_V) + 0.2 + ends.greatest(Figure::drop_ohm) * ends.peak_A();
  return question.greatest_over(question.box.clamps, [&](const parts::Clamp* part) {
    const double least_ohm = zener_curve(*part, ZenerCurve::low_slope, 25).main.slope_ohm;
    const double most_ohm = std::max(least_ohm, part->slope_resistance_ohm);
    return clamp_span(*part, part->voltage_min_V, most_ohm, least_ohm, heat).greatest_V +
           least_ohm * heat.peak_A + heat.forward_V;
  });
}

/// Greatest v·(I - overhead) with I on a charge line and v between the required and the highest rail.
double greatest_W(const ChargeLine& line, double overhead_A, double least_V, double most_V) {
  const double turn_V = line.per_V > 0 ? 0.5 * (line.at_0_A - overhead_A) / line.per_V : most_V;
  const double rail_V = std::clamp(turn_V, least_V, std::max(least_V, most_V));
  return rail_V * (line.at_A(rail_V) - overhead_A);
}

}  // namespace

/// Charge balance (charge.hpp) at V_required, less the least the stage, the leakage and the rail's own loads
/// take; step-down: eta·max v·(I(v) - overhead)/(Vout·(1 + tol)) over v up to the clamp. Nothing where no
/// clamp lets the rail reach V_required. Worst over stages. Theorem.
std::optional<double> margin_by_charge(const BoxQuestion& question) {
  const auto& ends = question.ends;
  if (!ends.known_circuit()) return std::nullopt;
  const auto& loads = question.context.loads;
  const auto lines = charge_lines(question);
  const double beside_A = ends.least(Figure::leakage_A) + loads.heaviest_rail_A();
  const double all_A = std::max(lines[0].at_0_A, lines[1].at_0_A);
  const double most_V = highest_rail_V(question, all_A);
  const double clamped_V = clamped_rail_V(question, all_A);
  const double most_A = question.greatest_over(question.box.output_stages, [&](const auto* stage) {
    const double required_V =
        required_rail_V(*stage, question.context.requirement->output, loads).value_or(0);
    const double ceiling_A = charge_ceiling_A(question, required_V);
    const double overhead_A = beside_A + quiescent_A(*stage, Quiescent::data);
    if (clamped_V < required_V) return 0.0;
    if (stage->kind != parts::StageKind::step_down) return ceiling_A - overhead_A;
    double power_W = required_V * (ceiling_A - overhead_A);
    for (const auto& line : lines) {
      power_W = std::max(power_W, greatest_W(line, overhead_A, required_V, most_V));
    }
    const double efficiency = stage->efficiency.value_or(0);
    return efficiency * power_W / stage_output_V(*stage, End::high);
  });
  return most_A + kSolved_A + kSolvedShare * std::abs(most_A) - loads.heaviest_output_A();
}

}  // namespace dropfront::scoring::bounds
