// Which load acts in which corner: always-on rail loads everywhere, states of the output where they run,
// bursts by their mean in the lean corner only, the start load while the rail rises.
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using test::Example;

Example regulated() {
  Example example("half-wave-clamp-across");
  example.linear(5, 0.04, 1.7, 1e-3);
  return example;
}

/// Corner figures of one example; the pair below compares with and without one load.
struct Corners {
  double margin_A, standby_A, rich_empty_A, rich_loaded_A, nominal_A, required_V, start_limit_A;
};

Corners corners(const Example& example) {
  Evidence evidence(example.design(), example.requirement, example.requirement.supplies[0]);
  return {evidence.lean().margin_A,
          evidence.standby().rail_current_A,
          evidence.rich_empty().rail_current_A,
          evidence.rich_loads().back().rail_current_A,
          evidence.nominal().rail_current_A,
          evidence.required_rail_V(),
          supply_start(evidence).value().limit.value()};
}

// The available current is searched to about 1e-6 of itself.
constexpr double kSearch_A = 1e-7;

TEST_CASE("a rail load that cannot be removed acts in every corner and while starting") {
  auto example = regulated();
  const auto before = corners(example);
  example.requirement.output.loads.push_back({"indicator", true, 1.5e-3, {}, {}, {}});
  const auto after = corners(example);
  CHECK_THAT(before.margin_A - after.margin_A, WithinAbs(1.5e-3, kSearch_A));
  CHECK_THAT(after.standby_A - before.standby_A, WithinRel(1.5e-3, 1e-9));
  CHECK_THAT(after.rich_empty_A - before.rich_empty_A, WithinRel(1.5e-3, 1e-9));
  CHECK_THAT(after.rich_loaded_A - before.rich_loaded_A, WithinRel(1.5e-3, 1e-9));
  CHECK_THAT(after.nominal_A - before.nominal_A, WithinRel(1.5e-3, 1e-9));
  CHECK_THAT(after.start_limit_A - before.start_limit_A, WithinRel(1.5e-3, 1e-9));
}

TEST_CASE("its minimum raises the rail that is required, only where it is the higher one") {
  auto example = regulated();
  const double own_V = corners(example).required_V;
  CHECK_THAT(own_V, WithinRel(5 * 1.04 + 1.7, 1e-12));
  example.requirement.output.loads.push_back({"relay hold", true, 1e-3, 6.0, {}, {}});
  CHECK(corners(example).required_V == own_V);
  example.requirement.output.loads.back().min_voltage_V = 9.5;
  const auto high = corners(example);
  CHECK(high.required_V == 9.5);
  example.requirement.output.loads.back().min_voltage_V = 10.5;
  CHECK(corners(example).margin_A < high.margin_A);
}

TEST_CASE("a state of the output acts where it runs: not asleep, not in the unloaded corner") {
  auto example = regulated();
  const auto before = corners(example);
  example.requirement.output.loads[1].current_A += 2e-3;
  const auto after = corners(example);
  CHECK_THAT(before.margin_A - after.margin_A, WithinAbs(2e-3, kSearch_A));
  CHECK(after.standby_A == before.standby_A);
  CHECK(after.rich_empty_A == before.rich_empty_A);
  CHECK_THAT(after.rich_loaded_A - before.rich_loaded_A, WithinRel(2e-3, 1e-9));
  CHECK(after.start_limit_A == before.start_limit_A);
}

TEST_CASE("the standby load acts asleep alone") {
  auto example = regulated();
  const auto before = corners(example);
  example.requirement.output.loads[0].current_A += 1e-3;
  const auto after = corners(example);
  CHECK_THAT(after.standby_A - before.standby_A, WithinRel(1e-3, 1e-9));
  CHECK(after.margin_A == before.margin_A);
  CHECK(after.rich_empty_A == before.rich_empty_A);
  CHECK(after.start_limit_A == before.start_limit_A);
  example.requirement.output.standby_load.reset();  // "none"
  CHECK_THAT(before.standby_A - corners(example).standby_A, WithinRel(0.2e-3, 1e-9));
}

TEST_CASE("a start load acts while the rail rises and nowhere else") {
  auto example = regulated();
  const auto before = corners(example);
  example.requirement.output.start_load_A = 2e-3;
  const auto after = corners(example);
  CHECK_THAT(before.start_limit_A - after.start_limit_A, WithinRel(8e-3, 1e-9));
  CHECK(after.margin_A == before.margin_A);
  CHECK(after.standby_A == before.standby_A);
  CHECK(after.rich_empty_A == before.rich_empty_A);
  CHECK(after.nominal_A == before.nominal_A);
}

TEST_CASE("a repeated burst counts by its mean on top of the heaviest state, never asleep") {
  // 40 mA for 15 ms every 2 s: 0.3 mA.
  for (const bool at_rail : {false, true}) {
    auto example = regulated();
    const auto before = corners(example);
    example.requirement.output.loads.push_back({"pull-in", at_rail, 40e-3, {}, 15e-3, 2.0});
    const auto after = corners(example);
    INFO("at the rail: " << at_rail);
    CHECK_THAT(before.margin_A - after.margin_A, WithinAbs(0.3e-3, kSearch_A));
    CHECK_THAT(after.nominal_A - before.nominal_A, WithinRel(0.3e-3, 1e-9));
    CHECK_THAT(after.rich_loaded_A - before.rich_loaded_A, WithinRel(0.3e-3, 1e-9));
    CHECK(after.standby_A == before.standby_A);
    CHECK(after.rich_empty_A == before.rich_empty_A);
    example.requirement.output.loads.back().period_s.reset();  // once only: no mean
    CHECK(corners(example).margin_A == before.margin_A);
  }
}

TEST_CASE("a load that cannot be removed lowers the unloaded rail and the clamp's power") {
  auto example = regulated();
  Evidence free(example.design(), example.requirement, example.supply());
  example.requirement.output.loads.push_back({"indicator", true, 3e-3, {}, {}, {}});
  Evidence held(example.design(), example.requirement, example.supply());
  CHECK(held.rich_empty().rail_greatest_V < free.rich_empty().rail_greatest_V);
  CHECK(clamp_power(held).value().value < clamp_power(free).value().value);
}

}  // namespace
}  // namespace dropfront::scoring
