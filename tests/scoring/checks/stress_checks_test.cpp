// Checks of series resistor, clamp and rail: laws and energy.
#include <cmath>

#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using test::Example;
using test::judge;
using test::value_of;

TEST_CASE("more line voltage never lowers a stress") {
  for (const auto& arrangement : circuit::arrangements()) {
    // A shunt holds its rail at the firing threshold: more current only makes it fire earlier.
    if (arrangement.thyristor_shunt) continue;
    // Nor has 47 ohm without a dropper figures to compare: its clamp is far beyond any rating.
    if (!arrangement.dropper) continue;
    for (CheckFunction* check :
         {resistor_power, resistor_voltage, resistor_pulse, resistor_pulse_voltage, clamp_power,
          clamp_junction, clamp_pulse, rectifier_reverse, rectifier_surge, rail_max, rail_transient,
          dropper_voltage, dropper_slew, reservoir_voltage, discharge_power, discharge_working_voltage}) {
      double before = 0;
      for (double high : {230.0, 242.0, 253.0, 264.0}) {
        Example example(arrangement.name.data());
        example.supply().voltage_Vrms.high = high;
        const Check now = judge(example, check).value();
        INFO(now.id << " at " << high << " V, " << arrangement.name);
        CHECK(now.value.value() >= before * (1 - 1e-9));
        before = *now.value;
      }
    }
  }
}

TEST_CASE("harmonics not stated multiply the resistor's loss by 1.15 and nothing else") {
  Example stated, unstated;
  // The shape that rich conditions take by default, stated: 3 % third harmonic at 180 degrees.
  stated.supply().harmonics = {{3, 0.03, std::acos(-1.0)}};
  stated.supply().harmonics_given = true;
  CHECK_THAT(value_of(unstated, resistor_power), WithinRel(1.15 * value_of(stated, resistor_power), 1e-6));
  CHECK_THAT(value_of(unstated, resistor_voltage), WithinRel(value_of(stated, resistor_voltage), 1e-6));
  CHECK_THAT(value_of(unstated, clamp_power), WithinRel(value_of(stated, clamp_power), 1e-6));
}

TEST_CASE("a resistor is allowed 60 % up to 70 degC and less in hotter air") {
  Example example;
  CHECK_THAT(*judge(example, resistor_power).value().limit, WithinRel(0.6 * 2, 1e-12));
  example.requirement.surroundings.ambient_degC.high = 112.5;  // half way down the line
  CHECK_THAT(*judge(example, resistor_power).value().limit, WithinRel(0.3 * 2, 1e-12));
  example.requirement.surroundings.ambient_degC.high = 50;
  example.requirement.surroundings.enclosure_K_per_W = 60;  // its own heat takes it beyond 70 degC
  CHECK(*judge(example, resistor_power).value().limit < 0.6 * 2);
}

TEST_CASE("the resistor's running loss is close to the reactive current squared") {
  // 2·pi·f·C·V through R, the closed form for a dropper that sees nearly the whole line; the clamp takes a
  // few volts and the third harmonic adds, hence 5 %.
  Example example;
  const double current = 2 * std::acos(-1.0) * 50.5 * 0.68e-6 * 1.1 * 253;
  const double loss = current * current * 47 * 1.05;
  CHECK_THAT(value_of(example, resistor_power) / 1.15, WithinRel(loss, 0.05));
}

TEST_CASE("plug-in energy comes from the dropper and does not depend on the resistor") {
  Example example;
  example.supply().harmonics_given = true;  // pure sine
  example.dropper.capacitance_F = 0.47e-6;
  example.dropper.tolerance = 0;
  example.dropper.loss_tangent = 0;  // all of the loss in resistor, clamp and reservoir
  // ½·C·(2·Vpk)² = 120.3 mJ for 0.47 uF at 253 V (energy balance), less what clamp, diodes and ESR take.
  for (double resistance : {47.0, 100.0, 220.0}) {
    example.series_resistor.resistance_ohm = resistance;
    const double energy = value_of(example, resistor_pulse);
    INFO(resistance << " ohm: " << energy << " J");
    CHECK(energy < 0.1203 * 1.01);  // the film's temperature law adds half a percent in the cold
    CHECK(energy > 0.1203 * 0.92);
  }
}

TEST_CASE("the same pulse is harder on film than on wire") {
  Example example;
  const double wire = *judge(example, resistor_pulse).value().limit;
  example.series_resistor.construction = parts::Construction::film;
  CHECK(*judge(example, resistor_pulse).value().limit < wire);
}

