// supply.burst, supply.start_time, supply.stable, supply.dip.
#include <algorithm>
#include <cmath>

#include "dropfront/scoring/stability.hpp"
#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using test::Example;
using test::judge;
using test::value_of;

Example regulated(const char* wiring = "half-wave-clamp-across") {
  Example example(wiring);
  example.linear(5, 0.04, 1.7, 1e-3);
  return example;
}

Load burst(double current_A, double for_s, std::optional<double> every_s, bool at_rail = true) {
  return {"relay", at_rail, current_A, {}, for_s, every_s};
}

TEST_CASE("bursts, dips and starts are checked only where the problem names them") {
  Example example = regulated();
  CHECK_FALSE(judge(example, supply_burst));
  CHECK_FALSE(judge(example, supply_dip));
  CHECK_FALSE(judge(example, supply_start_time));
  CHECK(judge(example, supply_stable));
}

TEST_CASE("a bigger or longer burst is never better, and passes only with the rail it needs") {
  Example example = regulated();
  auto& loads = example.requirement.output.loads;
  loads.push_back(burst(10e-3, 15e-3, 2.0));
  const Check light = judge(example, supply_burst).value();
  CHECK(light.pass == true);
  CHECK(light.at.load == "relay");
  CHECK(light.at.phase_deg.has_value());
  CHECK_THAT(*light.limit, WithinRel(5 * 1.04 + 1.7, 1e-12));
  double before_V = *light.value;
  for (const auto& next : {burst(40e-3, 15e-3, 2.0), burst(40e-3, 40e-3, 2.0), burst(90e-3, 40e-3, 2.0)}) {
    loads.back() = next;
    const double now_V = value_of(example, supply_burst);
    CHECK(now_V < before_V);
    before_V = now_V;
  }
  CHECK(judge(example, supply_burst)->pass == false);
}

TEST_CASE("a burst's own minimum counts in this check where it is the higher one") {
  Example example = regulated();
  auto& loads = example.requirement.output.loads;
  loads.push_back(burst(10e-3, 15e-3, {}));
  loads.back().min_voltage_V = 6;
  CHECK_THAT(*judge(example, supply_burst)->limit, WithinRel(6.9, 1e-12));
  loads.back().min_voltage_V = 11;
  const Check check = judge(example, supply_burst).value();
  CHECK(check.limit == 11.0);
  CHECK(check.pass == false);
}

TEST_CASE(
    "at a linear stage a burst weighs the same at the output and on the rail; a step-down stage eases it") {
  Example example = regulated();
  auto& loads = example.requirement.output.loads;
  loads.push_back(burst(20e-3, 15e-3, {}, true));
  const double at_rail_V = value_of(example, supply_burst);
  loads.back().at_rail = false;
  CHECK_THAT(value_of(example, supply_burst), WithinAbs(at_rail_V, 1e-9));
  test::step_down(example);
  const double at_output_V = value_of(example, supply_burst);
  loads.back().at_rail = true;
  CHECK(at_output_V > value_of(example, supply_burst) + 0.1);  // 5 V against 8 to 12 V of rail
}

TEST_CASE("other bursts act by their mean, a burst itself only while it lasts") {
  Example example = regulated();
  auto& loads = example.requirement.output.loads;
  loads.push_back(burst(20e-3, 15e-3, 2.0));
  const double alone_V = value_of(example, supply_burst);
  loads.push_back({"beeper", false, 4e-3, {}, 1.0, 2.0});  // mean 2 mA
  const double with_mean_V = value_of(example, supply_burst);
  loads.back() = {"lamp", true, 2e-3, {}, {}, {}};                            // 2 mA always on
  CHECK_THAT(value_of(example, supply_burst), WithinAbs(with_mean_V, 1e-3));  // their own temperatures
  CHECK(with_mean_V < alone_V);
}

TEST_CASE("a longer or deeper dip is never better, and the whole voltage is no dip") {
  Example example = regulated();
  auto& dips = example.requirement.limits.dips;
  double before_V = INFINITY;
  for (const Dip& dip : {Dip{1.0, 1.0}, Dip{0.7, 5}, Dip{0.4, 5}, Dip{0, 5}, Dip{0, 10}}) {
    dips = {dip};
    const Check check = judge(example, supply_dip).value();
    INFO(dip.residual << " for " << dip.cycles << ": " << check.basis);
    CHECK(*check.value <= before_V + 1e-6);
    before_V = *check.value;
  }
  CHECK(judge(example, supply_dip)->pass == false);
  dips = {{1.0, 1.0}, {0, 0.5}};
  const Check both = judge(example, supply_dip).value();
  dips = {{0, 0.5}};
  CHECK(both.value == judge(example, supply_dip)->value);  // the worst of the list
  dips = {{1.0, 1.0}};
  // The least steady rail of both ambients and all ends: at least as low as at the ends that decide the
  // margin.
  CHECK(value_of(example, supply_dip) <= value_of(example, supply_stable) + 1e-6);
}

TEST_CASE("the start lengthens with the reservoir and the start load") {
  Example example = regulated();
  example.requirement.limits.start_time_s = 2;
  const Check plain = judge(example, supply_start_time).value();
  CHECK(plain.pass == true);
  example.reservoir.capacitance_F *= 2;
  // Twice the charge at the same mean current, one helping a period: 20.2 ms.
  CHECK_THAT(value_of(example, supply_start_time), WithinAbs(2 * *plain.value, 0.041));
  example.requirement.output.start_load_A += 3e-3;
  CHECK(value_of(example, supply_start_time) > 2 * *plain.value);
}

