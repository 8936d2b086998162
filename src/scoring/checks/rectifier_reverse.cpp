#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

/// With the clamp open a half-wave supply doubles: rail at +Vcrest against the node at -Vcrest. A bridge
/// stops at the crest.
std::optional<Check> rectifier_reverse(Evidence& evidence) {
  const Design& design = evidence.design();
  const double crest = evidence.shapes().rich.crest_V();
  const bool bridge = design.arrangement->full_wave;
  return with(at_most("rectifier.reverse", bridge ? crest : 2 * crest, design.rectifier->reverse_voltage_V,
                      "V", at_corner("fault"), bridge ? "clamp open: Vcrest" : "clamp open: 2·Vcrest"),
              {{"line_crest_V", crest}});
}

}  // namespace dropfront::scoring
