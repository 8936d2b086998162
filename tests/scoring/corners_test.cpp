#include "dropfront/scoring/corners.hpp"

#include <cmath>

#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront::scoring;

constexpr double kRounding = 1e-12;  // products of a few factors

TEST_CASE("The dropper's least capacitance takes tolerance, ageing and heat together") {
  const auto part = test::Example().dropper;
  REQUIRE_THAT(dropper_F(part, End::low, true, 20), WithinRel(0.68e-6 * 0.9 * 0.9, kRounding));
  REQUIRE_THAT(dropper_F(part, End::low, true, 70), WithinRel(0.68e-6 * 0.81 * (1 - 200e-6 * 50), kRounding));
  REQUIRE_THAT(dropper_F(part, End::high, true, 20), WithinRel(0.68e-6 * 1.1, kRounding));
  REQUIRE(dropper_F(part, End::low, true, 60) < dropper_F(part, End::low, true, -25));
}

TEST_CASE("The dropper's loss is the data loss tangent: power over reactive power") {
  // 0.47 uF at 230 V, 50 Hz, tan d 1e-3: 7.8 mW beside 7.81 VA.
  auto part = test::Example().dropper;
  part.loss_tangent = 1e-3;
  const double esr = dropper_esr_ohm(part, 0.47e-6, 50);
  const double I = 230 * 2 * 3.14159265358979 * 50 * 0.47e-6;
  REQUIRE_THAT(I * I * esr, WithinRel(7.81e-3, 1e-3));  // three figures given
  REQUIRE_THAT(I * I * esr / (230 * I), WithinRel(1e-3, 1e-9));
}

TEST_CASE("The rectifier's threshold spans -0.3 V to +2 mV a kelvin below 25 degC") {
  const auto part = test::Example().rectifier;
  REQUIRE_THAT(rectifier_curve(part, Drops::least, 60).threshold_V, WithinRel(0.37, kRounding));
  REQUIRE_THAT(rectifier_curve(part, Drops::nominal, -25).threshold_V, WithinRel(0.67, kRounding));
  REQUIRE_THAT(rectifier_curve(part, Drops::greatest, -25).threshold_V, WithinRel(0.77, kRounding));
  REQUIRE_THAT(rectifier_curve(part, Drops::greatest, 60).threshold_V, WithinRel(0.67, kRounding));
}

TEST_CASE("A chain of discharge resistors is its elements in series; without one nothing bleeds") {
  test::Example example;
  REQUIRE_THAT(discharge_ohm(example.design(), End::low), WithinRel(2 * 470e3 * 0.95, kRounding));
  REQUIRE_THAT(discharge_ohm(example.design(), End::high), WithinRel(2 * 470e3 * 1.05, kRounding));
  example.discharge_count = 0;
  REQUIRE(std::isinf(discharge_ohm(example.design(), End::nominal)));
}

TEST_CASE(
    "A nominal recipe at the temperatures the lists state gives their values, film at 20, zeners at 25 "
    "degC") {
  test::Example example;
  const auto shapes = mains_shapes(example.supply());
  Recipe recipe;
  recipe.mains = &shapes.nominal;
  const auto values = corner_values(example.design(), recipe, {20, 25}, 5);
  REQUIRE(values.dropper_F == 0.68e-6);
  REQUIRE(values.series_resistor_ohm == 47);
  REQUIRE(values.discharge_ohm == 940e3);
  REQUIRE(values.reservoir_F == 220e-6);
  REQUIRE(values.reservoir_esr_ohm == 0.8);
  REQUIRE(values.rectifier.threshold_V == 0.67);
  REQUIRE_THAT(values.clamp.main.threshold_V, WithinRel(12 - 9 * 0.021, kRounding));
  REQUIRE(values.clamp.main.slope_ohm == 9);
  REQUIRE(values.load_cutoff_V == 5);
}
