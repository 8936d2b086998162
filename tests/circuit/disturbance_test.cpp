// Load bursts and mains dips from the periodic orbit.
#include "dropfront/circuit/disturbance.hpp"

#include <algorithm>
#include <cmath>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/transient.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

namespace {

constexpr double kPeriod_s = 0.02;
constexpr double kFloor_V = 7;

ElementValues loaded_values() {
  ElementValues v = ordinary_values();
  v.rail_current_A = 10e-3;
  return v;
}

ElementValues dipped(ElementValues v, double residual, bool open = false) {
  v.mains = v.mains.scaled(residual);
  if (open) v.source_ohm = 1e9;
  return v;
}

ElementValues with_burst(ElementValues v, double burst_A) {
  v.rail_current_A += burst_A;
  return v;
}

Disturbance disturb(const Arrangement& arrangement, const ElementValues& normal, const ElementValues& during,
                    double duration_s) {
  const Network network = arrangement.build(normal);
  const SteadyState start = solve_steady_state(network);
  REQUIRE(start.usable());
  return {network, arrangement.build(during), duration_s, start, kFloor_V};
}

double worst_V(Disturbance disturbed) {
  const auto coarse = disturbed.worst_of_grid();
  INFO(coarse.reason);
  REQUIRE(coarse.usable);
  const auto fine = disturbed.worst_around(coarse.phase_deg);
  REQUIRE(fine.usable);
  REQUIRE(fine.rail_V <= coarse.rail_V);
  return fine.rail_V;
}

const Arrangement& half_wave() { return *find_arrangement("half-wave-clamp-ahead"); }
const Arrangement& bridge() { return *find_arrangement("bridge-clamp-across"); }

}  // namespace

TEST_CASE("A dip that leaves the whole voltage changes nothing") {
  for (const auto& arrangement : arrangements()) {
    if (!arrangement.dropper) continue;  // these values are a dropper's
    const ElementValues v = loaded_values();
    auto disturbed = disturb(arrangement, v, dipped(v, 1), 2.5 * kPeriod_s);
    const double steady_V = solve_steady_state(arrangement.build(v)).rail_min_V;
    for (const double phase_deg : {0.0, 77.0, 200.0}) {
      INFO(arrangement.name << " " << phase_deg);
      const auto least = disturbed.at(phase_deg);
      REQUIRE(least.usable);
      REQUIRE(least.recovers);
      REQUIRE_THAT(least.rail_V, WithinAbs(steady_V, 1e-6));  // to the orbit's own closure
    }
  }
}

TEST_CASE("A longer interruption, a deeper dip and a bigger burst are never better") {
  for (const auto& arrangement : {half_wave(), bridge()}) {
    const ElementValues v = loaded_values();
    INFO(arrangement.name);
    double before_V = INFINITY;
    for (const double cycles : {0.25, 0.5, 1.0, 2.0, 5.0}) {
      const double now_V = worst_V(disturb(arrangement, v, dipped(v, 0, true), cycles * kPeriod_s));
      REQUIRE(now_V < before_V);
      before_V = now_V;
    }
    before_V = INFINITY;
    for (const double residual : {0.8, 0.4, 0.0}) {
      const double now_V = worst_V(disturb(arrangement, v, dipped(v, residual), kPeriod_s));
      REQUIRE(now_V <= before_V + 1e-6);
      before_V = now_V;
    }
    before_V = INFINITY;
    for (const double burst_A : {5e-3, 20e-3, 60e-3}) {
      const double now_V = worst_V(disturb(arrangement, v, with_burst(v, burst_A), 15e-3));
      REQUIRE(now_V < before_V);
      before_V = now_V;
    }
  }
}

TEST_CASE("More capacitance in the reservoir holds the rail higher through dip and burst") {
  for (const auto& arrangement : {half_wave(), bridge()}) {
    double dip_V = 0, burst_V = 0;
    for (const double reservoir_F : {100e-6, 220e-6, 470e-6}) {
      ElementValues v = loaded_values();
      v.reservoir_F = reservoir_F;
      const double dip_now_V = worst_V(disturb(arrangement, v, dipped(v, 0, true), kPeriod_s));
      const double burst_now_V = worst_V(disturb(arrangement, v, with_burst(v, 40e-3), 15e-3));
      REQUIRE(dip_now_V > dip_V);
      REQUIRE(burst_now_V > burst_V);
      dip_V = dip_now_V;
      burst_V = burst_now_V;
    }
  }
}

TEST_CASE("While the line is open the reservoir alone feeds the load: I·t/C") {
  ElementValues v = loaded_values();
  v.reservoir_esr_ohm = 0;
  const double longer_s = 4 * kPeriod_s, shorter_s = 2 * kPeriod_s;
  const double longer_V = worst_V(disturb(half_wave(), v, dipped(v, 0, true), longer_s));
  const double shorter_V = worst_V(disturb(half_wave(), v, dipped(v, 0, true), shorter_s));
  // Charge balance of the capacitor over the difference, whole cycles apart: both begin and end alike.
  const double expected_V = v.rail_current_A * (longer_s - shorter_s) / v.reservoir_F;
  REQUIRE_THAT(shorter_V - longer_V, WithinRel(expected_V, 5e-3));
}

