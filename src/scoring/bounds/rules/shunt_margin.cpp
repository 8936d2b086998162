#include <algorithm>
#include <cmath>

#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring::bounds {

namespace {

constexpr double kSolved_A = 1e-7;  // what the solver's own tolerances may leave above the truth
constexpr double kSolvedShare = 3e-6;

/// Behind a bridge the thyristor, not the rail, stands against the film at the end of the stroke before, so
/// the film's rise loses the rail once and not twice. Half-wave is as ever.
double ceiling_A(const BoxQuestion& question, double rail_V) {
  double most_A = 0;
  for (const auto& line : charge_lines(question)) {
    most_A = std::max(most_A, line.at_0_A - line.per_V * rail_V * (question.full_wave() ? 0.5 : 1));
  }
  return most_A;
}

/// No rail of a member stands higher: the greatest trigger zener, a quarter for its warmth, the gate's own
/// volt and trigger current, and the reservoir's resistance at the peak.
double highest_rail_V(const BoxQuestion& question) {
  const auto& ends = question.ends;
  const double trigger_A = question.box.thyristors.front()->trigger_current_A.value_or(0);
  const auto& gate = *question.box.gate_resistors.front();
  const double zener_V = question.greatest_over(question.box.clamps,
                                                [](const parts::Clamp* part) { return part->voltage_max_V; });
  return 1.25 * zener_V + 1 +
         trigger_A * (gate.resistance_ohm * (1 + gate.tolerance) + ends.greatest(Figure::clamp_ohm)) +
         ends.greatest(Figure::aged_can_ohm) * ends.peak_A();
}

}  // namespace

/// Charge balance at V_required, less the least that stage, leakage and rail loads take; step-down:
/// eta·max v·(I(v) - overhead)/Vout, on each ninth of the range of v at most its upper voltage times its
/// lower end's current. Worst over stages. Theorem.
std::optional<double> shunt_margin(const BoxQuestion& question) {
  const auto& ends = question.ends;
  if (!ends.known_shunt()) return std::nullopt;
  const auto& loads = question.context.loads;
  const double beside_A = ends.least(Figure::leakage_A) + loads.heaviest_rail_A();
  const double highest_V = highest_rail_V(question);
  const double most_A = question.greatest_over(question.box.output_stages, [&](const auto* stage) {
    const double required_V =
        required_rail_V(*stage, question.context.requirement->output, loads).value_or(0);
    const double overhead_A = beside_A + quiescent_A(*stage, Quiescent::data);
    if (stage->kind != parts::StageKind::step_down) return ceiling_A(question, required_V) - overhead_A;
    double power_W = 0;
    for (int k = 0; k < 9; ++k) {
      const double step_V = std::max(0.0, highest_V - required_V) / 9;
      const double low_V = required_V + k * step_V;
      power_W = std::max(power_W, (low_V + step_V) * (ceiling_A(question, low_V) - overhead_A));
    }
    return stage->efficiency.value_or(0) * power_W / stage_output_V(*stage, End::high);
  });
  return most_A + kSolved_A + kSolvedShare * std::abs(most_A) - loads.heaviest_output_A();
}

}  // namespace dropfront::scoring::bounds
