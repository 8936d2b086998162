#include "dropfront/parts/clamp.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/parts/defaults.hpp"
#include "dropfront/parts/read_part.hpp"

namespace dropfront::parts {
namespace {

using values::Unit;

double greater_side(const Clamp& part) {
  return std::max(1 - part.voltage_min_V / part.voltage_V, part.voltage_max_V / part.voltage_V - 1);
}

Rating tolerance_from_bounds(const Clamp& part) { return greater_side(part); }
Rating least_voltage(const Clamp& part) { return part.voltage_V * (1 - part.tolerance); }
Rating greatest_voltage(const Clamp& part) { return part.voltage_V * (1 + part.tolerance); }
Rating default_slope_min(const Clamp& part) { return part.slope_resistance_ohm / 10; }

Rating default_temperature_coefficient(const Clamp& part) {
  return zener_temperature_coefficient_per_K(part.voltage_V);
}

Rating default_thermal_resistance(const Clamp& part) {
  if (!part.rated_power_W) return std::nullopt;
  return std::max(0.0, part.max_junction_degC - 50) / *part.rated_power_W;
}

Field<Clamp> tolerance_field() {
  Field<Clamp> field = required("tolerance", Unit::share, &Clamp::tolerance, below_1);
  field.column.unless = {"voltage_min", "voltage_max"};
  field.rule = tolerance_from_bounds;
  return field;
}

}  // namespace

template <>
const std::vector<Field<Clamp>>& fields_of<Clamp>() {
  static const std::vector<Field<Clamp>> fields = {
      required("voltage", Unit::volt, &Clamp::voltage_V, above_0(1e5)),
      tolerance_field(),
      property("voltage_min", Unit::volt, &Clamp::voltage_min_V, above_0(1e5), "voltage·(1 - tolerance)",
               "a symmetric tolerance", least_voltage),
      property("voltage_max", Unit::volt, &Clamp::voltage_max_V, above_0(1e5), "voltage·(1 + tolerance)",
               "a symmetric tolerance", greatest_voltage),
      required("test_current", Unit::ampere, &Clamp::test_current_A, above_0(1e3)),
      required("slope_resistance", Unit::ohm, &Clamp::slope_resistance_ohm, above_0(1e6)),
      property("slope_min", Unit::ohm, &Clamp::slope_min_ohm, above_0(1e6), "slope_resistance/10",
               "typical parts lie far below the data maximum", default_slope_min),
      rating("knee_current", Unit::ampere, &Clamp::knee_current_A, above_0(1e3)),
      rating("knee_resistance", Unit::ohm, &Clamp::knee_resistance_ohm, above_0(1e7)),
      rating("rated_power", Unit::watt, &Clamp::rated_power_W, above_0(1e6)),
      rating("pulse_power", Unit::watt, &Clamp::pulse_power_W, above_0(1e9)),
      rating("pulse_time", Unit::second, &Clamp::pulse_time_s, above_0(1e3)),
      property("temperature_coefficient", Unit::per_kelvin, &Clamp::temperature_coefficient_per_K,
               {-0.01, 0.01}, "by voltage",
               "typical values of 1N957..1N978 from 6.8 V, middles of the 1N47xxA ranges below",
               default_temperature_coefficient),
      property("max_junction", Unit::degC, &Clamp::max_junction_degC, temperatures_degC, "150 °C",
               "the least usual rating of silicon"),
      property("thermal_resistance", Unit::K_per_W, &Clamp::thermal_resistance_K_per_W, above_0(1e6),
               "(max_junction - 50 °C)/rated_power", "full power at 50 °C ambient, the family's usual point",
               default_thermal_resistance),
  };
  return fields;
}

template <>
std::optional<Contradiction> contradiction_in(const Clamp& part) {
  if (!(part.voltage_min_V <= part.voltage_V)) {
    return Contradiction{"voltage_min", "voltage_min is greater than voltage"};
  }
  if (!(part.voltage_V <= part.voltage_max_V)) {
    return Contradiction{"voltage_max", "voltage_max is less than voltage"};
  }
  // Data sheets round both, so a difference below a tenth of a per cent says nothing.
  if (!(std::fabs(greater_side(part) - part.tolerance) <= 1e-3)) {
    return Contradiction{"tolerance",
                         "tolerance differs from what voltage_min and voltage_max give; give one"};
  }
  if (!(part.slope_min_ohm <= part.slope_resistance_ohm)) {
    return Contradiction{"slope_min", "slope_min is greater than slope_resistance"};
  }
  if (!(part.slope_resistance_ohm * part.test_current_A < part.voltage_min_V)) {
    return Contradiction{
        "slope_resistance",
        "slope_resistance times test_current is not below the least voltage: no zener is so soft"};
  }
  if (part.knee_current_A && !(*part.knee_current_A < part.test_current_A)) {
    return Contradiction{"knee_current", "knee_current is not below test_current"};
  }
  if (part.rated_power_W && !(part.max_junction_degC > 50)) {
    return Contradiction{"max_junction", "max_junction is not above 50 °C, where rated_power is given"};
  }
  return std::nullopt;
}

Clamp read_clamp(const FieldSource& source, bool inline_part) {
  return read_part<Clamp>(source, inline_part);
}

std::optional<ColumnValue> column_value(const Clamp& part, std::string_view name) {
  if (name == "thermal_resistance" && part.thermal_resistance_K_per_W == 0) return std::nullopt;
  return field_value(part, name);
}

}  // namespace dropfront::parts
