#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring {

/// While the rail rises it takes the start load and what the stage itself takes below its regulation point;
/// the line must deliver more than that at the highest rail where it still matters: a step-down's turn-on
/// threshold (below it the stage is off), V_required for the others. input_on > P/(efficiency·(Id - Iq)) is
/// the same comparison as Id > P/(efficiency·input_on) + Iq.
std::optional<Check> supply_start(Evidence& evidence) {
  const parts::OutputStage& stage = *evidence.design().output_stage;
  const bool step_down = stage.kind == parts::StageKind::step_down;
  const At at = at_lean(evidence.lean(), "start load");
  if (step_down && !stage.input_on_V) {
    return at_least("supply.start", std::nullopt, std::nullopt, "A", at,
                    "start not shown: input_on is not given");
  }
  const double rail_V = step_down ? *stage.input_on_V : evidence.required_rail_V();
  const std::optional<double> delivered = evidence.lean_current_at_A(rail_V);
  const double taken =
      stage_current_A(stage, evidence.requirement().output.start_load_A, rail_V, Quiescent::least) +
      evidence.overhead_A(true);
  Check check = at_least("supply.start", delivered, taken, "A", at,
                         step_down ? "rail current at the turn-on threshold against P/(efficiency·V) + "
                                     "Iq, leakage and rail loads"
                                   : "rail current at V_required against the start load, Iq in "
                                     "dropout, leakage and rail loads");
  check.figures = {{"starting_rail_V", rail_V},
                   {"start_load_A", evidence.requirement().output.start_load_A},
                   {"overhead_current_A", evidence.overhead_A(true)}};
  if (step_down) add_figure(check, "efficiency", stage.efficiency);
  return delivered ? check : unsolved(check, "available current at the starting rail not found");
}

}  // namespace dropfront::scoring
