#include "dropfront/report/for_people.hpp"

#include <fmt/core.h>

#include <array>
#include <cmath>
#include <utility>

#include "dropfront/values/quantity.hpp"

namespace dropfront::report {

std::string with_unit(double value, std::string_view unit) {
  using values::Unit;
  static constexpr std::array<std::pair<std::string_view, Unit>, 11> kUnits{{{"V", Unit::volt},
                                                                             {"A", Unit::ampere},
                                                                             {"ohm", Unit::ohm},
                                                                             {"F", Unit::farad},
                                                                             {"W", Unit::watt},
                                                                             {"J", Unit::joule},
                                                                             {"s", Unit::second},
                                                                             {"Hz", Unit::hertz},
                                                                             {"degC", Unit::degC},
                                                                             {"K", Unit::kelvin},
                                                                             {"V/s", Unit::V_per_s}}};
  for (const auto& [name, kind] : kUnits)
    if (name == unit) return values::format_quantity(value, kind);
  const std::string number = values::format_quantity(value, Unit::count);
  return unit.empty() ? number : number + " " + std::string(unit);
}

std::string rounded(const std::optional<double>& value, int decimals) {
  if (!value) return "-";
  const std::string text = fmt::format("{:.{}f}", *value, decimals);
  // "-0.00" says a sign that rounding has taken the reason from.
  return text.find_first_not_of("-0.") == std::string::npos && text.front() == '-' ? text.substr(1) : text;
}

std::optional<double> thousandfold(const std::optional<double>& value) {
  if (!value) return std::nullopt;
  return 1000 * *value;
}

std::string times(int count) { return count > 1 ? std::to_string(count) + " x " : std::string(); }

std::string percent(const std::optional<double>& share) {
  if (!share) return "-";
  const double value = 100 * *share;
  return rounded(value, std::abs(value) < 9.95 ? 1 : 0) + " %";
}

std::string counted(double count) {
  if (!(std::abs(count) < 1e15)) return fmt::format("{:.2g}", count);
  std::string text = fmt::format("{:.0f}", count);
  const int first = text.front() == '-' ? 1 : 0;
  for (int at = static_cast<int>(text.size()) - 3; at > first; at -= 3)
    text.insert(static_cast<std::size_t>(at), 1, ',');
  return text;
}

std::optional<double> cost_units(const scoring::Objectives& objectives) {
  if (!objectives.cost_micro) return std::nullopt;
  return static_cast<double>(*objectives.cost_micro) / 1e6;
}

std::optional<double> area_mm2(const scoring::Objectives& objectives) {
  if (!objectives.board_area_um2) return std::nullopt;
  return static_cast<double>(*objectives.board_area_um2) / 1e6;
}

std::string_view verdict_name(scoring::Verdict verdict) {
  switch (verdict) {
    case scoring::Verdict::compliant:
      return "compliant";
    case scoring::Verdict::breaks_limits:
      return "breaks limits";
    case scoring::Verdict::undefined:
      break;
  }
  return "undefined";
}

}  // namespace dropfront::report
