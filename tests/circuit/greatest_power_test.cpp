#include "dropfront/circuit/greatest_power.hpp"

#include <cmath>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/available_current.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

TEST_CASE("No load on a fine scan gives more power than the greatest found") {
  for (const auto& arrangement : dropping()) {
    for (const double clamp_V : {12.0, 24.0, 47.0}) {
      ElementValues v = ordinary_values();
      v.clamp.main = {clamp_V, clamp_V};
      const double floor_V = 0.6 * clamp_V;
      v.load_cutoff_V = 0.5 * floor_V;
      const auto floor = find_available_current(arrangement.build, v, floor_V);
      REQUIRE(floor.usable);
      v.rail_current_A = floor.current_A;
      const double overhead_A = 1e-3;
      const auto best = find_greatest_power(arrangement.build(v), floor_V, floor.current_A, overhead_A);
      INFO(arrangement.name << " " << clamp_V << " V: " << best.reason);
      REQUIRE(best.usable);
      REQUIRE(best.current_A <= floor.current_A * (1 + 1e-9));
      double scanned = 0;
      for (int k = 1; k <= 200; ++k) {
        v.rail_current_A = floor.current_A * (0.5 + 0.0025 * k);
        const auto state = solve_steady_state(arrangement.build(v));
        if (state.rail_min_V >= floor_V) {
          scanned = std::max(scanned, (v.rail_current_A - overhead_A) * state.rail_min_V);
        }
      }
      // The documented 2e-4 of the rail voltage: worth no more of the power. A shunt's rail jumps between the
      // loads that are tried: a hundredth.
      const double share = arrangement.thyristor_shunt ? 1e-2 : 2e-4;
      REQUIRE(best.rail_V * (best.current_A - overhead_A) >= scanned * (1 - share));
    }
  }
}

TEST_CASE("The current available at the lowest rail overstates a constant-power load's reach") {
  // 4/13/38 % for 12/24/47 V clamps (a published rule gives the sign only; the figures are an independent
  // piecewise-linear calculation's at unstated values, so this holds their order and size, not their digits).
  double previous = 0;
  for (const double clamp_V : {12.0, 24.0, 47.0}) {
    ElementValues v = ordinary_values();
    v.clamp.main = {clamp_V, 0.7 * clamp_V};
    v.load_cutoff_V = 3;
    const auto& arrangement = arrangements().front();
    const auto floor = find_available_current(arrangement.build, v, 7);
    v.rail_current_A = floor.current_A;
    const auto best = find_greatest_power(arrangement.build(v), 7, floor.current_A, 0);
    REQUIRE(best.usable);
    const double current_share = floor.current_A / best.current_A - 1;
    REQUIRE(current_share > previous);
    REQUIRE(current_share < 0.6);
    previous = current_share;
  }
}

TEST_CASE("A floor above what the rail reaches is said, not invented") {
  ElementValues v = ordinary_values();
  v.rail_current_A = 10e-3;
  REQUIRE_FALSE(find_greatest_power(arrangements().front().build(v), 200, 10e-3, 1e-3).usable);
}
