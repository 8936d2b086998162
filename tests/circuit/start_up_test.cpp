#include "dropfront/circuit/start_up.hpp"

#include <cmath>
#include <numbers>
#include <optional>

#include "circuit/support_values.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;
using Outcome = StartUp::Outcome;

namespace {

const Arrangement& half_wave() { return *find_arrangement("half-wave-clamp-ahead"); }

StartUp start_up(const Arrangement& arrangement, const ElementValues& v, double required_V) {
  return {arrangement.build(v), std::nullopt, 0, 0, required_V};
}

/// A stage of `power_W` that turns on at 10 V.
StartUp stepping(ElementValues v, double power_W, double cut_out_V) {
  v.rail_current_A = 0.1e-3;
  const Network rising = half_wave().build(v);
  v.rail_power_W = power_W;
  v.power_from_V = 4;
  v.power_to_V = 14;
  return {rising, half_wave().build(v), 10, cut_out_V, 8};
}

}  // namespace

TEST_CASE("The start takes the charge of the reservoir over the mean current") {
  // Charge balance (closed form): half-wave f·C·(2·Vpk - V - 2·Vf) at the middle of the rise; an ideal load
  // of none, a small dropper so that the rise takes many periods.
  for (const double reservoir_F : {470e-6, 1000e-6}) {
    ElementValues v = ordinary_values();
    v.dropper_F = 0.1e-6;
    v.dropper_esr_ohm = 0;
    v.discharge_ohm = INFINITY;
    v.rail_current_A = 0;
    v.reservoir_F = reservoir_F;
    const double required_V = 10;
    const double mean_A =
        50 * v.dropper_F * (2 * std::numbers::sqrt2 * 230 - required_V / 2 - 2 * v.rectifier.threshold_V);
    const auto start = start_up(half_wave(), v, required_V).worst(10);
    INFO(start.reason << " " << start.phase_deg);
    REQUIRE(start.usable);
    REQUIRE(start.outcome == Outcome::reached);
    // Charge comes in one helping a period: one of them either way.
    REQUIRE_THAT(start.time_s, WithinAbs(reservoir_F * required_V / mean_A, 0.02));
  }
}

TEST_CASE("The start grows with the reservoir and the load and shrinks with the dropper") {
  for (const auto& arrangement : arrangements()) {
    if (!arrangement.dropper) continue;  // these values are a dropper's
    const auto time_s = [&](double reservoir_F, double load_A, double dropper_F) {
      ElementValues v = ordinary_values();
      v.reservoir_F = reservoir_F;
      v.rail_current_A = load_A;
      v.dropper_F = dropper_F;
      const auto start = start_up(arrangement, v, 9).worst(5);
      INFO(arrangement.name << " " << start.reason);
      REQUIRE(start.outcome == Outcome::reached);
      return start.time_s;
    };
    const double plain_s = time_s(220e-6, 5e-3, 0.33e-6);
    REQUIRE(time_s(470e-6, 5e-3, 0.33e-6) > 1.8 * plain_s);
    REQUIRE(time_s(220e-6, 7e-3, 0.33e-6) > plain_s);
    REQUIRE(time_s(220e-6, 5e-3, 0.68e-6) < plain_s);
  }
}

TEST_CASE("No phase of switching on that was tried by hand takes longer than the worst found") {
  for (const auto& arrangement : arrangements()) {
    if (!arrangement.dropper) continue;  // these values are a dropper's
    ElementValues v = ordinary_values();
    v.rail_current_A = 8e-3;
    auto starter = start_up(arrangement, v, 9);
    const auto worst = starter.worst(5);
    for (double phase_deg = 5; phase_deg < 360; phase_deg += 30) {
      const auto other = starter.at(phase_deg, 5);
      INFO(arrangement.name << " " << phase_deg << " against " << worst.phase_deg);
      REQUIRE(other.usable);
      // Where a valley of the ripple just touches the level, a start can be one period longer: not more.
      REQUIRE(other.time_s < worst.time_s + 0.0201);
    }
  }
}

TEST_CASE("A load beyond what the line delivers rests below the required rail") {
  ElementValues v = ordinary_values();
  v.rail_current_A = 40e-3;
  const auto start = start_up(half_wave(), v, 9).worst(5);
  REQUIRE(start.usable);
  REQUIRE(start.outcome == Outcome::stays_low);
}

TEST_CASE("A stage at constant power starts from its turn-on threshold, falls back or cuts out") {
  // About 21.5 mA at 10 V by charge balance: 0.2 W, and less on the way down.
  const ElementValues v = ordinary_values();
  const auto light = stepping(v, 0.10, 0).at(0, 3);
  REQUIRE(light.outcome == Outcome::reached);
  const auto heavy = stepping(v, 0.30, 0).at(0, 3);
  REQUIRE(heavy.usable);
  REQUIRE(heavy.outcome == Outcome::stays_low);
  const auto hiccup = stepping(v, 0.30, 7).at(0, 3);
  REQUIRE(hiccup.outcome == Outcome::cuts_out);
  const auto hurried = stepping(v, 0.10, 0).at(0, 0.05);
  REQUIRE(hurried.usable);
  REQUIRE(hurried.outcome == Outcome::not_yet);
}

TEST_CASE("A supply that cannot be solved has no start, and that counts as the longest") {
  ElementValues v = ordinary_values();
  v.reservoir_F = -1;
  const auto none = start_up(half_wave(), v, 9).worst(1);
  REQUIRE_FALSE(none.usable);
  REQUIRE_FALSE(none.reason.empty());
  StartUp::Start quick;
  quick.usable = true;
  quick.outcome = Outcome::reached;
  REQUIRE(none.longer_than(quick));
  REQUIRE_FALSE(quick.longer_than(none));
}
