#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

/// Leakage is already taken from the margin; this says how far it could rise (after long storage it is many
/// times the data figure) before the lean corner starves. A step-down's margin at the output is carried to
/// the rail at the clamp's greatest voltage, which is the least current it can stand for.
std::optional<Check> reservoir_leakage(Evidence& evidence) {
  const LeanAnswer& lean = evidence.lean();
  const Design& design = evidence.design();
  const parts::OutputStage& stage = *design.output_stage;
  double spare = lean.margin_A;
  if (stage.kind == parts::StageKind::step_down)
    spare *= stage.output_voltage_V / (stage.efficiency.value_or(1) * design.clamp->voltage_max_V);
  const At at = at_lean(lean, evidence.loads().heaviest_name);
  const double leakage = design.reservoir->leakage_A;
  Check check = at_most("reservoir.leakage", leakage, leakage + spare, "A", at,
                        "data leakage against what the lean corner can spare for it");
  check.figures = {{"current_margin_A", lean.margin_A}, {"spare_rail_current_A", spare}};
  return lean.usable ? check : unsolved(check, lean.reason);
}

}  // namespace dropfront::scoring
