#include "dropfront/scoring/build.hpp"

#include "dropfront/scoring/evidence.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinRel;
constexpr double kRounding = 1e-12;  // two ways of multiplying the same numbers

TEST_CASE("a build stands where its parts' tolerances end, and keeps no tolerance") {
  const test::Example example;
  Build build(example.design());
  const Design& built = build.design();
  CHECK(built.dropper->tolerance == 0);
  CHECK(built.clamp->voltage_min_V == built.clamp->voltage_max_V);
  CHECK(built.clamp->slope_min_ohm == built.clamp->slope_resistance_ohm);
  build.set(BuildAxis::dropper, 0);
  build.set(BuildAxis::clamp_voltage, 1);
  build.set(BuildAxis::esr, 0);
  CHECK_THAT(built.dropper->capacitance_F, WithinRel(0.9 * 0.68e-6, kRounding));
  CHECK_THAT(built.clamp->voltage_max_V, WithinRel(1.05 * 12, kRounding));
  CHECK_THAT(built.reservoir->esr_ohm, WithinRel(0.08, kRounding));
  CHECK_THAT(built.reservoir->esr_cold_ohm, WithinRel(0.16, kRounding));
  for (const BuildAxis axis : build_axes(example.design())) {
    build.set(axis, 0);
    const double low = build.value(axis);
    build.set(axis, 1);
    CHECK(low < build.value(axis));
  }
}

TEST_CASE("positions beyond the ends, or not a number, stay inside") {
  const test::Example example;
  Build build(example.design());
  build.set(BuildAxis::dropper, 7);
  CHECK_THAT(build.value(BuildAxis::dropper), WithinRel(1.1 * 0.68e-6, kRounding));
  build.set(BuildAxis::dropper, std::nan(""));
  CHECK_THAT(build.value(BuildAxis::dropper), WithinRel(0.9 * 0.68e-6, kRounding));
}

TEST_CASE("a part without tolerance or an empty slot is no axis") {
  test::Example example;
  const auto before = build_axes(example.design()).size();
  example.dropper.tolerance = 0;
  example.discharge_count = 0;
  CHECK(build_axes(example.design()).size() == before - 2);
}

TEST_CASE("a build that was not moved runs as the nominal design does") {
  const test::Example example;
  const Build build(example.design());
  Evidence nominal(example.design(), example.requirement, example.requirement.supplies.front());
  Evidence built(build.design(), example.requirement, example.requirement.supplies.front());
  CHECK_THAT(built.nominal().state.rail_mean_V, WithinRel(nominal.nominal().state.rail_mean_V, kRounding));
  CHECK_THAT(built.standby().state.input_power_W,
             WithinRel(nominal.standby().state.input_power_W, kRounding));
}

}  // namespace
}  // namespace dropfront::scoring
