#include "dropfront/parts/columns.hpp"

#include <algorithm>
#include <map>

#include "dropfront/values/number_text.hpp"
#include "dropfront/values/quantity.hpp"
#include "parts/map_source.hpp"
#include "support/catch.hpp"

namespace dropfront::parts {
namespace {

/// A part written column by column, as a design file holds it.
template <class T>
MapSource written(const T& part, Kind kind) {
  std::map<std::string, std::string> fields;
  for (const Column& column : columns_of(kind)) {
    const auto value = column_value(part, column.name);
    if (!value) continue;
    if (const auto number = std::get_if<double>(&*value)) {
      fields[column.name] = values::number_text(*number);
    } else if (const auto truth = std::get_if<bool>(&*value)) {
      fields[column.name] = *truth ? "true" : "false";
    } else {
      fields[column.name] = std::get<std::string>(*value);
    }
  }
  return part_of(fields);
}

template <class T>
void check_round_trip(const std::vector<T>& parts, Kind kind, T (*read)(const FieldSource&, bool)) {
  REQUIRE_FALSE(parts.empty());
  for (const T& part : parts) {
    const T again = read(written(part, kind), true);
    for (const std::string& name : column_names(kind)) {
      INFO(part.info.name << " " << name);
      CHECK(column_value(again, name) == column_value(part, name));
    }
  }
}

TEST_CASE("Every shipped part survives the way through its columns bit by bit") {
  Catalogue demo;
  read_parts_folder(std::string(DROPFRONT_SOURCE_DIR) + "/problems/parts/demo", demo);
  check_round_trip(demo.droppers, Kind::dropper, read_dropper);
  check_round_trip(demo.resistors, Kind::resistor, read_resistor);
  check_round_trip(demo.clamps, Kind::clamp, read_clamp);
  check_round_trip(demo.reservoirs, Kind::reservoir, read_reservoir);
  check_round_trip(demo.rectifiers, Kind::rectifier, read_rectifier);
  check_round_trip(demo.output_stages, Kind::output_stage, read_output_stage);
  check_round_trip(demo.varistors, Kind::varistor, read_varistor);
  check_round_trip(demo.fuses, Kind::fuse, read_fuse);
  check_round_trip(demo.thyristors, Kind::thyristor, read_thyristor);
  check_round_trip(demo.ceramics, Kind::ceramic, read_ceramic);
}

TEST_CASE("Every kind lists its columns once, the common ones included") {
  for (const Kind kind : all_kinds) {
    std::vector<std::string> names = column_names(kind);
    for (const char* common : {"part", "length_mm", "width_mm", "height_mm", "price_1", "price_100",
                               "price_1000", "price_10000", "source"}) {
      CHECK(std::count(names.begin(), names.end(), common) == 1);
    }
    std::sort(names.begin(), names.end());
    CHECK(std::adjacent_find(names.begin(), names.end()) == names.end());
    CHECK(find_column(kind, "part") != nullptr);
    CHECK(find_column(kind, "flavour") == nullptr);
  }
  CHECK(list_file_name(Kind::output_stage) == "output_stages.csv");
}

TEST_CASE("A property tells its default and why, and a plain default is the one readers take") {
  const Rectifier diode = read_rectifier(part_of({}), true);
  const Reservoir can = read_reservoir(
      part_of({{"capacitance", "100 uF"}, {"tolerance", "20 %"}, {"rated_voltage", "25 V"}}), true);
  for (const Kind kind : all_kinds) {
    for (const Column& column : columns_of(kind)) {
      INFO(kind_name(kind) << " " << column.name);
      const bool property = column.column_class == ColumnClass::property;
      CHECK(property == !column.default_text.empty());
      CHECK(property == !column.default_reason.empty());
    }
  }
  const auto told = [](Kind kind, const char* name) {
    const Column* column = find_column(kind, name);
    return values::parse_quantity(column->default_text, column->unit);
  };
  for (const char* name : {"threshold_voltage", "slope_resistance"}) {
    CHECK(std::get<double>(*column_value(diode, name)) == told(Kind::rectifier, name));
  }
  for (const char* name : {"ripple_frequency", "end_of_life_loss", "end_of_life_esr"}) {
    CHECK(std::get<double>(*column_value(can, name)) == told(Kind::reservoir, name));
  }
}

TEST_CASE("Values come out in the unit of their column, absent ones not at all") {
  const Dropper film = read_dropper(part_of({{"capacitance", "470 nF"},
                                             {"tolerance", "10 %"},
                                             {"rated_voltage", "310 V"},
                                             {"length_mm", "26.5"},
                                             {"price_100", "0.144"}}),
                                    true);
  CHECK(std::get<double>(*column_value(film, "capacitance")) == 470e-9);
  CHECK(std::get<bool>(*column_value(film, "series_rated")) == false);
  CHECK(std::get<double>(*column_value(film, "length_mm")) == 26.5);
  CHECK(std::get<double>(*column_value(film, "price_100")) == 0.144);
  CHECK_FALSE(column_value(film, "price_1"));
  CHECK_FALSE(column_value(film, "class"));
  CHECK_FALSE(column_value(film, "slew"));
  CHECK_FALSE(column_value(film, "flavour"));
}

}  // namespace
}  // namespace dropfront::parts
