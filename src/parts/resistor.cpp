#include "dropfront/parts/resistor.hpp"

#include <sstream>

#include "dropfront/parts/read_part.hpp"

namespace dropfront::parts {
namespace {

using values::Unit;

Rating default_thermal_resistance(const Resistor& part) {
  if (!part.rated_power_W) return std::nullopt;
  return (155 - 70) / *part.rated_power_W;
}

std::string construction_of(const Resistor& part) {
  return part.construction == Construction::wirewound ? "wirewound" : "film";
}

void set_construction(Resistor& part, const std::string& text) {
  part.construction = text == "wirewound" ? Construction::wirewound : Construction::film;
}

std::string slots_of(const Resistor& part) {
  std::string text;
  for (const std::string& slot : part.slots) text += (text.empty() ? "" : " ") + slot;
  return text;
}

void set_slots(Resistor& part, const std::string& text) {
  std::istringstream words(text);
  for (std::string slot; words >> slot;) part.slots.push_back(slot);
}

Field<Resistor> construction_field() {
  Field<Resistor> field = word<Resistor>("construction", ColumnClass::property,
                                         {construction_of, set_construction}, {"film", "wirewound"});
  field.column.default_text = "film";
  field.column.default_reason = "a film part bears less pulse energy, so nothing is taken for granted";
  return field;
}

Field<Resistor> slots_field() {
  Field<Resistor> field = word<Resistor>("slots", ColumnClass::rating, {slots_of, set_slots},
                                         {"series_resistor", "discharge", "gate_resistor"});
  field.column.several_words = true;
  return field;
}

}  // namespace

template <>
const std::vector<Field<Resistor>>& fields_of<Resistor>() {
  static const std::vector<Field<Resistor>> fields = {
      required("resistance", Unit::ohm, &Resistor::resistance_ohm, above_0(1e12)),
      required("tolerance", Unit::share, &Resistor::tolerance, below_1),
      rating("rated_power", Unit::watt, &Resistor::rated_power_W, above_0(1e6)),
      rating("rated_voltage", Unit::volt, &Resistor::rated_voltage_Vrms, above_0(1e6)),
      rating("overload_voltage", Unit::volt, &Resistor::overload_voltage_V, above_0(1e6)),
      construction_field(),
      rating("pulse_energy", Unit::joule, &Resistor::pulse_energy_J, above_0(1e6)),
      truth("fusible", &Resistor::fusible, "false", "opening safely counts only where the maker states it"),
      rating("opens_at", Unit::count, &Resistor::opens_at, {1, 1e6, true, false}),
      property("thermal_resistance", Unit::K_per_W, &Resistor::thermal_resistance_K_per_W, above_0(1e6),
               "(155 °C - 70 °C)/rated_power",
               "the usual derating line, full power at 70 °C and none at 155 °C", default_thermal_resistance),
      slots_field(),
  };
  return fields;
}

template <>
std::optional<Contradiction> contradiction_in(const Resistor& part) {
  if (part.rated_voltage_Vrms && part.overload_voltage_V &&
      *part.overload_voltage_V < *part.rated_voltage_Vrms) {
    return Contradiction{"overload_voltage", "overload_voltage is less than rated_voltage"};
  }
  return std::nullopt;
}

Resistor read_resistor(const FieldSource& source, bool inline_part) {
  return read_part<Resistor>(source, inline_part);
}

std::optional<ColumnValue> column_value(const Resistor& part, std::string_view name) {
  return field_value(part, name);
}

}  // namespace dropfront::parts
