#include "dropfront/parts/family.hpp"

#include <cmath>

#include "dropfront/parts/defaults.hpp"
#include "parts/map_source.hpp"
#include "support/catch.hpp"

namespace dropfront::parts {
namespace {

using values::Series;

Resistor row(const std::string& name, const std::string& ohms, const std::string& power,
             const std::string& price) {
  return read_resistor(part_of({{"part", name},
                                {"resistance", ohms},
                                {"tolerance", "5 %"},
                                {"rated_power", power},
                                {"fusible", "true"},
                                {"length_mm", "10"},
                                {"price_1", price}}),
                       false);
}

Reservoir can(const std::string& name, const std::string& farads) {
  return read_reservoir(
      part_of({{"part", name}, {"capacitance", farads}, {"tolerance", "20 %"}, {"rated_voltage", "25 V"}}),
      false);
}

TEST_CASE("One row makes a family that copies its other columns") {
  const Resistor like = row("fusible-2W", "100R", "2 W", "0.08");
  const auto family = expand_family({&like}, Series::E12, 22, 470);
  REQUIRE(family.size() == 17);  // 22 .. 82 is 8 values of E12, 100 .. 470 is 9
  CHECK(family.front().info.name == "fusible-2W 22 ohm");
  CHECK(family.back().info.name == "fusible-2W 470 ohm");
  double last = 0;
  for (const Resistor& part : family) {
    CHECK(part.resistance_ohm > last);
    last = part.resistance_ohm;
    CHECK(part.rated_power_W == 2.0);
    CHECK(part.tolerance == 0.05);
    CHECK(part.fusible);
    CHECK(part.info.length_um == 10000);
    CHECK(price_micro_at(part.info, 1) == 80000);
  }
}

TEST_CASE("Between two rows numbers follow a power law in the value") {
  const Resistor low = row("a", "10R", "1 W", "0.01");
  const Resistor high = row("b", "1k", "4 W", "0.04");
  // 100 ohm is half way in log(value): the geometric means. Tolerance: roundings of exp and log.
  const Resistor middle = interpolate(low, high, 100);
  CHECK_THAT(*middle.rated_power_W, Catch::Matchers::WithinRel(2.0, 1e-12));
  CHECK(price_micro_at(middle.info, 1) == 20000);
  // A power law stays one: any value lies on P = 1 W·(R/10)^(log 4/log 100).
  for (double ohms = 11; ohms < 1000; ohms *= 1.3) {
    CHECK_THAT(*interpolate(low, high, ohms).rated_power_W,
               Catch::Matchers::WithinRel(std::pow(ohms / 10, std::log(4.0) / std::log(100.0)), 1e-12));
  }
}

TEST_CASE("At a row's value the row is met exactly, beyond the ends the end row holds") {
  const Resistor low = row("a", "10R", "1 W", "0.01");
  const Resistor high = row("b", "1k", "4 W", "0.0401");
  CHECK(interpolate(low, high, 10).rated_power_W == low.rated_power_W);
  CHECK(interpolate(low, high, 1000).rated_power_W == high.rated_power_W);
  CHECK(interpolate(low, high, 1).rated_power_W == low.rated_power_W);
  CHECK(interpolate(low, high, 1e6).rated_power_W == high.rated_power_W);
  CHECK(interpolate(low, high, 1e6).resistance_ohm == 1e6);
  CHECK(price_micro_at(interpolate(low, high, 1000).info, 1) == 40100);
  CHECK(interpolate(low, high, 30).info.name == "a");
  CHECK(interpolate(low, high, 300).info.name == "b");
}

TEST_CASE("Several rows are taken two by two whatever their order") {
  const Resistor a = row("a", "10R", "1 W", "0.01");
  const Resistor b = row("b", "100R", "2 W", "0.02");
  const Resistor c = row("c", "1k", "1 W", "0.01");
  const auto family = expand_family({&c, &a, &b}, Series::E3, 10, 1000);
  REQUIRE(family.size() == 7);
  CHECK(family[0].rated_power_W == 1.0);
  CHECK(family[3].rated_power_W == 2.0);
  CHECK(family[6].rated_power_W == 1.0);
  CHECK(family[3].info.name == "b 100 ohm");
  CHECK(*family[4].rated_power_W < 2.0);
}

TEST_CASE("A rating that one row lacks is not given between them") {
  Resistor low = row("a", "10R", "1 W", "0.01");
  const Resistor high = row("b", "1k", "4 W", "0.04");
  low.rated_power_W.reset();
  low.info.length_um.reset();
  low.info.price_breaks.clear();
  const Resistor middle = interpolate(low, high, 100);
  CHECK_FALSE(middle.rated_power_W);
  CHECK_FALSE(middle.info.length_um);
  CHECK(middle.info.price_breaks.empty());
}

TEST_CASE("A default follows its rule at the new value, a given number is kept") {
  const Reservoir defaulted = can("general", "220 uF");
  const auto family = expand_family({&defaulted}, Series::E3, 10e-6, 2200e-6);
  REQUIRE(family.size() == 8);
  for (const Reservoir& part : family) {
    CHECK(part.esr_ohm == electrolytic_esr_ohm(25, part.capacitance_F));
    CHECK(part.esr_cold_ohm == 2 * part.esr_ohm);
    CHECK(part.leakage_A == electrolytic_leakage_A(25, part.capacitance_F));
  }
  Reservoir given = defaulted;
  given.esr_ohm = 0.5;
  CHECK(expand_family({&given}, Series::E3, 10e-6, 10e-6).front().esr_ohm == 0.5);
}

TEST_CASE("A clamp family keeps tolerance and lopsided bounds in proportion") {
  const MapSource zener = part_of({{"part", "z"},
                                   {"voltage", "12 V"},
                                   {"tolerance", "5 %"},
                                   {"test_current", "21 mA"},
                                   {"slope_resistance", "9 R"},
                                   {"rated_power", "1 W"}});
  const Clamp even = read_clamp(zener, false);
  const auto family = expand_family({&even}, Series::E24, 9.1, 24);
  REQUIRE(family.size() == 11);
  for (const Clamp& part : family) {
    CHECK(part.voltage_min_V == part.voltage_V * (1 - 0.05));
    CHECK(part.voltage_max_V == part.voltage_V * (1 + 0.05));
    CHECK(part.temperature_coefficient_per_K == zener_temperature_coefficient_per_K(part.voltage_V));
    CHECK(part.test_current_A == 21e-3);
  }
  const Clamp lopsided = read_clamp(
      zener.without("tolerance").with("voltage_min", "11.4 V").with("voltage_max", "12.7 V"), false);
  const Clamp doubled = interpolate(lopsided, lopsided, 24);
  CHECK_THAT(doubled.voltage_min_V, Catch::Matchers::WithinRel(22.8, 1e-12));  // roundings only
  CHECK_THAT(doubled.voltage_max_V, Catch::Matchers::WithinRel(25.4, 1e-12));
}

TEST_CASE("Temperatures and signed coefficients are taken straight in log of the value") {
  Dropper low = read_dropper(part_of({{"part", "a"},
                                      {"capacitance", "100 nF"},
                                      {"tolerance", "10 %"},
                                      {"rated_voltage", "310 V"},
                                      {"temperature_coefficient", "-100 ppm/K"},
                                      {"loss_tangent", "0"}}),
                             false);
  Dropper high = low;
  high.capacitance_F = 10e-6;
  high.temperature_coefficient_per_K = 100e-6;
  high.loss_tangent = 0.002;
  const Dropper middle = interpolate(low, high, 1e-6);
  CHECK_THAT(middle.temperature_coefficient_per_K, Catch::Matchers::WithinAbs(0, 1e-15));
  CHECK_THAT(middle.loss_tangent, Catch::Matchers::WithinRel(0.001, 1e-12));
  Reservoir cool = can("a", "10 uF");
  Reservoir warm = can("b", "1000 uF");
  cool.life_temperature_degC = 85;
  warm.life_temperature_degC = 105;
  CHECK_THAT(*interpolate(cool, warm, 100e-6).life_temperature_degC, Catch::Matchers::WithinRel(95.0, 1e-12));
}

TEST_CASE("No rows or no values make no family") {
  const Resistor like = row("x", "100R", "2 W", "0.08");
  CHECK(expand_family(std::vector<const Resistor*>{}, Series::E12, 22, 470).empty());
  CHECK(expand_family({&like}, Series::E3, 23, 46).empty());
}

}  // namespace
}  // namespace dropfront::parts
