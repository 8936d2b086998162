#include "dropfront/parts/protection.hpp"

#include "dropfront/parts/read_part.hpp"

namespace dropfront::parts {

using values::Unit;

template <>
const std::vector<Field<Varistor>>& fields_of<Varistor>() {
  static const std::vector<Field<Varistor>> fields = {
      required("continuous_voltage", Unit::volt, &Varistor::continuous_voltage_Vrms, above_0(1e5)),
      rating("clamp_voltage", Unit::volt, &Varistor::clamp_voltage_V, above_0(1e6)),
      rating("clamp_current", Unit::ampere, &Varistor::clamp_current_A, above_0(1e6)),
      rating("energy", Unit::joule, &Varistor::energy_J, above_0(1e6)),
      rating("surge_current", Unit::ampere, &Varistor::surge_current_A, above_0(1e6)),
  };
  return fields;
}

template <>
std::optional<Contradiction> contradiction_in(const Varistor& part) {
  if (part.clamp_voltage_V && !(*part.clamp_voltage_V > part.continuous_voltage_Vrms)) {
    return Contradiction{"clamp_voltage", "clamp_voltage is not above continuous_voltage"};
  }
  return std::nullopt;
}

template <>
const std::vector<Field<Fuse>>& fields_of<Fuse>() {
  static const std::vector<Field<Fuse>> fields = {
      required("rated_current", Unit::ampere, &Fuse::rated_current_A, above_0(1e4)),
      rating("melting_i2t", Unit::A2s, &Fuse::melting_i2t_A2s, above_0(1e9)),
      rating("rated_voltage", Unit::volt, &Fuse::rated_voltage_Vrms, above_0(1e5)),
  };
  return fields;
}

template <>
std::optional<Contradiction> contradiction_in(const Fuse&) {
  return std::nullopt;
}

template <>
const std::vector<Field<Thyristor>>& fields_of<Thyristor>() {
  static const std::vector<Field<Thyristor>> fields = {
      property("on_voltage", Unit::volt, &Thyristor::on_voltage_V, from_0(100), "1 V",
               "small sensitive-gate thyristors, common practice"),
      property("slope_resistance", Unit::ohm, &Thyristor::slope_resistance_ohm, above_0(1e4), "0.1 ohm",
               "small sensitive-gate thyristors, common practice"),
      rating("trigger_current", Unit::ampere, &Thyristor::trigger_current_A, above_0(1e3)),
      rating("holding_current", Unit::ampere, &Thyristor::holding_current_A, above_0(1e3)),
      rating("latching_current", Unit::ampere, &Thyristor::latching_current_A, above_0(1e3)),
      rating("turn_off_time", Unit::second, &Thyristor::turn_off_time_s, above_0(10)),
      rating("surge_current", Unit::ampere, &Thyristor::surge_current_A, above_0(1e6)),
  };
  return fields;
}

template <>
std::optional<Contradiction> contradiction_in(const Thyristor& part) {
  if (part.holding_current_A && part.latching_current_A &&
      !(*part.holding_current_A <= *part.latching_current_A)) {
    return Contradiction{"latching_current", "latching_current is less than holding_current"};
  }
  return std::nullopt;
}

template <>
const std::vector<Field<Ceramic>>& fields_of<Ceramic>() {
  static const std::vector<Field<Ceramic>> fields = {
      required("capacitance", Unit::farad, &Ceramic::capacitance_F, above_0(1e-2)),
      required("tolerance", Unit::share, &Ceramic::tolerance, below_1),
      rating("rated_voltage", Unit::volt, &Ceramic::rated_voltage_V, above_0(1e5)),
  };
  return fields;
}

template <>
std::optional<Contradiction> contradiction_in(const Ceramic&) {
  return std::nullopt;
}

Varistor read_varistor(const FieldSource& source, bool inline_part) {
  return read_part<Varistor>(source, inline_part);
}
Fuse read_fuse(const FieldSource& source, bool inline_part) { return read_part<Fuse>(source, inline_part); }
Thyristor read_thyristor(const FieldSource& source, bool inline_part) {
  return read_part<Thyristor>(source, inline_part);
}
Ceramic read_ceramic(const FieldSource& source, bool inline_part) {
  return read_part<Ceramic>(source, inline_part);
}

std::optional<ColumnValue> column_value(const Varistor& part, std::string_view name) {
  return field_value(part, name);
}
std::optional<ColumnValue> column_value(const Fuse& part, std::string_view name) {
  return field_value(part, name);
}
std::optional<ColumnValue> column_value(const Thyristor& part, std::string_view name) {
  return field_value(part, name);
}
std::optional<ColumnValue> column_value(const Ceramic& part, std::string_view name) {
  return field_value(part, name);
}

}  // namespace dropfront::parts
