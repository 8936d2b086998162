#include "dropfront/parts/defaults.hpp"

#include "support/catch.hpp"

namespace dropfront::parts {
namespace {

TEST_CASE("The zener coefficient follows the 1N957 family and the 1N47xxA middles") {
  // Typical values of JEDEC 1N957..1N978, as restated, copy not kept. Tolerance: one rounding.
  for (const auto& [voltage_V, percent_per_K] :
       {std::pair{6.8, 0.050}, {9.1, 0.068}, {12.0, 0.077}, {24.0, 0.088}, {33.0, 0.092}, {51.0, 0.096}}) {
    CHECK_THAT(zener_temperature_coefficient_per_K(voltage_V),
               Catch::Matchers::WithinRel(percent_per_K / 100, 1e-12));
  }
  // 1N4733A is given -0.01 .. +0.04 %/K, 1N4728A -0.08 .. -0.05 %/K: the middles.
  CHECK_THAT(zener_temperature_coefficient_per_K(5.1), Catch::Matchers::WithinRel(0.015e-2, 1e-12));
  CHECK_THAT(zener_temperature_coefficient_per_K(3.3), Catch::Matchers::WithinRel(-0.065e-2, 1e-12));
}

TEST_CASE("The zener coefficient rises with voltage, crosses zero near 4.7 V and holds its ends") {
  double last = -1;
  for (double voltage_V = 2; voltage_V < 120; voltage_V += 0.05) {
    const double now = zener_temperature_coefficient_per_K(voltage_V);
    REQUIRE(now >= last);
    last = now;
  }
  CHECK(zener_temperature_coefficient_per_K(4.5) < 0);
  CHECK(zener_temperature_coefficient_per_K(4.8) > 0);
  CHECK(zener_temperature_coefficient_per_K(2.4) == zener_temperature_coefficient_per_K(3.3));
  CHECK(zener_temperature_coefficient_per_K(100) == zener_temperature_coefficient_per_K(51));
}

TEST_CASE("ESR by loss tangent agrees with worked values of the data-sheet table") {
  // 105 degC general series: 0.20 at 10 V, 0.16 at 16 V, 0.14 at 25 V, 0.12 at 35 V; ESR to three digits.
  CHECK_THAT(electrolytic_esr_ohm(10, 100e-6), Catch::Matchers::WithinAbs(2.65, 0.005));
  CHECK_THAT(electrolytic_esr_ohm(16, 470e-6), Catch::Matchers::WithinAbs(0.452, 0.0008));
  CHECK_THAT(electrolytic_esr_ohm(25, 220e-6), Catch::Matchers::WithinAbs(0.844, 0.0005));
  CHECK_THAT(electrolytic_esr_ohm(35, 100e-6), Catch::Matchers::WithinAbs(1.59, 0.005));
}

TEST_CASE("Loss tangent takes the lower row between ratings and grows above 1000 uF") {
  CHECK(electrolytic_loss_tangent(20, 100e-6) == 0.16);
  CHECK(electrolytic_loss_tangent(6.3, 100e-6) == 0.23);
  CHECK(electrolytic_loss_tangent(100, 100e-6) == 0.08);
  CHECK(electrolytic_loss_tangent(160, 100e-6) == 0.20);
  // 0.02 for each 1000 uF above 1000 uF.
  CHECK_THAT(electrolytic_loss_tangent(25, 2000e-6), Catch::Matchers::WithinRel(0.16, 1e-12));
  CHECK(electrolytic_loss_tangent(25, 1000e-6) == 0.14);
}

TEST_CASE("Cold factor and leakage follow the data-sheet rules") {
  CHECK(electrolytic_cold_factor(16) == 3);
  CHECK(electrolytic_cold_factor(25) == 2);
  CHECK(electrolytic_leakage_A(25, 1e-6) == 3e-6);  // the floor
  CHECK(electrolytic_leakage_A(25, 220e-6) == 0.01 * 220e-6 * 25);
}

}  // namespace
}  // namespace dropfront::parts