TEST_CASE("An opened line is worse than a shorted generator, by some 0.3 V at 120 or 300 degrees") {
  // Half a cycle; found with an independent prototype on a supply of this kind. The dropper keeps its charge
  // behind an open line, so nothing extra flows when the voltage comes back.
  for (const auto& arrangement : {half_wave(), *find_arrangement("bridge-clamp-ahead")}) {
    const ElementValues v = loaded_values();
    auto open = disturb(arrangement, v, dipped(v, 0, true), 0.5 * kPeriod_s);
    const auto worst = open.worst_around(open.worst_of_grid().phase_deg);
    const double shorted_V = worst_V(disturb(arrangement, v, dipped(v, 0), 0.5 * kPeriod_s));
    INFO(arrangement.name << " open " << worst.rail_V << " at " << worst.phase_deg << ", shorted "
                          << shorted_V);
    // Load, reservoir and arrangement of that prototype are not known: half the figure either way, 15
    // degrees.
    REQUIRE_THAT(shorted_V - worst.rail_V, WithinAbs(0.3, 0.17));
    REQUIRE_THAT(std::fmod(worst.phase_deg, 180), WithinAbs(120, 15));
  }
}

TEST_CASE("The search finds the lowest rail that trying every fifth degree finds") {
  for (const auto& arrangement : arrangements()) {
    if (!arrangement.dropper) continue;  // these values are a dropper's
    const ElementValues v = loaded_values();
    struct Case {
      ElementValues during;
      double duration_s;
    };
    const Case cases[] = {{dipped(v, 0), 0.5 * kPeriod_s},
                          {dipped(v, 0, true), 1.3 * kPeriod_s},
                          {dipped(v, 0.7), 12 * kPeriod_s},
                          {with_burst(v, 30e-3), 15e-3},
                          {with_burst(v, 12e-3), 93e-3}};
    for (const auto& one : cases) {
      auto disturbed = disturb(arrangement, v, one.during, one.duration_s);
      double least_V = INFINITY;
      for (double phase_deg = 0; phase_deg < 360; phase_deg += 5) {
        least_V = std::min(least_V, disturbed.at(phase_deg).rail_V);
      }
      INFO(arrangement.name << " " << one.duration_s);
      // A shunt's firing jumps with the phase; what is missed there are millivolts between two steps.
      REQUIRE(worst_V(disturb(arrangement, v, one.during, one.duration_s)) < least_V + 3e-3);
    }
  }
}

TEST_CASE("Bursts far apart are one burst; close together they pull the rail down further") {
  const ElementValues v = loaded_values();
  auto disturbed = disturb(half_wave(), v, with_burst(v, 28e-3), 15e-3);
  const auto once = disturbed.at(30);
  const auto rare = disturbed.repeated(30, 2);
  REQUIRE(rare.usable);
  REQUIRE(rare.recovers);
  REQUIRE_THAT(rare.rail_V, WithinAbs(once.rail_V, 2e-3));  // back to a millivolt before the next
  double before_V = once.rail_V + 1e-3;
  for (const double every_s : {0.08, 0.05, 0.041}) {
    const auto often = disturbed.repeated(30, every_s);
    INFO(every_s);
    REQUIRE(often.usable);
    REQUIRE(often.rail_V <= before_V);
    before_V = often.rail_V;
  }
  REQUIRE(before_V < once.rail_V - 0.05);
}

TEST_CASE("A burst that lasts until the next is the load for good") {
  const ElementValues v = loaded_values(), more = with_burst(v, 4e-3);
  auto disturbed = disturb(half_wave(), v, more, 3 * kPeriod_s);
  const auto always = disturbed.repeated(0, 3 * kPeriod_s);
  REQUIRE(always.usable);
  // The rounds end when one is less than a tenth of a millivolt lower than the one before.
  REQUIRE_THAT(always.rail_V, WithinAbs(solve_steady_state(half_wave().build(more)).rail_min_V, 2e-3));
}

TEST_CASE("Bursts whose mean is more than the line delivers never recover") {
  const ElementValues v = loaded_values();
  auto disturbed = disturb(half_wave(), v, with_burst(v, 100e-3), 15e-3);
  const auto often = disturbed.repeated(0, 0.06);
  REQUIRE(often.usable);
  REQUIRE_FALSE(often.recovers);
  REQUIRE(often.rail_V < kFloor_V);
}

TEST_CASE("Energy in equals energy out plus what is stored, over dip, burst and recovery") {
  for (const auto& arrangement : arrangements()) {
    if (!arrangement.dropper) continue;  // these values are a dropper's
    const ElementValues v = loaded_values();
    const Network network = arrangement.build(v);
    TransientOptions options;
    options.start_time_s = network.period_start_s;
    StateVector at = solve_steady_state(network).start;
    for (const ElementValues& stage :
         {dipped(v, 0, true), v, dipped(v, 0), v, with_burst(v, 40e-3), v, dipped(v, 0.4), v}) {
      options.duration_s = 0.013;
      const auto run = run_transient(arrangement.build(stage), at, options);
      INFO(arrangement.name << " " << run.reason);
      REQUIRE(run.usable);
      REQUIRE(run.energy_residual <= 1e-6);
      at = run.end;
      options.latched = run.latched;
      options.start_time_s += options.duration_s;
    }
  }
}

TEST_CASE("A constant power past what the rail can carry never comes back from a long dip") {
  ElementValues v = loaded_values();
  v.rail_current_A = 0;
  v.rail_power_W = 0.16;
  v.power_from_V = 4;
  v.power_to_V = 14;
  auto short_one = disturb(half_wave(), v, dipped(v, 0), 0.5 * kPeriod_s);
  auto long_one = disturb(half_wave(), v, dipped(v, 0), 6 * kPeriod_s);
  const auto survived = short_one.at(0), lost = long_one.at(0);
  REQUIRE(survived.recovers);
  REQUIRE(survived.rail_V > 9);
  REQUIRE(lost.usable);
  REQUIRE(lost.rail_V < kFloor_V);
}
