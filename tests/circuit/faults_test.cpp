#include "dropfront/circuit/faults.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/steady_state.hpp"
#include "dropfront/circuit/transient.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

namespace {

ElementValues unloaded_values() {
  ElementValues v = ordinary_values();
  v.mains = Waveform(253, 50);
  v.reservoir_F = 22e-6;
  v.rail_current_A = 1e-6;
  v.dropper_esr_ohm = 0;  // a shorted film has none
  return v;
}

FaultPlace place_of(const Network& network, Owner owner, std::size_t which = 0) {
  std::vector<FaultPlace> places;
  for (const auto& place : fault_places(network)) {
    if (place.owner == owner) places.push_back(place);
  }
  REQUIRE(places.size() > which);
  return places[which];
}

std::size_t count_of(const char* arrangement, Owner owner) {
  const auto places = fault_places(find_arrangement(arrangement)->build(unloaded_values()));
  return static_cast<std::size_t>(
      std::count_if(places.begin(), places.end(), [&](const FaultPlace& p) { return p.owner == owner; }));
}

/// The run of 253 V with one part gone, next to no load, from empty.
Transient run_of(const char* arrangement, Owner owner, FaultKind kind, double duration_s) {
  TransientOptions options;
  options.duration_s = duration_s;
  const Network network = find_arrangement(arrangement)->build(unloaded_values());
  const auto run = run_transient(with_fault(network, place_of(network, owner), kind), StateVector{}, options);
  INFO(arrangement << ": " << run.reason);
  REQUIRE(run.usable);
  return run;
}

}  // namespace

TEST_CASE("An open zener lets the rail rise to twice the crest, behind a bridge to the crest") {
  // 703 and 355 V stated beforehand; drops and the leak take a per cent or two.
  for (const char* name : {"half-wave-clamp-across", "half-wave-thyristor-shunt"}) {
    REQUIRE_THAT(run_of(name, Owner::clamp, FaultKind::open, 20).rail_max_V, WithinRel(703.0, 0.03));
  }
  REQUIRE_THAT(run_of("bridge-clamp-across", Owner::clamp, FaultKind::open, 20).rail_max_V,
               WithinRel(355.0, 0.03));
}

TEST_CASE("A zener ahead of the diode takes its own forward direction with it, and the rail only creeps") {
  // Without a path back the dropper charges up once; then the discharge chain alone feeds the rail.
  const double after_1_s = run_of("half-wave-clamp-ahead", Owner::clamp, FaultKind::open, 1).rail_max_V;
  const double after_6_s = run_of("half-wave-clamp-ahead", Owner::clamp, FaultKind::open, 6).rail_max_V;
  REQUIRE(after_6_s > after_1_s + 1);
  REQUIRE(after_6_s < 353);  // the crest is out of reach by charge: 6 s at 0.1 mA into 22 uF are 30 V
}

TEST_CASE("A shorted zener keeps the rail at next to nothing") {
  REQUIRE(run_of("half-wave-clamp-across", Owner::clamp, FaultKind::shorted, 1).rail_max_V < 1.0);
}

/// Mean power in the resistor over one half cycle behind a branch of some threshold and slope.
double half_cycle_W(double resistor_ohm, double other_ohm, double threshold_V) {
  const double crest_V = 253 * std::sqrt(2.0);
  const double square_V2 = crest_V * crest_V / 2 - 4 / std::numbers::pi * crest_V * threshold_V +
                           threshold_V * threshold_V;  // ends of the half cycle counted in: 1e-4
  const double sum_ohm = resistor_ohm + other_ohm;
  return square_V2 / (sum_ohm * sum_ohm) * resistor_ohm;
}

TEST_CASE("A shorted dropper puts the line on the series resistor, less clamp and diodes") {
  const ElementValues v = unloaded_values();
  const double diode_ohm = v.rectifier.slope_ohm, diode_V = v.rectifier.threshold_V;
  const double clamp_ohm = v.clamp.main.slope_ohm, clamp_V = v.clamp.main.threshold_V;
  const auto power_W = [](const char* name) {
    return run_of(name, Owner::dropper, FaultKind::shorted, 0.2)
               .loss_J[static_cast<int>(Owner::series_resistor)] /
           0.2;
  };
  const double reset_W = half_cycle_W(47, diode_ohm, diode_V);
  const double across_W = half_cycle_W(47, diode_ohm + clamp_ohm, clamp_V + diode_V);
  const double ahead_W = half_cycle_W(47, clamp_ohm, clamp_V);
  const double bridge_W = half_cycle_W(47, 2 * diode_ohm + clamp_ohm, clamp_V + 2 * diode_V);
  // The reservoir takes some of the first half cycles' current: 2 %.
  CHECK_THAT(power_W("half-wave-clamp-across"), WithinRel((reset_W + across_W) / 2, 0.02));
  CHECK_THAT(power_W("half-wave-clamp-ahead"), WithinRel((reset_W + ahead_W) / 2, 0.02));
  CHECK_THAT(power_W("bridge-clamp-across"), WithinRel(bridge_W, 0.02));
}

TEST_CASE("One of two zeners shorted leaves its direction to the other's forward voltage") {
  const Network network = find_arrangement("bridge-clamp-ahead")->build(unloaded_values());
  const auto whole = solve_steady_state(network);
  const auto faulty =
      solve_steady_state(with_fault(network, place_of(network, Owner::clamp), FaultKind::shorted));
  INFO(whole.reason << "; " << faulty.reason);
  REQUIRE(whole.usable());
  REQUIRE(faulty.usable());
  // The dropper now charges through one direction only: half the charge, at a rail of the same height.
  const auto clamp = static_cast<std::size_t>(Owner::clamp);
  CHECK(faulty.loss_W[clamp] < 0.75 * whole.loss_W[clamp]);
  CHECK_THAT(faulty.rail_max_V, WithinRel(whole.rail_max_V, 0.1));
}

TEST_CASE("Every part of an arrangement is a place for a fault, once") {
  CHECK(count_of("half-wave-clamp-ahead", Owner::rectifier) == 1);  // the other is the zener's own
  CHECK(count_of("half-wave-clamp-ahead", Owner::clamp) == 1);
  CHECK(count_of("half-wave-clamp-across", Owner::rectifier) == 2);
  CHECK(count_of("bridge-clamp-across", Owner::rectifier) == 4);
  CHECK(count_of("bridge-clamp-ahead", Owner::clamp) == 2);
  CHECK(count_of("bridge-thyristor-shunt", Owner::rectifier) == 5);
  CHECK(count_of("bridge-thyristor-shunt", Owner::thyristor) == 1);
  CHECK(count_of("half-wave-thyristor-shunt", Owner::gate_resistor) == 1);
  CHECK(count_of("resistive", Owner::rectifier) == 1);
}
