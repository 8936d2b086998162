#include "dropfront/scoring/corners/electrolytic.hpp"

#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront::scoring;

// The laws are short closed forms: only rounding separates them from the figures below.
constexpr double kRounding = 1e-12;

TEST_CASE("Cold takes capacitance away and adds ESR, warmth does neither") {
  const auto can = test::Example().reservoir;
  double last_F = 1, last_ohm = 1;
  for (double t = 20; t >= -40; t -= 2.5) {
    const double F = electrolytic_cold_capacitance(t), ohm = electrolytic_cold_esr(can, t);
    REQUIRE(F <= last_F);
    REQUIRE(ohm >= last_ohm);
    last_F = F;
    last_ohm = ohm;
  }
  REQUIRE(electrolytic_cold_capacitance(85) == 1);
  REQUIRE(electrolytic_cold_esr(can, 85) == 1);
}

TEST_CASE("At -25 degC a tenth of the capacitance is gone and the ESR ratio is the part's") {
  // Impedance ratios -25/+20 degC of a general 105 degC series: 3 at 10 V and 16 V, 2 from 25 V up.
  dropfront::parts::Reservoir can;
  can.esr_ohm = 0.5;
  REQUIRE_THAT(electrolytic_cold_capacitance(-25), WithinRel(0.9, kRounding));
  can.rated_voltage_V = 16;
  REQUIRE_THAT(electrolytic_cold_esr(can, -25), WithinRel(3.0, kRounding));
  can.rated_voltage_V = 25;
  REQUIRE_THAT(electrolytic_cold_esr(can, -25), WithinRel(2.0, kRounding));
  can.esr_cold_ohm = 4;
  REQUIRE_THAT(electrolytic_cold_esr(can, -25), WithinRel(8.0, kRounding));
}

TEST_CASE("Below -25 degC the ESR doubles once more by -40 degC") {
  // The same series' ratios at -40 degC: 6 to 16 V, 4 at 25 V and 35 V.
  dropfront::parts::Reservoir can;
  can.esr_ohm = 1;
  can.rated_voltage_V = 16;
  REQUIRE_THAT(electrolytic_cold_esr(can, -40), WithinRel(6.0, kRounding));
  can.rated_voltage_V = 35;
  REQUIRE_THAT(electrolytic_cold_esr(can, -40), WithinRel(4.0, kRounding));
}

TEST_CASE("Halfway in temperature the ESR is the geometric mean") {
  dropfront::parts::Reservoir can;
  can.esr_ohm = 1;
  can.esr_cold_ohm = 4;
  REQUIRE_THAT(electrolytic_cold_esr(can, -2.5), WithinRel(2.0, kRounding));
}

TEST_CASE("Ageing takes a fifth of the capacitance and doubles the ESR, at the bad ends only") {
  const auto can = test::Example().reservoir;
  REQUIRE_THAT(reservoir_least_F(can, true, 25), WithinRel(220e-6 * 0.8 * 0.8, kRounding));
  REQUIRE_THAT(reservoir_least_F(can, false, 25), WithinRel(220e-6 * 0.8, kRounding));
  REQUIRE_THAT(reservoir_greatest_F(can), WithinRel(220e-6 * 1.2, kRounding));
  REQUIRE_THAT(reservoir_greatest_esr_ohm(can, true, 25), WithinRel(1.6, kRounding));
  REQUIRE_THAT(reservoir_greatest_esr_ohm(can, true, -25), WithinRel(3.2, kRounding));
  REQUIRE_THAT(reservoir_least_esr_ohm(can, 25), WithinRel(0.08, kRounding));
}
