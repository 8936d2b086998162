#include "dropfront/parts/clamp.hpp"

#include "dropfront/parts/columns.hpp"
#include "parts/map_source.hpp"
#include "support/catch.hpp"

namespace dropfront::parts {
namespace {

const MapSource zener(
    {{"voltage", "12 V"}, {"tolerance", "5 %"}, {"test_current", "21 mA"}, {"slope_resistance", "9 R"}});

TEST_CASE("A clamp takes bounds from its tolerance and the family's temperature coefficient") {
  const Clamp part = read_clamp(zener.with("rated_power", "1 W"), true);
  CHECK(part.voltage_min_V == 12 * 0.95);
  CHECK(part.voltage_max_V == 12 * 1.05);
  CHECK(part.slope_min_ohm == 0.9);
  // 1N957 family: 0.077 %/K at 12 V. Tolerance: one rounding of the division by 100.
  CHECK_THAT(part.temperature_coefficient_per_K, Catch::Matchers::WithinRel(0.77e-3, 1e-12));
  CHECK(part.max_junction_degC == 150);
  CHECK(part.thermal_resistance_K_per_W == 100);  // (150 - 50)/1
  CHECK(read_clamp(zener.with("rated_power", "1 W").with("max_junction", "200 °C"), true)
            .thermal_resistance_K_per_W == 150);
  CHECK_FALSE(part.pulse_power_W);
}

TEST_CASE("Without rated power a clamp's thermal resistance is not known") {
  const Clamp part = read_clamp(zener, true);
  CHECK(part.thermal_resistance_K_per_W == 0);
  CHECK_FALSE(column_value(part, "thermal_resistance"));
}

TEST_CASE("Bounds may stand in for the tolerance, and must agree with one that is given") {
  const MapSource bounds =
      zener.without("tolerance").with("voltage_min", "11.4 V").with("voltage_max", "12.7 V");
  const Clamp part = read_clamp(bounds, true);
  CHECK(part.voltage_min_V == 11.4);
  CHECK(part.voltage_max_V == 12.7);
  // The greater side, 0.7/12; two roundings.
  CHECK_THAT(part.tolerance, Catch::Matchers::WithinRel(0.7 / 12, 1e-12));
  CHECK(refusal(read_clamp, bounds.with("tolerance", "5.8 %")) == "accepted");
  CHECK(refusal(read_clamp, bounds.with("tolerance", "5 %")).find("give one") != std::string::npos);
  CHECK(
      refusal(read_clamp, zener.without("tolerance")) ==
      "design.json: tolerance is missing: every clamp needs it (or voltage_min, voltage_max), such as 10 %");
  CHECK(refusal(read_clamp, bounds.without("voltage_max")).find("tolerance is missing") != std::string::npos);
}

TEST_CASE("A clamp that no zener can be is refused") {
  CHECK(refusal(read_clamp,
                zener.without("tolerance").with("voltage_min", "12.1 V").with("voltage_max", "13 V"))
            .find("voltage_min is greater") != std::string::npos);
  CHECK(refusal(read_clamp,
                zener.without("tolerance").with("voltage_min", "11 V").with("voltage_max", "11.5 V"))
            .find("voltage_max is less") != std::string::npos);
  CHECK(refusal(read_clamp, zener.with("slope_min", "10 R")).find("slope_min is greater") !=
        std::string::npos);
  CHECK(refusal(read_clamp, zener.with("slope_resistance", "900 R")).find("so soft") != std::string::npos);
  CHECK(refusal(read_clamp, zener.with("knee_current", "30 mA")).find("knee_current is not below") !=
        std::string::npos);
  CHECK(refusal(read_clamp, zener.with("rated_power", "1 W").with("max_junction", "40 °C"))
            .find("max_junction") != std::string::npos);
  CHECK(refusal(read_clamp, zener.without("test_current")).find("test_current is missing") !=
        std::string::npos);
  CHECK(refusal(read_clamp, zener.without("slope_resistance")).find("slope_resistance is missing") !=
        std::string::npos);
}

}  // namespace
}  // namespace dropfront::parts
