#include "dropfront/scoring/evidence.hpp"

#include <cmath>

#include "dropfront/scoring/clamp_power.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

const char* const kWirings[] = {"half-wave-clamp-ahead", "half-wave-clamp-across", "bridge-clamp-across",
                                "bridge-clamp-ahead"};

test::Example regulated(const char* wiring) {
  test::Example example(wiring);
  example.linear(5, 0.04, 1.7, 1e-3);
  return example;
}

}  // namespace

TEST_CASE("Every corner of every arrangement has a steady state that keeps the energy law") {
  for (const auto* wiring : kWirings) {
    const auto example = regulated(wiring);
    Evidence evidence(example.design(), example.requirement, example.requirement.supplies[0]);
    for (const auto* point : {&evidence.nominal(), &evidence.lean_cold(), &evidence.lean_hot(),
                              &evidence.rich_empty(), &evidence.rich_empty_hot(), &evidence.rich_loaded(),
                              &evidence.standby(), &evidence.standby_worst()}) {
      INFO(wiring << " " << point->corner);
      REQUIRE(point->state.usable());
      REQUIRE(point->state.energy_residual <= 1e-6);
      REQUIRE(point->rail_current_A >= point->load_current_A);
    }
  }
}

TEST_CASE("What a corner holds does not depend on the order of the questions") {
  for (const auto* wiring : {"half-wave-clamp-ahead", "bridge-clamp-across"}) {
    const auto example = regulated(wiring);
    Evidence one(example.design(), example.requirement, example.requirement.supplies[0]);
    Evidence other(example.design(), example.requirement, example.requirement.supplies[0]);
    const double lean = one.lean().margin_A;
    const double hot = one.lean_hot().state.rail_min_V;
    const double standby = one.standby_worst().state.input_power_W;
    const double loaded = one.rich_loaded().state.input_power_W;
    const double plug_in = one.plug_in().rail_max_V;
    // To the bit: the same start states, whatever came before.
    REQUIRE(other.plug_in().rail_max_V == plug_in);
    REQUIRE(other.rich_loaded().state.input_power_W == loaded);
    REQUIRE(other.lean_hot().state.rail_min_V == hot);
    REQUIRE(other.standby_worst().state.input_power_W == standby);
    REQUIRE(other.lean().margin_A == lean);
  }
}

TEST_CASE("The junction sits where the power solved for puts it, the air where the enclosure does") {
  auto example = regulated("half-wave-clamp-across");
  example.requirement.surroundings.enclosure_K_per_W = 12;
  Evidence evidence(example.design(), example.requirement, example.supply());
  for (const auto* point : {&evidence.rich_empty_hot(), &evidence.rich_empty(), &evidence.rich_loaded()}) {
    const double power = clamp_power_W(*example.arrangement, point->values, point->state);
    REQUIRE_THAT(point->local_degC, WithinAbs(point->ambient_degC + 12 * point->state.input_power_W, 0.1));
    // 0.05 K is the settling tolerance; twice that with both temperatures in it.
    REQUIRE_THAT(point->clamp_junction_degC, WithinAbs(point->local_degC + 100 * power, 0.1));
  }
  REQUIRE(evidence.rich_empty_hot().clamp_junction_degC > evidence.rich_empty_hot().local_degC + 5);
}

TEST_CASE("Worst is never better than nominal") {
  for (const auto* wiring : kWirings) {
    const auto example = regulated(wiring);
    Evidence evidence(example.design(), example.requirement, example.requirement.supplies[0]);
    INFO(wiring);
    REQUIRE(evidence.lean().available_A < *evidence.available_A(evidence.nominal()));
    REQUIRE(evidence.standby_worst().state.input_power_W > evidence.standby().state.input_power_W);
    REQUIRE(evidence.rich_empty().rail_greatest_V >= evidence.rich_empty_hot().rail_greatest_V);
    REQUIRE(evidence.rich_empty().rail_greatest_V > evidence.standby().state.rail_max_V);
    for (const auto& point : evidence.rich_loads()) {
      REQUIRE(evidence.rich_loaded().state.input_power_W >= point.state.input_power_W);
    }
    REQUIRE(*evidence.margin_new_A() > evidence.lean().margin_A);
  }
}

TEST_CASE("A clamp ahead lifts the unloaded rail to its own voltage, no drop taken off") {
  // No load: the reservoir charges until the series diode carries nothing, so the rail without that diode's
  // drop is the clamp's crest: at least the high curve's threshold, and the crest current's rise above it.
  auto example = regulated("half-wave-clamp-ahead");
  Evidence evidence(example.design(), example.requirement, example.supply());
  const auto& empty = evidence.rich_empty();
  const auto& curve = empty.values.clamp.main;
  const double crest_A = empty.values.mains.omega() * empty.values.dropper_F * empty.values.mains.crest_V();
  REQUIRE(empty.rail_greatest_V > curve.threshold_V);
  // With the peaked mains the current's crest exceeds ω·C·V by what the third harmonic adds to the slope:
  // 3·3 % at most.
  REQUIRE(empty.rail_greatest_V < curve.threshold_V + 1.1 * crest_A * curve.slope_ohm + 0.01);
}

TEST_CASE("A rail load that is always on is there asleep, loaded and lean") {
  auto example = regulated("bridge-clamp-across");
  Evidence without(example.design(), example.requirement, example.supply());
  example.requirement.output.loads.push_back({"lamp", true, 2e-3, {}, {}, {}});
  Evidence with(example.design(), example.requirement, example.supply());
  REQUIRE_THAT(with.standby().rail_current_A - without.standby().rail_current_A, WithinRel(2e-3, 1e-9));
  REQUIRE_THAT(with.rich_empty().rail_current_A - without.rich_empty().rail_current_A, WithinRel(2e-3, 1e-9));
  // The rail's own load comes straight off the margin; the search is good to 1e-6 of 40 mA twice.
  REQUIRE_THAT(without.lean().margin_A - with.lean().margin_A, WithinAbs(2e-3, 1e-7));
}

TEST_CASE("In dropout a linear stage draws its dropout current") {
  auto example = regulated("half-wave-clamp-ahead");
  example.stage.quiescent_current_dropout_A = 5e-3;
  example.requirement.output.loads[1].current_A = 60e-3;  // far more than there is
  Evidence evidence(example.design(), example.requirement, example.supply());
  const auto& starved = evidence.nominal();
  REQUIRE(starved.state.rail_min_V < evidence.required_rail_V());
  REQUIRE_THAT(starved.rail_current_A, WithinRel(60e-3 + 5e-3 + 55e-6, 1e-9));
}

TEST_CASE("A step-down stage draws the power it converts at the rail it is given") {
  auto example = regulated("bridge-clamp-across");
  example.stage.kind = parts::StageKind::step_down;
  example.stage.efficiency = 0.8;
  example.stage.input_min_V = 7;
  Evidence evidence(example.design(), example.requirement, example.supply());
  const auto& point = evidence.nominal();
  const double own_A = 1e-3 + 55e-6;
  // The current settles to 1e-6 of itself.
  REQUIRE_THAT((point.rail_current_A - own_A) * point.state.rail_mean_V, WithinRel(5 * 10e-3 / 0.8, 1e-5));
}
