#include <algorithm>

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/lean_search.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// Bridge on 108 V to 132 V, 60 Hz, a 3.3 V step-down stage that works from 6 V of rail.
test::Example american(parts::Clamp clamp) {
  test::Example example("bridge-clamp-across");
  example.clamp = std::move(clamp);
  example.supply().voltage_Vrms = {108, 120, 132};
  example.supply().frequency_Hz = {60, 60, 60};
  example.dropper.capacitance_F = 1e-6;
  example.reservoir.capacitance_F = 470e-6;
  example.stage = {};
  example.stage.kind = parts::StageKind::step_down;
  example.stage.output_voltage_V = 3.3;
  example.stage.efficiency = 0.8;
  example.stage.input_min_V = 6;
  example.stage.quiescent_current_A = 50e-6;
  example.requirement.output.voltage_V = 3.3;
  return example;
}

struct Capability {
  double by_law_A = 0;   ///< greatest eta·I·v/Vout
  double naive_A = 0;    ///< available at input_min, as if the rail stood at the clamp
  double scanned_A = 0;  ///< by_law_A, scanned on a fine grid
};

Capability capability(const test::Example& example) {
  const auto design = example.design();
  const auto& stage = example.stage;
  const auto shapes = mains_shapes(example.requirement.supplies[0]);
  PointSolver points(design, example.requirement, *stage.input_min_V);
  const double overhead_A = stage.quiescent_current_A + example.reservoir.leakage_A;
  LeanSearch search(points, shapes.lean, overhead_A, true);
  const auto& found = search.least();
  REQUIRE(found.usable);
  Capability result;
  result.by_law_A = search.solver().capability_A(found);
  auto values =
      points.values(search.solver().recipe(found.where.ends), found.rises, found.where.ambient_degC);
  const double gain = *stage.efficiency / stage.output_voltage_V;
  result.naive_A = gain * (found.available_A - overhead_A) * values.clamp.main.threshold_V;
  for (int i = 1; i <= 300; ++i) {
    values.rail_current_A = found.available_A * i / 300;
    const auto state = points.steady(values);
    if (!state.usable() || state.rail_min_V < *stage.input_min_V) continue;
    result.scanned_A =
        std::max(result.scanned_A, gain * (values.rail_current_A - overhead_A) * state.rail_min_V);
  }
  return result;
}

}  // namespace

TEST_CASE("The power law's capability is the greatest that a fine scan over the load finds") {
  for (const auto& clamp : {test::zener_12V(), test::zener_24V(), test::zener_47V()}) {
    const auto result = capability(american(clamp));
    // The scan's grid is 1/300 of the current, and the search stops a little short of a sharp knee.
    REQUIRE_THAT(result.by_law_A, WithinRel(result.scanned_A, 0.006));
  }
}

TEST_CASE("'Available at the input minimum' overstates a step-down stage, more with a higher clamp") {
  // Such a claim takes the current there at the clamp's voltage. By charge balance that current exceeds the
  // clamp's own by (Vpk - 6 V)/(Vpk - Vz), Vpk the low crest less the drops; an independent
  // piecewise-linear calculation gave 4/13/38 % for 12/24/47 V clamps on 120 V mains.
  const double expected[] = {0.04, 0.13, 0.38};
  const parts::Clamp clamps[] = {test::zener_12V(), test::zener_24V(), test::zener_47V()};
  for (int i = 0; i < 3; ++i) {
    auto example = american(clamps[i]);
    example.reservoir.capacitance_F = 10e-3;  // no ripple, and
    example.clamp.knee_current_A.reset();     // no knee: the rail stands at the clamp until it lets go
    const auto result = capability(example);
    INFO("clamp " << clamps[i].voltage_V << " V: " << result.naive_A / result.by_law_A);
    // That calculation's stage and tolerances are not known: a sixth of the figure, and 1 % for slopes.
    REQUIRE_THAT(result.naive_A / result.by_law_A - 1, WithinAbs(expected[i], expected[i] / 6 + 0.01));
  }
}

TEST_CASE("The margin of a step-down stage is its capability less the load at the output") {
  auto example = american(test::zener_24V());
  Evidence evidence(example.design(), example.requirement, example.supply());
  const auto& lean = evidence.lean();
  REQUIRE_THAT(lean.margin_A, WithinAbs(lean.capability_A - 10e-3, 1e-12));
  example.requirement.output.loads[1].current_A = lean.capability_A * 0.98;
  Evidence nearly(example.design(), example.requirement, example.supply());
  // Just inside the capability the stage runs: its rail stays above the input minimum.
  REQUIRE(nearly.lean_hot().state.rail_min_V > 6);
  REQUIRE(nearly.lean_cold().state.rail_min_V > 6);
}
