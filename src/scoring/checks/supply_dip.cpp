#include <fmt/format.h>

#include <string>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/lean_event.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/dips.hpp"

namespace dropfront::scoring {

std::optional<Check> supply_dip(Evidence& evidence) {
  if (evidence.requirement().limits.dips.empty()) return std::nullopt;
  const DipAnswer& answer = evidence.dip();
  const EventAnswer& worst = answer.worst;
  std::string basis = fmt::format(
      "least rail over a dip to {:g} % for {:g} cycles, {}, and the recovery, at its worst mains phase, from "
      "the lean steady state at the heaviest load: the line at its low end, harder than the rated voltage of "
      "an IEC 61000-4-11 test",
      100 * answer.dip.residual, answer.dip.cycles,
      answer.source == DipSource::open_line ? "the line opened" : "the generator at no impedance");
  if (!worst.recovers) basis += "; the rail does not recover from it";
  Check check = at_least("supply.dip", worst.rail_min_V, evidence.required_rail_V(), "V",
                         at_event(evidence, worst, evidence.loads().heaviest_name), std::move(basis));
  check.figures = {{"steady_rail_min_V", worst.steady_min_V},
                   {"required_rail_V", evidence.required_rail_V()},
                   {"residual_share", answer.dip.residual},
                   {"cycles", answer.dip.cycles}};
  return worst.usable ? check : unsolved(check, worst.reason);
}

}  // namespace dropfront::scoring
