// Checks of dropper, rectifier, discharge chain, reservoir, output stage and board.
#include <cmath>

#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinRel;
using test::Example;
using test::judge;
using test::value_of;

/// Pure sine: harmonics stated, none named.
void pure_sine(Example& example) { example.supply().harmonics_given = true; }

TEST_CASE("only X1 and X2 are a class for the mains") {
  Example example;
  for (const auto& [name, fit] : {std::pair("X1", true), {"X2", true}, {"X3", false}}) {
    example.dropper.class_name = name;
    CHECK(judge(example, dropper_class).value().pass == fit);
  }
}

TEST_CASE("a dropper that is not series-rated breaks a limit only where one is set") {
  Example example;
  example.dropper.series_rated = false;
  CHECK_FALSE(judge(example, dropper_series_rated));
  example.requirement.limits.series_rated = true;
  CHECK(judge(example, dropper_series_rated).value().pass == false);
}

TEST_CASE("the line's r.m.s. is never less than what stands across dropper and discharge chain") {
  for (const char* wiring : {"half-wave-clamp-ahead", "bridge-clamp-across"})
    for (const auto& clamp : {test::zener_4V7(), test::zener_12V(), test::zener_47V()}) {
      Example example(wiring);
      example.clamp = clamp;
      example.reservoir.rated_voltage_V = 100;
      example.requirement.output.voltage_V = 0.7 * clamp.voltage_V;
      example.discharge_count = 1;
      INFO(wiring << " " << clamp.voltage_V);
      CHECK(value_of(example, discharge_working_voltage) <= value_of(example, dropper_voltage));
    }
}

TEST_CASE("slew goes with the line and against both low ends") {
  Example example;
  const double before = value_of(example, dropper_slew);
  example.series_resistor.resistance_ohm *= 2;
  CHECK_THAT(value_of(example, dropper_slew), WithinRel(before / 2, 1e-9));
  example.dropper.tolerance = 0.2;
  CHECK_THAT(value_of(example, dropper_slew), WithinRel(before / 2 * 0.9 / 0.8, 1e-9));
}

TEST_CASE("an open clamp doubles the crest for half-wave diodes and not for a bridge") {
  Example half, bridge("bridge-clamp-across");
  pure_sine(half);
  pure_sine(bridge);
  const double crest = std::sqrt(2.0) * 253;
  // 703 V was stated for a half-wave supply at its line with the zener open; here 253 V: 716 V. The crest of
  // a tone sum is searched to a small share of itself.
  CHECK_THAT(value_of(half, rectifier_reverse), WithinRel(2 * crest, 1e-6));
  CHECK_THAT(value_of(bridge, rectifier_reverse), WithinRel(crest, 1e-6));
}

TEST_CASE("the discharge rule is met just inside the largest bleeder and broken just outside") {
  Example example;
  pure_sine(example);
  example.requirement.limits.discharge = DischargeRule{34, 1, 0.1e-6, "IEC 60335-1 22.5"};
  example.requirement.surroundings.ambient_degC = {20, 20, 20};  // the film's reference
  example.dropper.capacitance_F = 0.47e-6;
  example.dropper.tolerance = 0;
  example.discharge.tolerance = 0;
  example.discharge_count = 1;
  // IEC 60335-1 clause 22.5: 0.904 megohm for 0.47 uF from the crest of 253 V (worked from 34 V, 1 s).
  example.discharge.resistance_ohm = 0.903e6;
  CHECK(judge(example, discharge_voltage).value().pass == true);
  example.discharge.resistance_ohm = 0.905e6;
  CHECK(judge(example, discharge_voltage).value().pass == false);
}

TEST_CASE("without a chain the crest stays, and a small dropper needs none") {
  Example example;
  CHECK_FALSE(judge(example, discharge_voltage));  // no rule
  example.requirement.limits.discharge = DischargeRule{34, 1, 0.1e-6, "IEC 60335-1 22.5"};
  example.discharge_count = 0;
  const Check bare = judge(example, discharge_voltage).value();
  CHECK(bare.pass == false);
  CHECK(*bare.value > std::sqrt(2.0) * 253);
  CHECK_FALSE(judge(example, discharge_power));
  CHECK_FALSE(judge(example, discharge_working_voltage));
  example.dropper.capacitance_F = 0.09e-6;  // 10 %: 0.099 uF at most
  CHECK_FALSE(judge(example, discharge_voltage));
}

