#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

/// Fuses of 250 V are made for mains of 230 V with their tolerance, those of 125 V for 120 V: the nominal
/// line counts (common practice).
std::optional<Check> fuse_voltage(Evidence& evidence) {
  const parts::Fuse* fuse = evidence.design().fuse;
  if (fuse == nullptr) return std::nullopt;
  const double line_Vrms = evidence.supply().voltage_Vrms.nominal;
  return with(at_most("fuse.voltage", line_Vrms, fuse->rated_voltage_Vrms, "V", at_corner("shorted"),
                      "the nominal line stands across an opened fuse (common practice); rated voltage"),
              {{"line_voltage_Vrms", line_Vrms}});
}

}  // namespace dropfront::scoring
