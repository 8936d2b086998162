#include "dropfront/scoring/stage_law.hpp"

#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

TEST_CASE("A step-down stage draws the same power at any rail, and its own current beside it") {
  parts::OutputStage stage;
  stage.kind = parts::StageKind::step_down;
  stage.output_voltage_V = 3.3;
  stage.efficiency = 0.8;
  stage.quiescent_current_A = 0.1e-3;
  for (const double rail_V : {6.0, 12.0, 47.0}) {
    const double into = (stage_current_A(stage, 0.1, rail_V, Quiescent::data) - 0.1e-3) * rail_V;
    REQUIRE_THAT(0.8 * into, WithinRel(0.33, 1e-9));  // output power over efficiency, rounding only
  }
}

TEST_CASE("Linear and direct stages pass the current on; in dropout the greater own current counts") {
  parts::OutputStage stage;
  stage.kind = parts::StageKind::linear;
  stage.quiescent_current_A = 1e-3;
  stage.quiescent_current_dropout_A = 4e-3;
  REQUIRE_THAT(stage_current_A(stage, 10e-3, 9, Quiescent::data), WithinRel(11e-3, 1e-12));
  REQUIRE_THAT(stage_current_A(stage, 10e-3, 9, Quiescent::dropout), WithinRel(14e-3, 1e-12));
  REQUIRE(stage_current_A(stage, 10e-3, 9, Quiescent::least) == 10e-3);
}

TEST_CASE("The required rail is the stage's own need or an always-on rail load's, whichever is greater") {
  parts::OutputStage stage;
  stage.kind = parts::StageKind::linear;
  stage.output_voltage_V = 5;
  stage.tolerance = 0.04;
  stage.dropout_V = 1.7;
  OutputNeed need;
  need.voltage_V = 5;
  LoadProfile profile;
  REQUIRE_THAT(*required_rail_V(stage, need, profile), WithinRel(6.9, 1e-12));
  REQUIRE_THAT(*required_rail_V(stage, need, profile, false), WithinRel(6.7, 1e-12));
  profile.rail_minimum_V = 9;
  REQUIRE(*required_rail_V(stage, need, profile) == 9);
  profile.rail_minimum_V = 0;
  stage.kind = parts::StageKind::direct;
  need.tolerance = 0.1;
  REQUIRE_THAT(*required_rail_V(stage, need, profile), WithinRel(4.5, 1e-12));
  stage.kind = parts::StageKind::step_down;
  REQUIRE_FALSE(required_rail_V(stage, need, profile).has_value());
  stage.input_min_V = 7;
  REQUIRE(*required_rail_V(stage, need, profile) == 7);
}