TEST_CASE("a bleeder at the mains exceeds one chip's 200 V and not two in series") {
  // Chip resistor data sheets: 200 V limiting element voltage for size 1206.
  Example example;
  example.discharge_count = 1;
  CHECK(judge(example, discharge_working_voltage).value().pass == false);
  example.discharge_count = 2;
  CHECK(judge(example, discharge_working_voltage).value().pass == true);
}

TEST_CASE("ten kelvin more over life halve the reservoir's life") {
  Example example;
  example.requirement.surroundings.mean_over_life_degC = 45;
  const double before = value_of(example, reservoir_life);
  example.requirement.surroundings.mean_over_life_degC = 55;
  CHECK_THAT(value_of(example, reservoir_life), WithinRel(before / 2, 1e-9));
}

TEST_CASE("a ripple rating at 120 Hz counts 0.8 in a half-wave supply at the mains") {
  Example example;
  // Common practice: 0.8 from 120 Hz to 50 or 60 Hz.
  CHECK_THAT(*judge(example, reservoir_ripple).value().limit, WithinRel(0.8 * 0.3, 1e-9));
}

TEST_CASE("ripple is judged under load and not asleep") {
  Example example;
  const Check check = judge(example, reservoir_ripple).value();
  CHECK(check.at.load == "awake");
  // A half-wave supply feeds the reservoir for half the period at most: the charge of a 10 mA load comes back
  // in pulses of at least twice that, so the r.m.s. ripple is at least the load itself.
  CHECK(*check.value >= 10e-3);
}

TEST_CASE("leakage has the data's and the margin to live on, and grows fivefold from 20 to 85 degC") {
  Example example;
  example.linear(5, 0.04, 1.7, 60e-6);
  example.requirement.surroundings.enclosure_K_per_W = 0;
  for (const double hot_degC : {20.0, 52.5, 85.0}) {
    example.requirement.surroundings.ambient_degC = {0, 20, hot_degC};
    const Check check = judge(example, reservoir_leakage).value();
    // 55 uA at 25 V by the data; half of the way in log is the root of five.
    const double factor = hot_degC == 20 ? 1 : hot_degC == 85 ? 5 : std::sqrt(5.0);
    Evidence evidence(example.design(), example.requirement, example.supply());
    CHECK_THAT(*check.value, WithinRel(55e-6 * evidence.rich_empty().rail_greatest_V / 25 * factor, 1e-9));
    const double margin_A = *judge(example, supply_margin).value().value;
    CHECK_THAT(*check.limit, WithinRel(55e-6 + margin_A, 1e-9));
  }
}

TEST_CASE("a margin that holds by the data leakage can be lost to the leakage of warm air") {
  Example example;
  example.linear(5, 0.04, 1.7, 60e-6);
  example.requirement.surroundings.ambient_degC = {0, 25, 65};
  example.reservoir.leakage_A = 0.5e-3;
  auto& load_A = example.requirement.output.loads.back().current_A;
  load_A += *judge(example, supply_margin).value().value - 0.1e-3;
  CHECK(judge(example, supply_margin).value().pass == true);
  CHECK(judge(example, reservoir_leakage).value().pass == false);
  // 12.6 V of 25 V at 65 degC: 3.05 times half the data, so half as much again; 0.3 mA more margin is enough.
  load_A -= 0.3e-3;
  CHECK(judge(example, reservoir_leakage).value().pass == true);
}

TEST_CASE("a linear stage is hottest awake, and more so with more load") {
  Example example;
  example.linear(5, 0.04, 1.7, 60e-6);
  example.stage.thermal_resistance_K_per_W = 180;
  example.stage.max_junction_degC = 150;
  const Check light = judge(example, output_stage_junction).value();
  CHECK(light.at.load == "awake");
  example.requirement.output.loads.back().current_A = 15e-3;
  CHECK(value_of(example, output_stage_junction) > *light.value);
}

TEST_CASE("a direct output has neither junction nor input rating") {
  Example example;
  CHECK_FALSE(judge(example, output_stage_junction));
  CHECK_FALSE(judge(example, output_stage_input));
}

TEST_CASE("the tallest part decides the height, and an unknown one cannot hide a part that is too tall") {
  Example example;
  CHECK_FALSE(judge(example, board_height));
  example.requirement.surroundings.max_height_mm = 17;
  example.dropper.info.height_um = 16'500;
  CHECK(value_of(example, board_height) == 16.5);
  example.clamp.info.height_um.reset();
  CHECK_FALSE(judge(example, board_height).value().pass);
  example.dropper.info.height_um = 18'000;
  CHECK(judge(example, board_height).value().pass == false);
}

}  // namespace
}  // namespace dropfront::scoring
