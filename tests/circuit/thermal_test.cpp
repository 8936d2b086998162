#include "dropfront/circuit/thermal.hpp"

#include "support/catch.hpp"

namespace dropfront::circuit {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;

TEST_CASE("without power a body is as warm as its surroundings") {
  CHECK(temperature_degC(41.5, 170, 0) == 41.5);
}

TEST_CASE("the allowed power brings the body exactly to its maximum") {
  for (double ambient : {-25.0, 25.0, 60.0, 120.0}) {
    const double power = allowed_power_W(ambient, 170, 150);
    CHECK_THAT(temperature_degC(ambient, 170, power), WithinAbs(150.0, 1e-9));  // rounding only
  }
}

TEST_CASE("surroundings above the maximum allow no power") { CHECK(allowed_power_W(160, 170, 150) == 0); }

TEST_CASE("a 1N47xx at 50 degC reaches 200 degC at its rated watt by its derating line") {
  // 1N4728A..1N4764A data sheets: 1 W at 50 degC, derate 6.67 mW/K, so 150 K above; 0.05 % for the printed
  // rounding of 6.67.
  CHECK_THAT(temperature_degC(50, 1 / 6.67e-3, 1), WithinRel(200.0, 5e-4));
}

TEST_CASE("a power metal film at 1 W and 135 K/W has a body of 205 degC in 70 degC") {
  // PR01 data sheet figures: 135 K/W (as restated, copy not kept); 70 + 135.
  CHECK_THAT(temperature_degC(70, 135, 1), WithinAbs(205.0, 1e-9));
}

}  // namespace
}  // namespace dropfront::circuit
