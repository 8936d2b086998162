#include "dropfront/scoring/rail_load.hpp"

#include <cmath>

#include "dropfront/circuit/building_blocks.hpp"
#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinRel;
using test::Example;

TEST_CASE("a linear stage loads the rail with its output's current, a step-down stage with its power") {
  Example example;
  example.linear(5, 0.04, 1.7, 3e-3);
  const RailLoad linear = rail_load(example.stage, 10e-3, 0.5e-3, Quiescent::data);
  CHECK_THAT(linear.current_A, WithinRel(13.5e-3, 1e-12));
  CHECK(linear.power_W == 0);
  test::step_down(example);  // 5 V + 3 %, 84 %, 60 uA
  const RailLoad stepping = rail_load(example.stage, 10e-3, 0.5e-3, Quiescent::data);
  CHECK_THAT(stepping.current_A, WithinRel(0.56e-3, 1e-12));
  CHECK_THAT(stepping.power_W, WithinRel(1.03 * 5 * 10e-3 / 0.84, 1e-12));
}

TEST_CASE("hung on the rail, the power draws what its law says, a little more between the chords' ends") {
  Example example;
  test::step_down(example);
  const RailLoad load{0, 0.06};
  circuit::ElementValues values;
  values.clamp.main = {12, 9};
  values.reservoir_F = 100e-6;
  hang(load, example.stage, 8, values);
  circuit::Network network;
  const auto positive = network.add_node();
  circuit::add_rail(network, positive, 0, values);
  for (double rail_V = values.power_from_V; rail_V < values.power_to_V; rail_V += 0.13) {
    const auto& first = network.loads.front();
    double drawn_A = first.current_A + first.slope_S * (rail_V - first.cutoff_V);
    for (const auto& chord : network.branches) {
      if (chord.owner == circuit::Owner::load) {
        drawn_A += std::max(0.0, rail_V - chord.threshold_V) / chord.slope_ohm;
      }
    }
    INFO(rail_V << " V");
    CHECK(drawn_A >= load.power_W / rail_V * (1 - 1e-9));
    CHECK(drawn_A <= load.power_W / rail_V * 1.005);  // (r - 1)^2/(4·r) at r = 1.15
  }
}

TEST_CASE("a stage that has cut out draws no more than its resistance at that voltage") {
  Example example;
  test::step_down(example);
  circuit::ElementValues values;
  values.clamp.main = {12, 9};
  hang({1e-3, 0.06}, example.stage, 8, values);
  CHECK(values.power_from_V == 4);  // half of V_required
  example.stage.input_off_V = 7;
  hang({1e-3, 0.06}, example.stage, 8, values);
  CHECK(values.power_from_V == 7);
  example.stage.input_off_V = 9;  // above V_required it says nothing about the rail below
  hang({1e-3, 0.06}, example.stage, 8, values);
  CHECK(values.power_from_V == 4);
}

}  // namespace
}  // namespace dropfront::scoring
