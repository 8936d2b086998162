#include "dropfront/problem/stress.hpp"

#include "support/catch.hpp"

using namespace dropfront;
using Catch::Matchers::WithinRel;

TEST_CASE("closed-form stresses give the textbook figures of a reactance on the mains") {
  scoring::Requirement requirement;
  requirement.supplies = {{"", {230, 230, 230}, {50, 50, 50}, {}, false, false}};
  const problem::Stress stress(requirement);
  // 1 uF at 230 V, 50 Hz: Xc = 3183.1 ohm, 72.26 mA (handbook reactance table, rounded to 5 figures).
  CHECK_THAT(stress.current_Arms(1e-6), WithinRel(0.072257, 1e-4));
  CHECK_THAT(stress.resistor_W(1e-6, 100), WithinRel(0.072257 * 0.072257 * 100, 1e-4));
  // Half-wave mean current f·C·2·Vpk = 32.527 mA per uF with the clamp near 0 V, bridge twice that.
  CHECK_THAT(stress.clamp_W(1e-6, 10, false), WithinRel(0.32527, 1e-4));
  CHECK_THAT(stress.clamp_W(1e-6, 10, true), WithinRel(2 * 0.32527 * (1 - 10 / 325.27), 1e-4));
}

TEST_CASE("the greatest of several supplies counts, voltage and current each on its own") {
  scoring::Requirement requirement;
  requirement.supplies = {{"a", {100, 100, 110}, {60, 60, 61}, {}, false, false},
                          {"b", {230, 230, 253}, {50, 50, 50}, {}, false, false}};
  const problem::Stress stress(requirement);
  CHECK(stress.line_Vrms() == 253);
  CHECK(stress.current_Arms(1e-6) > 6.28 * 253 * 50 * 1e-6);
}
