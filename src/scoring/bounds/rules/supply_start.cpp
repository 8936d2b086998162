#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring::bounds {

/// What a stage takes while it starts, with the least leakage of the list, over what charge balance can
/// deliver at the rail that decides. No input_on: nothing is shown. Theorem.
double supply_start(const BoxQuestion& question) {
  constexpr double kSolved_A = 1e-7;  // the solver's own tolerance
  constexpr double kSolvedShare = 3e-6;
  if (!question.ends.known_circuit()) return 0;
  const auto& need = question.context.requirement->output;
  const auto& loads = question.context.loads;
  const double beside_A = question.ends.least(Figure::leakage_A) + loads.heaviest_rail_A();
  return question.least_share(question.box.output_stages, [&](const parts::OutputStage* stage) {
    const bool step_down = stage->kind == parts::StageKind::step_down;
    if (step_down && !stage->input_on_V) return 0.0;
    const double rail_V = step_down ? *stage->input_on_V : required_rail_V(*stage, need, loads).value_or(0);
    const double taken_A = stage_current_A(*stage, need.start_load_A, rail_V, Quiescent::least) +
                           quiescent_A(*stage, Quiescent::dropout) + beside_A;
    return taken_A / (charge_ceiling_A(question, rail_V) * (1 + kSolvedShare) + kSolved_A);
  });
}

}  // namespace dropfront::scoring::bounds
