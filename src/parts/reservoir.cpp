#include "dropfront/parts/reservoir.hpp"

#include "dropfront/parts/defaults.hpp"
#include "dropfront/parts/read_part.hpp"

namespace dropfront::parts {
namespace {

using values::Unit;

Rating default_esr(const Reservoir& part) {
  return electrolytic_esr_ohm(part.rated_voltage_V, part.capacitance_F);
}

Rating default_cold_esr(const Reservoir& part) {
  return part.esr_ohm * electrolytic_cold_factor(part.rated_voltage_V);
}

Rating default_leakage(const Reservoir& part) {
  return electrolytic_leakage_A(part.rated_voltage_V, part.capacitance_F);
}

}  // namespace

template <>
const std::vector<Field<Reservoir>>& fields_of<Reservoir>() {
  static const std::vector<Field<Reservoir>> fields = {
      required("capacitance", Unit::farad, &Reservoir::capacitance_F, above_0(1)),
      required("tolerance", Unit::share, &Reservoir::tolerance, below_1),
      required("rated_voltage", Unit::volt, &Reservoir::rated_voltage_V, above_0(1e4)),
      rating("surge_voltage", Unit::volt, &Reservoir::surge_voltage_V, above_0(1e4)),
      property("esr", Unit::ohm, &Reservoir::esr_ohm, above_0(1e6), "tan(delta)/(2·pi·120 Hz·capacitance)",
               "greatest tan(delta) of general 105 °C parts by rated voltage", default_esr),
      property("esr_cold", Unit::ohm, &Reservoir::esr_cold_ohm, above_0(1e6),
               "3·esr below 25 V rating, else 2·esr", "impedance ratios at -25 °C of general 105 °C parts",
               default_cold_esr),
      rating("ripple_current", Unit::ampere, &Reservoir::ripple_current_Arms, above_0(1e4)),
      property("ripple_frequency", Unit::hertz, &Reservoir::ripple_frequency_Hz, above_0(1e7), "120 Hz",
               "the usual frequency of the rating"),
      property("leakage", Unit::ampere, &Reservoir::leakage_A, from_0(10),
               "0.01·capacitance·rated_voltage, 3 uA at least", "data-sheet limit after 2 minutes",
               default_leakage),
      rating("life_hours", Unit::hour, &Reservoir::life_h, above_0(1e7)),
      rating("life_temperature", Unit::degC, &Reservoir::life_temperature_degC, temperatures_degC),
      property("end_of_life_loss", Unit::share, &Reservoir::end_of_life_loss, below_1, "20 %",
               "endurance limit of general 105 °C parts"),
      property("end_of_life_esr", Unit::count, &Reservoir::end_of_life_esr, {1, 100}, "2",
               "endurance limit of tan(delta), 200 % of the data value"),
  };
  return fields;
}

template <>
std::optional<Contradiction> contradiction_in(const Reservoir& part) {
  if (part.surge_voltage_V && *part.surge_voltage_V < part.rated_voltage_V) {
    return Contradiction{"surge_voltage", "surge_voltage is less than rated_voltage"};
  }
  if (!(part.esr_ohm <= part.esr_cold_ohm)) {
    return Contradiction{"esr_cold", "esr_cold is less than esr"};
  }
  return std::nullopt;
}

Reservoir read_reservoir(const FieldSource& source, bool inline_part) {
  return read_part<Reservoir>(source, inline_part);
}

std::optional<ColumnValue> column_value(const Reservoir& part, std::string_view name) {
  return field_value(part, name);
}

}  // namespace dropfront::parts
