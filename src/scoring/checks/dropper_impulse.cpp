#include <algorithm>
#include <cmath>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"

namespace dropfront::scoring {

namespace {

/// The class's own impulse: 2.5 kV for X2 and 4 kV for X1 up to 1 uF, above that over the square root of the
/// microfarads (IEC 60384-14, as restated, copy not kept). X3 has none.
std::optional<double> class_impulse_V(const parts::Dropper& part) {
  const double up_to_1uF = part.class_name == "X2" ? 2500 : part.class_name == "X1" ? 4000 : 0;
  if (!(up_to_1uF > 0)) return std::nullopt;
  return up_to_1uF / std::sqrt(std::max(1.0, part.capacitance_F / 1e-6));
}

}  // namespace

std::optional<Check> dropper_impulse(Evidence& evidence) {
  if (!evidence.requirement().limits.surge || evidence.design().dropper == nullptr) return std::nullopt;
  const SurgeAnswer& surge = evidence.surge();
  const parts::Dropper& part = *evidence.design().dropper;
  const auto limit = part.impulse_V ? part.impulse_V : class_impulse_V(part);
  const char* basis = part.impulse_V ? "greatest voltage on the film in the surge; impulse rating"
                      : limit        ? "greatest voltage on the film in the surge; impulse of its class"
                                     : "impulse is not given, and the class has none";
  Check check =
      at_most("dropper.impulse", surge.dropper.dropper_peak_V, limit, "V", at_surge(surge.dropper), basis);
  check.figures = {{"capacitance_F", part.capacitance_F}};
  return surge.usable ? check : unsolved(check, surge.reason);
}

}  // namespace dropfront::scoring
