#include "dropfront/circuit/transient.hpp"

#include <cmath>

#include "circuit/support_values.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

TEST_CASE("Energy in equals energy out plus what is stored, from any start") {
  for (const auto& arrangement : dropping()) {
    for (const double phase : {0.0, 0.13, 0.25, 0.6}) {
      const ElementValues v = ordinary_values();
      TransientOptions options;
      options.start_time_s = phase * v.mains.period_s();
      options.duration_s = 0.05;
      const auto run = run_transient(arrangement.build(v), {-300.0, 2.0}, options);
      INFO(arrangement.name << " " << phase << " " << run.reason);
      REQUIRE(run.usable);
      REQUIRE(run.energy_residual <= 1e-6);
    }
  }
}

TEST_CASE("A run that starts on the periodic orbit stays on it") {
  for (const auto& arrangement : dropping()) {
    const ElementValues v = ordinary_values();
    const Network network = arrangement.build(v);
    const SteadyState state = solve_steady_state(network);
    TransientOptions options;
    options.start_time_s = network.period_start_s;
    options.duration_s = 5 * v.mains.period_s();
    const auto run = run_transient(network, state.start, options);
    REQUIRE(run.usable);
    // The orbit closes to 1e-8 V a period and contracts.
    REQUIRE_THAT(run.rail_min_V, WithinAbs(state.rail_min_V, 1e-6));
    REQUIRE_THAT(run.rail_max_V, WithinAbs(state.rail_max_V, 1e-6));
    REQUIRE_THAT(run.input_energy_J, WithinRel(state.input_power_W * options.duration_s, 1e-6));
  }
}

TEST_CASE("A worst re-plug puts half C times twice the crest squared into the series resistor") {
  // Adiabatic bound of an R-C charged from opposite crests, independent of R; handbook arithmetic.
  ElementValues v = ordinary_values();
  v.mains = Waveform(253, 50);
  v.discharge_ohm = INFINITY;
  v.dropper_esr_ohm = 0;
  TransientOptions options;
  options.start_time_s = v.mains.crest_time_s();
  options.duration_s = 10 * v.series_resistor_ohm * v.dropper_F;
  const auto run =
      run_transient(find_arrangement("half-wave-clamp-ahead")->build(v), {-v.mains.crest_V(), 12.0}, options);
  const double bound_J = 0.5 * v.dropper_F * std::pow(2 * v.mains.crest_V(), 2);
  REQUIRE(run.usable);
  REQUIRE(run.resistor_energy_J[0] < bound_J);
  REQUIRE(run.resistor_energy_J[0] > 0.85 * bound_J);  // the clamp and the diodes take the rest
  REQUIRE_THAT(run.resistor_peak_A[0], WithinRel((2 * v.mains.crest_V() - 12) / 47, 0.1));
}

TEST_CASE("Plug-in drives the rail through the reservoir's series resistance") {
  // 47 ohm, ESR 0.1/0.8/2 ohm: 13.7/21.8/33.9 V, found with a simulator and an independent
  // piecewise-linear calculation.
  const double esr_ohm[] = {0.1, 0.8, 2.0};
  const double expected_V[] = {13.7, 21.8, 33.9};
  for (int k = 0; k < 3; ++k) {
    ElementValues v = ordinary_values();
    v.mains = Waveform(253, 50);
    v.reservoir_esr_ohm = esr_ohm[k];
    TransientOptions options;
    options.start_time_s = v.mains.crest_time_s();
    const auto run = run_transient(find_arrangement("half-wave-clamp-across")->build(v),
                                   {-v.mains.crest_V(), 12.0}, options);
    REQUIRE(run.usable);
    REQUIRE_THAT(run.rail_max_V, WithinRel(expected_V[k], 0.04));  // the state of charge is not stated
  }
}

TEST_CASE("The observer's samples integrate to the energy the closed form gives") {
  const ElementValues v = ordinary_values();
  TransientOptions options;
  options.start_time_s = v.mains.crest_time_s();
  double energy_J = 0;
  double covered_s = 0;
  double before_W = 0;
  options.observer = [&](const Moment& now) {
    const double power_W = now.resistor_A[0] * now.resistor_A[0] * 47;
    energy_J += 0.5 * (power_W + before_W) * now.step_s;
    covered_s += now.step_s;
    before_W = power_W;
  };
  const auto run =
      run_transient(find_arrangement("half-wave-clamp-ahead")->build(v), {-325.0, 12.0}, options);
  REQUIRE(run.usable);
  REQUIRE_THAT(covered_s, WithinRel(options.duration_s, 1e-9));
  REQUIRE_THAT(energy_J, WithinRel(run.resistor_energy_J[0], 2e-3));  // trapezoids over graded samples
}

TEST_CASE("A lone resistor and capacitor discharge exponentially") {
  Network network;
  const Node line = network.add_node();
  network.source = {line, Waveform(1e-6, 50)};
  const Node top = network.add_node();
  network.capacitors.push_back({top, 0, 1e-6, Owner::reservoir});
  network.resistors.push_back({top, 0, 1e5, Owner::discharge});
  network.resistors.push_back({line, top, 1e12, Owner::leak});
  network.rail = top;
  TransientOptions options;
  options.duration_s = 0.2;
  const auto run = run_transient(network, {100.0}, options);
  REQUIRE(run.usable);
  REQUIRE_THAT(run.end[0], WithinRel(100 * std::exp(-2.0), 1e-6));  // the leak takes 1e-7
}