TEST_CASE("a start that never comes fails with a figure beyond its limit and says why") {
  Example example = regulated();
  example.requirement.limits.start_time_s = 1;
  example.requirement.output.start_load_A = 40e-3;
  const Check low = judge(example, supply_start_time).value();
  CHECK(low.pass == false);
  CHECK(low.value == 2.0);
  CHECK(low.basis.find("never") != std::string::npos);
  example.requirement.output.start_load_A = 10e-3;
  example.requirement.limits.start_time_s = 0.1;
  CHECK(judge(example, supply_start_time)->pass == false);
}

TEST_CASE("a step-down stage starts where its turn-on rule holds; without input_on nothing is shown") {
  Example example("half-wave-clamp-across");
  test::step_down(example);
  example.requirement.limits.start_time_s = 2;
  for (const double load_A : {5e-3, 15e-3, 40e-3, 60e-3}) {
    example.requirement.output.start_load_A = load_A;
    const bool rule = judge(example, supply_start)->pass.value();
    INFO(load_A << " A");
    // The rule asks the current at the turn-on rail alone: where it holds, the run must come up.
    if (rule) CHECK(judge(example, supply_start_time)->pass == true);
  }
  CHECK(judge(example, supply_start_time)->pass == false);
  example.stage.input_on_V.reset();
  const Check unknown = judge(example, supply_start_time).value();
  CHECK_FALSE(unknown.pass);
  CHECK_FALSE(unknown.unsolved);
  CHECK(unknown.basis.find("start not shown") != std::string::npos);
}

TEST_CASE("a constant current needs no run to be stable, constant power and shunts get one") {
  Example example = regulated();
  Evidence passive(example.design(), example.requirement, example.supply());
  const Check still = supply_stable(passive).value();
  CHECK(still.pass == true);
  CHECK(passive.transients() == 0);
  // The ambient that does not decide the margin is taken here at the other's ends: some microvolts.
  const double lean_V = std::min(passive.lean_cold().state.rail_min_V, passive.lean_hot().state.rail_min_V);
  CHECK_THAT(*still.value, WithinAbs(lean_V, 1e-3));
  test::step_down(example);
  Evidence stepping(example.design(), example.requirement, example.supply());
  const Check run = supply_stable(stepping).value();
  CHECK(stepping.transients() == 2);
  CHECK(run.pass == true);
  // Taken at the rail's trough the current is the greatest the law gives: the run ends no lower.
  CHECK(*run.value >= run.figures.back().value - 1e-3);
  auto shunt = regulated("half-wave-thyristor-shunt");
  Evidence firing(shunt.design(), shunt.requirement, shunt.supply());
  CHECK(supply_stable(firing)->pass == true);
}

TEST_CASE("a constant power beyond the rail's capability does not stay up") {
  Example example("half-wave-clamp-across");
  test::step_down(example);
  Evidence evidence(example.design(), example.requirement, example.supply());
  example.requirement.output.loads.back().current_A = 1.1 * evidence.lean().capability_A;
  CHECK(judge(example, supply_stable)->pass == false);
  example.requirement.output.loads.back().current_A = 0.9 * evidence.lean().capability_A;
  CHECK(judge(example, supply_stable)->pass == true);
}

TEST_CASE("absurd and starved designs get figures that are numbers, or none") {
  for (int which = 0; which < 6; ++which) {
    Example odd = regulated();
    if (which == 1) test::step_down(odd);
    if (which <= 1) odd.dropper.capacitance_F = 1e-12;
    if (which == 2) odd.series_resistor.resistance_ohm = 1e7;
    if (which == 3) odd.clamp = test::one_watt_zener(300, 1e-3, 100, 1000, 1e-4, 1e-3);
    if (which == 4) odd.reservoir.capacitance_F = 1e-9;
    if (which == 5) odd.dropper.capacitance_F = 1e-3;
    odd.requirement.limits.dips = {{0, 0.5}, {0.7, 25}};
    odd.requirement.limits.start_time_s = 1;
    odd.requirement.output.loads.push_back(burst(10e-3, 15e-3, 2.0));
    for (auto* check : {&supply_burst, &supply_dip, &supply_start_time, &supply_stable}) {
      const Check answer = judge(odd, check).value();
      INFO(which << " " << answer.id << ": " << answer.basis);
      if (answer.value) CHECK(std::isfinite(*answer.value));
      if (which <= 2) CHECK_FALSE(answer.pass == true);
    }
  }
}

TEST_CASE("without the rail it needs a stage's runs have no verdict") {
  Example example;
  test::step_down(example);
  example.stage.input_min_V.reset();
  example.requirement.limits.dips = {{0, 0.5}};
  example.requirement.limits.start_time_s = 1;
  example.requirement.output.loads.push_back(burst(10e-3, 15e-3, {}));
  for (auto* check : {&supply_burst, &supply_dip, &supply_start_time, &supply_stable}) {
    const Check unknown = judge(example, check).value();
    CHECK(unknown.unsolved);
    CHECK_FALSE(unknown.pass);
    CHECK_FALSE(unknown.value);
  }
}

}  // namespace
}  // namespace dropfront::scoring
