#include "dropfront/circuit/life.hpp"

#include "support/catch.hpp"

namespace dropfront::circuit {
namespace {

using Catch::Matchers::WithinRel;
constexpr double kRounding = 1e-12;  // closed form: rounding only

TEST_CASE("ten kelvin cooler doubles an electrolytic's life") {
  const double at_65 = electrolytic_life_h(2000, 105, 65, 3);
  CHECK_THAT(electrolytic_life_h(2000, 105, 55, 3), WithinRel(2 * at_65, kRounding));
}

TEST_CASE("more ripple never lengthens an electrolytic's life") {
  double before = electrolytic_life_h(2000, 105, 65, 0);
  for (double current = 0.05; current < 1; current += 0.05) {
    const double life = electrolytic_life_h(2000, 105, 65, ripple_rise_K(current, 0.3));
    CHECK(life < before);
    before = life;
  }
}

TEST_CASE("the core's rise goes with the square of the ripple current and is 5 K at the rating") {
  CHECK_THAT(ripple_rise_K(0.3, 0.3), WithinRel(5.0, kRounding));
  CHECK_THAT(ripple_rise_K(0.6, 0.3), WithinRel(20.0, kRounding));
  CHECK(ripple_rise_K(0, 0.3) == 0);
}

TEST_CASE("worked numbers of the makers' life formula come out") {
  // 2000 h at 105 degC in 65 degC: four doublings, 32 000 h; with a rise of 5 K half of it (makers' life
  // note, Le = Lo·Kt·Kr with Kt = 2^((To-Te)/10), Kr = 2^(-dT/5), as restated, copy not kept).
  CHECK_THAT(electrolytic_life_h(2000, 105, 65, 0), WithinRel(32000.0, kRounding));
  CHECK_THAT(electrolytic_life_h(2000, 105, 65, 5), WithinRel(16000.0, kRounding));
  CHECK_THAT(electrolytic_life_h(2000, 105, 65, 5, RippleTerm::none), WithinRel(32000.0, kRounding));
}

TEST_CASE("no life is credited for surroundings below 35 degC") {
  CHECK(electrolytic_life_h(2000, 105, 10, 0) == electrolytic_life_h(2000, 105, 35, 0));
}

}  // namespace
}  // namespace dropfront::circuit
