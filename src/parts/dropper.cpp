#include "dropfront/parts/dropper.hpp"

#include "dropfront/parts/read_part.hpp"

namespace dropfront::parts {
namespace {

using values::Unit;

Rating default_loss(const Dropper& part) { return part.series_rated ? 0.10 : 0.30; }

std::string class_of(const Dropper& part) { return part.class_name; }
void set_class(Dropper& part, const std::string& text) { part.class_name = text; }

}  // namespace

template <>
const std::vector<Field<Dropper>>& fields_of<Dropper>() {
  static const std::vector<Field<Dropper>> fields = {
      required("capacitance", Unit::farad, &Dropper::capacitance_F, above_0(1e-3)),
      required("tolerance", Unit::share, &Dropper::tolerance, below_1),
      required("rated_voltage", Unit::volt, &Dropper::rated_voltage_Vrms, above_0(1e5)),
      word<Dropper>("class", ColumnClass::rating, {class_of, set_class}, {"X1", "X2", "X3"}),
      truth("series_rated", &Dropper::series_rated, "false",
            "use in series with the mains counts only where the maker states it"),
      rating("slew", Unit::V_per_s, &Dropper::slew_V_per_s, above_0(1e13)),
      rating("impulse", Unit::volt, &Dropper::impulse_V, above_0(1e6)),
      property("loss_tangent", Unit::share, &Dropper::loss_tangent, from_0(0.5), "0.001",
               "data-sheet limit of polypropylene film at 1 kHz"),
      property("end_of_life_loss", Unit::share, &Dropper::end_of_life_loss, below_1,
               "10 % where series_rated, else 30 %",
               "endurance limit of IEC 60384-14; ordinary film loses more in series with the mains",
               default_loss),
      property("temperature_coefficient", Unit::per_kelvin, &Dropper::temperature_coefficient_per_K,
               {-0.01, 0.01}, "-200 ppm/K", "polypropylene film, from memory"),
  };
  return fields;
}

template <>
std::optional<Contradiction> contradiction_in(const Dropper&) {
  return std::nullopt;
}

Dropper read_dropper(const FieldSource& source, bool inline_part) {
  return read_part<Dropper>(source, inline_part);
}

std::optional<ColumnValue> column_value(const Dropper& part, std::string_view name) {
  return field_value(part, name);
}

}  // namespace dropfront::parts
