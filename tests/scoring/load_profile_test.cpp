#include "dropfront/scoring/load_profile.hpp"

#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront::scoring;

TEST_CASE("States at the output are alternatives: the heaviest one counts, not their sum") {
  OutputNeed need;
  need.loads = {{"asleep", false, 0.2e-3, {}, {}, {}}, {"awake", false, 8e-3, {}, {}, {}}};
  need.standby_load = 0;
  const auto profile = load_profile(need);
  REQUIRE(profile.heaviest_output_A() == 8e-3);
  REQUIRE(profile.heaviest_name == "awake");
  REQUIRE(profile.standby_A == 0.2e-3);
  REQUIRE(profile.standby_name == "asleep");
}

TEST_CASE("Rail loads without duration are always on and add up") {
  OutputNeed need;
  need.loads = {{"lamp", true, 1e-3, 8.0, {}, {}}, {"opto", true, 2e-3, {}, {}, {}}};
  const auto profile = load_profile(need);
  REQUIRE_THAT(profile.rail_A, WithinRel(3e-3, 1e-12));
  REQUIRE(profile.rail_minimum_V == 8.0);
  REQUIRE(profile.heaviest_output_A() == 0);
  REQUIRE(profile.standby_name == "none");
}

TEST_CASE("A burst counts by its mean on top of the heaviest state, once-only bursts by nothing") {
  OutputNeed need;
  need.loads = {{"awake", false, 8e-3, {}, {}, {}},
                {"relay", true, 40e-3, 9.0, 15e-3, 2.0},
                {"beep", false, 20e-3, {}, 0.1, 1.0},
                {"first pull-in", true, 1.0, {}, 0.1, {}}};
  const auto profile = load_profile(need);
  REQUIRE_THAT(profile.burst_mean_rail_A, WithinRel(40e-3 * 15e-3 / 2, 1e-12));
  REQUIRE_THAT(profile.heaviest_output_A(), WithinRel(10e-3, 1e-12));
  REQUIRE(profile.rail_minimum_V == 0);  // a burst's minimum counts for the burst alone
}

TEST_CASE("A burst as long as its period is a load that is always on") {
  OutputNeed need;
  need.loads = {{"blink", false, 5e-3, {}, 3.0, 2.0}};
  REQUIRE(load_profile(need).heaviest_output_A() == 5e-3);
}
