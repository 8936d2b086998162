#include "dropfront/circuit/available_current.hpp"

#include <cmath>

#include "circuit/support_values.hpp"
#include "dropfront/values/random.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

namespace {

double rail_min_V(const Arrangement& arrangement, ElementValues v, double load_A) {
  v.rail_current_A = load_A;
  const SteadyState state = solve_steady_state(arrangement.build(v));
  return state.usable() ? state.rail_min_V : NAN;
}

}  // namespace

TEST_CASE("The rail just holds at the available current and no longer above it") {
  for (const auto& arrangement : dropping()) {
    for (const double required_V : {5.0, 9.0, 10.5, 11.0}) {
      ElementValues v = ordinary_values();
      v.load_cutoff_V = 0.5 * required_V;
      const auto answer = find_available_current(arrangement.build, v, required_V);
      INFO(arrangement.name << " " << required_V << " V: " << answer.reason);
      REQUIRE(answer.usable);
      REQUIRE(answer.current_A > 0);
      // The documented passing tolerance, on a steady state of this test's own.
      REQUIRE(rail_min_V(arrangement, v, answer.current_A) >= required_V - 1e-6);
      REQUIRE(rail_min_V(arrangement, v, answer.current_A * 1.0001) < required_V);
    }
  }
}

TEST_CASE("Random designs: confirmed at the answer, failing just above, every lighter load passing") {
  dropfront::values::RandomStream random(20260501);
  int with_current = 0;
  for (int k = 0; k < 250; ++k) {
    const auto& arrangement = dropping()[static_cast<std::size_t>(k) % dropping().size()];
    const auto between = [&](double a, double b) { return a * std::pow(b / a, random.uniform01()); };
    ElementValues v;
    v.mains = Waveform(between(90, 280), random.uniform01() < 0.5 ? 49.5 : 59.5, {{3, 0.03, 0}});
    v.series_resistor_ohm = between(10, 680);
    v.dropper_F = between(47e-9, 4.7e-6);
    v.dropper_esr_ohm = 0.002 / (v.mains.omega() * v.dropper_F);
    v.discharge_ohm = between(2e5, 2e6);
    v.thyristor = {0.9, 0.1};
    v.thyristor_holding_A = 5e-3;
    v.thyristor_trigger_A = 0.2e-3;
    v.gate_resistor_ohm = 1000;
    v.rectifier = {0.6 + 0.2 * random.uniform01(), between(0.05, 1)};
    const double clamp_V = between(3.3, 60);
    v.clamp.main = {clamp_V, between(0.2, 30)};
    v.reservoir_F = between(10e-6, 4000e-6);
    v.reservoir_esr_ohm = between(0.05, 8);
    // Low headroom included: the required voltage comes to within half a volt of what the clamp leaves.
    const double drops_V = arrangement.clamp_ahead ? v.rectifier.threshold_V : 0;
    const double headroom_V = between(0.05, 5);
    const double required_V = clamp_V - drops_V - headroom_V;
    if (required_V < 2) continue;
    v.load_cutoff_V = 0.5 * required_V;
    const auto answer = find_available_current(arrangement.build, v, required_V);
    INFO("design " << k << " " << arrangement.name << " headroom " << headroom_V << ": " << answer.reason);
    REQUIRE(answer.usable);
    if (answer.current_A == 0) continue;
    ++with_current;
    REQUIRE(rail_min_V(arrangement, v, answer.current_A) >= required_V - 1e-6);
    // A shunt's rail minimum jumps where its firings regroup: above a load that just holds, another may too.
    if (!arrangement.thyristor_shunt) {
      REQUIRE(rail_min_V(arrangement, v, answer.current_A * 1.001 + 1e-7) < required_V + 1e-7);
    }
    for (const double share : {0.1, 0.35, 0.7, 0.93}) {
      REQUIRE(rail_min_V(arrangement, v, answer.current_A * share) >= required_V - 1e-6);
    }
  }
  REQUIRE(with_current > 150);  // the sample is not made of impossible designs
}

TEST_CASE("A required voltage above the unloaded rail leaves nothing, and says so") {
  const auto answer =
      find_available_current(find_arrangement("half-wave-clamp-ahead")->build, ordinary_values(), 14.0);
  REQUIRE(answer.usable);
  REQUIRE(answer.current_A == 0);
  REQUIRE_FALSE(answer.reason.empty());
}

TEST_CASE("A larger series resistor can raise the available current of a bridge in its knee") {
  // Bridge, 128.5 V, 60 Hz, 2.49 uF, threshold 17.6 V, 33 uF, 16 V wanted: 29.4/31.0/33.8 mA at 67/135/270
  // ohm (stated to three digits by a simulator and by an independent piecewise-linear calculation; drops and
  // slopes as chosen here).
  const double expected_A[] = {29.4e-3, 31.0e-3, 33.8e-3};
  const double series_ohm[] = {67, 135, 270};
  double previous_A = 0;
  for (int k = 0; k < 3; ++k) {
    ElementValues v;
    v.mains = Waveform(128.5, 60);
    v.series_resistor_ohm = series_ohm[k];
    v.dropper_F = 2.49e-6;
    v.rectifier = {0.7, 0.5};
    v.clamp.main = {17.6, 1};
    v.reservoir_F = 33e-6;
    v.load_cutoff_V = 8;
    const auto answer = find_available_current(find_arrangement("bridge-clamp-across")->build, v, 16);
    REQUIRE(answer.usable);
    // The unstated diode drop and clamp slope are worth a per cent.
    REQUIRE_THAT(answer.current_A, WithinRel(expected_A[k], 0.015));
    REQUIRE(answer.current_A > previous_A);
    previous_A = answer.current_A;
  }
}

TEST_CASE("Charge balance bounds what a half-wave dropper can give") {
  ElementValues v = ordinary_values();
  v.discharge_ohm = INFINITY;
  const auto answer = find_available_current(find_arrangement("half-wave-clamp-ahead")->build, v, 9);
  const double bound_A = 50 * v.dropper_F * (2 * v.mains.crest_V() - 9);
  REQUIRE(answer.current_A < bound_A);
  REQUIRE(answer.current_A > 0.95 * bound_A);  // tight to the drops and the rail's own swing
}
