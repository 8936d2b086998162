#include "dropfront/parts/rectifier.hpp"

#include "dropfront/parts/read_part.hpp"

namespace dropfront::parts {

using values::Unit;

template <>
const std::vector<Field<Rectifier>>& fields_of<Rectifier>() {
  static const std::vector<Field<Rectifier>> fields = {
      property("threshold_voltage", Unit::volt, &Rectifier::threshold_voltage_V, from_0(100), "0.67 V",
               "line through the 1N4007 curve at 50 mA to 200 mA"),
      property("slope_resistance", Unit::ohm, &Rectifier::slope_resistance_ohm, above_0(1e4), "0.67 ohm",
               "line through the 1N4007 curve at 50 mA to 200 mA"),
      rating("reverse_voltage", Unit::volt, &Rectifier::reverse_voltage_V, above_0(1e6)),
      rating("surge_current", Unit::ampere, &Rectifier::surge_current_A, above_0(1e6)),
  };
  return fields;
}

template <>
std::optional<Contradiction> contradiction_in(const Rectifier&) {
  return std::nullopt;
}

Rectifier read_rectifier(const FieldSource& source, bool inline_part) {
  return read_part<Rectifier>(source, inline_part);
}

std::optional<ColumnValue> column_value(const Rectifier& part, std::string_view name) {
  return field_value(part, name);
}

}  // namespace dropfront::parts
