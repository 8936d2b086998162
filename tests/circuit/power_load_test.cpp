#include <cmath>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/steady_state.hpp"
#include "dropfront/circuit/transient.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

TEST_CASE("A reservoir that feeds a constant power alone loses its energy at that rate") {
  // C·v^2/2 falls by P·t: an exact law, whatever the chords. They lie up to 0.4 % above P/v here.
  Network network;
  ElementValues v = ordinary_values();
  v.rail_current_A = 0;
  v.rail_power_W = 0.05;
  v.power_from_V = 4;
  v.power_to_V = 16;
  v.reservoir_esr_ohm = 0;
  v.reservoir_F = 470e-6;
  v.dropper_F = 1e-12;  // no supply to speak of
  v.discharge_ohm = INFINITY;
  v.clamp.main.threshold_V = 30;
  TransientOptions options;
  options.duration_s = 0.4;
  const auto run = run_transient(find_arrangement("half-wave-clamp-ahead")->build(v), {0.0, 15.0}, options);
  INFO(run.reason);
  REQUIRE(run.usable);
  const double left_J = 0.5 * v.reservoir_F * 15 * 15 - 0.05 * 0.4;
  REQUIRE_THAT(run.end[1], WithinRel(std::sqrt(2 * left_J / v.reservoir_F), 4e-3));
  REQUIRE(run.energy_residual <= 1e-6);
}

TEST_CASE("Below what it can carry a constant-power rail has no point to rest at and falls to its cut-off") {
  ElementValues v = ordinary_values();
  v.rail_current_A = 0;
  v.power_from_V = 4;
  v.power_to_V = 16;
  const auto after_V = [&](double power_W, double start_V) {
    v.rail_power_W = power_W;
    TransientOptions options;
    options.duration_s = 64 * v.mains.period_s();
    const auto run =
        run_transient(find_arrangement("half-wave-clamp-ahead")->build(v), {-300.0, start_V}, options);
    INFO(run.reason);
    REQUIRE(run.usable);
    return run.end[1];
  };
  // About 21.5 mA by charge balance, so some 0.2 W at 10 V; at 5 V no more than 0.11 W.
  REQUIRE(after_V(0.12, 11) > 9);
  REQUIRE(after_V(0.30, 11) < 5);
  // The same power holds from a full rail and never recovers from a low one: the supply latches.
  REQUIRE(after_V(0.14, 11) > 9);
  REQUIRE(after_V(0.14, 5) < 6);
}
