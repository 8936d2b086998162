// supply.margin, supply.start, output.band, standby.power.
#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinRel;
using test::Example;
using test::judge;

TEST_CASE("the margin asked for is a share of the heaviest load") {
  Example example;
  example.linear(5, 0.04, 1.7, 60e-6);
  example.requirement.limits.current_margin = 0.1;
  const Check check = judge(example, supply_margin).value();
  CHECK_THAT(*check.limit, WithinRel(1e-3, 1e-12));  // a tenth of 10 mA
  CHECK(check.pass == true);
}

TEST_CASE("a milliampere more load is a milliampere less margin on a clamped rail") {
  Example example;
  example.linear(5, 0.04, 1.7, 60e-6);
  const double before = test::value_of(example, supply_margin);
  example.requirement.output.loads.back().current_A += 1e-3;
  // Both from the same available current, which is found to 1e-6 of some 20 mA.
  CHECK_THAT(before - test::value_of(example, supply_margin), WithinRel(1e-3, 1e-4));
}

TEST_CASE("a step-down starts exactly where its turn-on rule says") {
  // input_on > P/(efficiency·(Id - Iq)), with leakage in the place of more Iq; the output 3 % high.
  Example example;
  test::step_down(example);
  for (double load : {1e-3, 5e-3, 20e-3, 35e-3, 60e-3}) {
    example.requirement.output.start_load_A = load;
    const Check check = judge(example, supply_start).value();
    const double own = example.stage.quiescent_current_A + example.reservoir.leakage_A;
    const double needed_V =
        1.03 * example.stage.output_voltage_V * load / (*example.stage.efficiency * (*check.value - own));
    INFO(load << " A at the output, " << needed_V << " V needed");
    CHECK(check.pass == (*example.stage.input_on_V > needed_V));
  }
}

TEST_CASE("a step-down whose turn-on threshold lies above the clamp never starts") {
  Example example;
  test::step_down(example);
  example.stage.input_on_V = 14;  // the 12 V clamp ends at 12.6 V and its slope
  const Check check = judge(example, supply_start).value();
  CHECK(check.pass == false);
  CHECK(check.value == 0.0);
}

TEST_CASE("a linear stage starts against its current in dropout") {
  Example example;
  example.linear(5, 0.04, 1.7, 60e-6);
  const double calm = *judge(example, supply_start).value().limit;
  example.stage.quiescent_current_dropout_A = 2e-3;
  CHECK_THAT(*judge(example, supply_start).value().limit - calm, WithinRel(2e-3 - 60e-6, 1e-9));
}

TEST_CASE("a stage on the very edge of the asked band is inside it") {
  Example example;
  example.linear(5, 0.04, 1.7, 60e-6);
  example.requirement.output.tolerance = 0.04;
  CHECK(judge(example, output_band).value().pass == true);
  example.requirement.output.tolerance = 0.0399;
  CHECK(judge(example, output_band).value().pass == false);
  example.stage.output_voltage_V = 3.3;
  CHECK(judge(example, output_band).value().pass == false);
}

TEST_CASE("a direct output is judged by its rail, loaded and empty") {
  Example example;  // 12 V zener at 5 % behind a diode: about 10.5 V to 13 V
  example.requirement.output.tolerance = 0.25;
  const Check wide = judge(example, output_band).value();
  CHECK(wide.pass == true);
  CHECK(*wide.value > 12 - 11.4 * 0.95);
  example.requirement.output.tolerance = 0.02;
  CHECK(judge(example, output_band).value().pass == false);
}

TEST_CASE("standby power is checked only where a limit is asked for") {
  Example example;
  CHECK_FALSE(judge(example, standby_power));
  example.requirement.limits.standby_power_W = 0.5;
  const Check check = judge(example, standby_power).value();
  CHECK(check.limit == 0.5);
  CHECK(check.at.corner == "standby_worst");
}

}  // namespace
}  // namespace dropfront::scoring