TEST_CASE("a shorted dropper puts the low line on the resistor's high end") {
  Example example;
  const Check check = judge(example, resistor_opens).value();
  CHECK_THAT(*check.value, WithinRel(207.0 * 207 / (47 * 1.05), 1e-12));
  CHECK_THAT(*check.limit, WithinRel(25.0 * 2, 1e-12));
  CHECK(check.pass == true);
  example.series_resistor.resistance_ohm = 1000;  // 40.8 W: not enough to open
  CHECK(judge(example, resistor_opens).value().pass == false);
}

TEST_CASE("a resistor that is not fusible is never said to open") {
  Example example;
  example.series_resistor.fusible = false;
  example.series_resistor.opens_at.reset();
  const Check bare = judge(example, resistor_opens).value();
  CHECK_FALSE(bare.pass);
  CHECK(bare.basis.find("no fuse") != std::string::npos);
}

TEST_CASE("the clamp is hottest with nothing connected") {
  for (const char* wiring : {"half-wave-clamp-ahead", "half-wave-clamp-across", "bridge-clamp-across"}) {
    Example example(wiring);
    INFO(wiring);
    CHECK(judge(example, clamp_power).value().at.load == "none");
    CHECK(judge(example, clamp_junction).value().at.load == "none");
  }
}

TEST_CASE("the junction judged is the one the clamp's voltage was solved with") {
  Example example;
  Evidence evidence(example.design(), example.requirement, example.supply());
  const double judged = clamp_junction(evidence).value().value.value();
  CHECK_THAT(judged,
             WithinAbs(evidence.rich_empty_hot().clamp_junction_degC, 0.1));  // its fixed point: 0.05 K
}

TEST_CASE(
    "the share of a clamp's pulse rating is told as extrapolated, and beside it what the data alone say") {
  Example example;
  const Check check = judge(example, clamp_pulse).value();
  CHECK(check.basis.find("extrapolated below the data's shortest pulse (from memory)") != std::string::npos);
  const auto figure = [&](std::string_view name) {
    for (const Term& term : check.figures)
      if (term.name == name) return term.value;
    FAIL("no figure " << name);
    return 0.0;
  };
  CHECK(figure("share_extrapolated") == *check.value);
  // The peak taken for 8.3 ms: by hand some 2·Vcrest/Rs of current, 747 V over 45 ohm, at 12.6 V and a few
  // ohms of the low slope, against 4.5 W. A third covers slope, rail and the warm junction.
  const double peak_A = 2 * 1.03 * 253 * std::sqrt(2.0) / (0.95 * 47);
  const double peak_W = peak_A * (12.6 + 0.9 * peak_A);
  CHECK_THAT(figure("share_without_extrapolation"), WithinRel(1.3 * peak_W / 4.5, 0.33));
  // The pulse lasts some Rs·C/2 = 16 us, a twentieth of 8.3 ms in the root of time.
  CHECK(*check.value < 0.2 * figure("share_without_extrapolation"));
}

TEST_CASE("a clamp with twice the pulse rating uses half of it") {
  Example example;
  const double once = value_of(example, clamp_pulse);
  *example.clamp.pulse_power_W *= 2;
  CHECK_THAT(value_of(example, clamp_pulse), WithinRel(once / 2, 1e-12));
  // Four times as long at the same power is twice the rating.
  *example.clamp.pulse_time_s *= 4;
  CHECK_THAT(value_of(example, clamp_pulse), WithinRel(once / 4, 1e-12));
}

TEST_CASE("the rail's limit is the reservoir's derated voltage or the stage's input, whichever is less") {
  Example example;
  CHECK_THAT(*judge(example, rail_max).value().limit, WithinRel(0.8 * 25, 1e-12));
  example.linear(5, 0.04, 1.7, 60e-6);
  example.stage.input_max_V = 16;
  CHECK(judge(example, rail_max).value().limit == 16.0);
  CHECK(judge(example, rail_transient).value().limit == 16.0);
}

TEST_CASE("more ESR never lowers the rail at plug-in") {
  double before = 0;
  for (double esr : {0.1, 0.4, 0.8, 2.0}) {
    Example example;
    example.reservoir.esr_ohm = esr;
    example.reservoir.esr_cold_ohm = 2 * esr;
    const double now = value_of(example, rail_transient);
    INFO(esr << " ohm: " << now << " V");
    CHECK(now >= before);
    before = now;
  }
}

}  // namespace
}  // namespace dropfront::scoring
