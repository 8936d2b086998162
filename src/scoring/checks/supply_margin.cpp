#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

std::optional<Check> supply_margin(Evidence& evidence) {
  const LeanAnswer& lean = evidence.lean();
  const At at = at_lean(lean, evidence.loads().heaviest_name);
  const double wanted = evidence.requirement().limits.current_margin * evidence.loads().heaviest_output_A();
  Check check = at_least("supply.margin", lean.margin_A, wanted, "A", at,
                         "at the output, end of life: available less Iq, leakage and rail loads, less "
                         "the heaviest sustained load and the mean of bursts");
  if (!lean.usable) return unsolved(check, lean.reason);
  check.figures = {{"required_rail_V", evidence.required_rail_V()},
                   {"available_rail_current_A", lean.available_A},
                   {"overhead_current_A", evidence.overhead_A(false)},
                   {"capability_A", lean.capability_A},
                   {"heaviest_load_A", evidence.loads().heaviest_output_A()},
                   {"wanted_share", evidence.requirement().limits.current_margin}};
  return check;
}

}  // namespace dropfront::scoring
