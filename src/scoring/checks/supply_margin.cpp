#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

std::optional<Check> supply_margin(Evidence& evidence) {
  const LeanAnswer& lean = evidence.lean();
  const At at = at_lean(lean, evidence.loads().heaviest_name);
  const double wanted = evidence.requirement().limits.current_margin * evidence.loads().heaviest_output_A();
  const Check check = at_least("supply.margin", lean.margin_A, wanted, "A", at,
                               "at the output, end of life: available less Iq, leakage and rail loads, less "
                               "the heaviest sustained load and the mean of bursts");
  return lean.usable ? check : unsolved(check, lean.reason);
}

}  // namespace dropfront::scoring
