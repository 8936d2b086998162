#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

std::optional<Check> varistor_continuous(Evidence& evidence) {
  const parts::Varistor* part = evidence.design().varistor;
  if (part == nullptr) return std::nullopt;
  const double line_Vrms = evidence.supply().voltage_Vrms.high;
  return with(at_least("varistor.continuous", part->continuous_voltage_Vrms, line_Vrms, "V",
                       at_corner("rich_empty"), "continuous a.c. rating against the high line"),
              {{"line_voltage_Vrms", line_Vrms}});
}

}  // namespace dropfront::scoring
