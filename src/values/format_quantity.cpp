#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <string>
#include <string_view>

#include "dropfront/values/number_text.hpp"
#include "dropfront/values/quantity.hpp"
#include "dropfront/values/year.hpp"

namespace dropfront::values {
namespace {

struct Shown {
  double divisor = 1;
  std::string label;
};

Shown prefixed(double size, std::string_view symbol) {
  struct Step {
    double from, divisor;
    const char* prefix;
  };
  static constexpr Step steps[] = {{1e9, 1e9, "G"},   {1e6, 1e6, "M"},   {1e3, 1e3, "k"}, {0.1, 1, ""},
                                   {1e-4, 1e-3, "m"}, {1e-7, 1e-6, "u"}, {0, 1e-9, "n"}};
  for (const Step& step : steps) {
    if (size >= step.from) return {step.divisor, step.prefix + std::string(symbol)};
  }
  return {1, std::string(symbol)};
}

Shown shown_as(double size, Unit unit) {
  switch (unit) {
    case Unit::volt:
      return prefixed(size, "V");
    case Unit::ampere:
      return prefixed(size, "A");
    case Unit::ohm:
      return prefixed(size, "ohm");
    case Unit::watt:
      return prefixed(size, "W");
    case Unit::joule:
      return prefixed(size, "J");
    case Unit::hertz:
      return prefixed(size, "Hz");
    case Unit::farad:
      // The trade writes 2200 uF, never 2.2 mF.
      if (size >= 1) return {1, "F"};
      if (size >= 1e-6) return {1e-6, "uF"};
      return size >= 1e-9 ? Shown{1e-9, "nF"} : Shown{1e-12, "pF"};
    case Unit::second:
      if (size >= kSecondsPerYear) return {kSecondsPerYear, "years"};
      if (size >= 7200) return {3600, "h"};
      return size >= 120 ? Shown{60, "min"} : prefixed(size, "s");
    case Unit::hour:
      return {1, "h"};
    case Unit::share:
      return {0.01, "%"};
    case Unit::degC:
      return {1, "°C"};
    case Unit::kelvin:
      return {1, "K"};
    case Unit::per_kelvin:
      return size >= 1e-3 ? Shown{0.01, "%/K"} : Shown{1e-6, "ppm/K"};
    case Unit::K_per_W:
      return {1, "K/W"};
    case Unit::V_per_s:
      if (size >= 1e5) return {1e6, "V/us"};
      return size >= 1e2 ? Shown{1e3, "V/ms"} : Shown{1, "V/s"};
    case Unit::A2s:
      return {1, "A2s"};
    case Unit::square_metre:
      return size >= 0.1 ? Shown{1, "m2"} : Shown{1e-6, "mm2"};
    case Unit::metre:
      return size >= 1 ? Shown{1, "m"} : Shown{1e-3, "mm"};
    case Unit::millimetre:
      return {1, "mm"};
    case Unit::degree:
      return {1, "deg"};
    case Unit::count:
      break;
  }
  return {};
}

/// Decimals that leave `significant` digits, never cutting digits before the point.
int decimals_for(double size, int significant) {
  if (!(size > 0)) return 0;
  return std::clamp(significant - 1 - static_cast<int>(std::floor(std::log10(size))), 0, 30);
}

}  // namespace

std::string format_quantity(double value, Unit unit, int significant) {
  if (std::isnan(value)) return "not a number";
  if (std::isinf(value)) return value > 0 ? "infinite" : "minus infinite";
  significant = std::clamp(significant, 1, 17);
  // The unit is chosen for the rounded size, so that 999.9 ohm is 1 kohm and not 1000 ohm.
  const double rounded = parse_number(fmt::format("{:.{}e}", std::fabs(value), significant - 1)).value_or(0);
  const Shown shown = shown_as(rounded > 0 ? rounded : 1, unit);
  std::string text =
      fmt::format("{:.{}f}", value / shown.divisor, decimals_for(rounded / shown.divisor, significant));
  if (text.find('.') != std::string::npos) {
    text.erase(text.find_last_not_of('0') + 1);
    if (text.back() == '.') text.pop_back();
  }
  if (text == "-0") text = "0";
  return shown.label.empty() ? text : text + ' ' + shown.label;
}

}  // namespace dropfront::values
