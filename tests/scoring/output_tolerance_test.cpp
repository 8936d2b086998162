// A step-down stage whose output stands at an end of its tolerance.
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/stage_law.hpp"
#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

test::Example stepping(double tolerance, const char* wiring = "half-wave-clamp-ahead") {
  test::Example example(wiring);
  test::step_down(example);
  example.stage.tolerance = tolerance;
  return example;
}

}  // namespace

TEST_CASE("A stage at the upper end of its tolerance draws more for the same load, by that tolerance") {
  const auto stage = stepping(0.04).stage;
  // eta·v·I = Vout·I_out: 5 V, 84 %, rail 10 V; rounding only.
  const double own_A = 60e-6;
  const double nominal_A = 5 * 0.01 / (0.84 * 10);
  CHECK_THAT(stage_current_A(stage, 0.01, 10, Quiescent::data) - own_A, WithinRel(1.04 * nominal_A, 1e-9));
  CHECK_THAT(stage_current_A(stage, 0.01, 10, Quiescent::data, End::nominal) - own_A,
             WithinRel(nominal_A, 1e-9));
  CHECK_THAT(stage_current_A(stage, 0.01, 10, Quiescent::data, End::low) - own_A,
             WithinRel(0.96 * nominal_A, 1e-9));
}

TEST_CASE(
    "The capability of a step-down falls by the output's tolerance, and so does what the start can take") {
  auto exact = stepping(0.0), loose = stepping(0.04);
  Evidence sharp(exact.design(), exact.requirement, exact.supply());
  Evidence wide(loose.design(), loose.requirement, loose.supply());
  REQUIRE(sharp.lean().usable);
  REQUIRE(wide.lean().usable);
  // The rail's greatest power is the same; rounding only.
  CHECK_THAT(wide.lean().capability_A, WithinRel(sharp.lean().capability_A / 1.04, 1e-12));
  const double overhead_A = 60e-6 + 55e-6;
  const double sharp_A = *test::judge(exact, supply_start)->limit - overhead_A;
  CHECK_THAT(*test::judge(loose, supply_start)->limit - overhead_A, WithinRel(1.04 * sharp_A, 1e-9));
}

TEST_CASE("Each corner takes the end of the output that is worst there") {
  const double beside_A = 60e-6 + 55e-6;  // Iq and leakage
  const auto load_A = [](const OperatingPoint& point, double beside, bool trough) {
    // Of the rail current, by eta·v·(I - beside) = Vout·I_out at the nominal output.
    const double rail_V = trough ? point.state.rail_min_V : point.state.rail_mean_V;
    return 0.84 * rail_V * (point.rail_current_A - beside) / 5;
  };
  const auto loose = stepping(0.04, "bridge-clamp-across");
  Evidence wide(loose.design(), loose.requirement, loose.requirement.supplies[0]);
  // The current settles to a millionth with the rail.
  CHECK_THAT(load_A(wide.nominal(), beside_A, false), WithinRel(10e-3, 1e-5));
  CHECK_THAT(load_A(wide.standby(), beside_A, false), WithinRel(0.2e-3, 1e-5));
  CHECK_THAT(load_A(wide.lean_hot(), beside_A, true), WithinRel(10.4e-3, 1e-5));
  // Rich: no Iq, a tenth of the leakage.
  CHECK_THAT(load_A(wide.rich_loads().back(), 5.5e-6, false), WithinRel(10.4e-3, 1e-5));
  CHECK_THAT(load_A(wide.standby_worst(), beside_A, false), WithinRel(0.192e-3, 1e-5));
}

TEST_CASE("The end of the output in the worst standby is the one that takes more from the line") {
  // A zener burns what the load leaves; a shunt's input rises with the load.
  for (const auto* wiring : {"half-wave-clamp-across", "half-wave-thyristor-shunt"}) {
    INFO(wiring);
    auto exact = stepping(0.0, wiring), loose = stepping(0.2, wiring);
    for (auto* example : {&exact, &loose}) example->requirement.output.loads[0].current_A = 5e-3;
    Evidence sharp(exact.design(), exact.requirement, exact.supply());
    Evidence wide(loose.design(), loose.requirement, loose.supply());
    CHECK(wide.standby_worst().state.input_power_W > sharp.standby_worst().state.input_power_W);
  }
}
