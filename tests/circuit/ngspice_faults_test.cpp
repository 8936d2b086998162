#include <algorithm>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/faults.hpp"
#include "dropfront/circuit/steady_state.hpp"
#include "dropfront/circuit/transient.hpp"
#include "dropfront/report/deck.hpp"
#include "support/catch.hpp"
#include "support/ngspice.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

TEST_CASE("A creeping rail agrees with ngspice", "[wiring]") {
  ElementValues v = ordinary_values();
  v.mains = Waveform(253, 50);
  v.reservoir_F = 22e-6;
  v.rail_current_A = 1e-6;
  const Network network = find_arrangement("half-wave-clamp-ahead")->build(v);
  const auto places = fault_places(network);
  const auto zener =
      std::find_if(places.begin(), places.end(), [](const FaultPlace& p) { return p.owner == Owner::clamp; });
  REQUIRE(zener != places.end());
  const Network faulty = with_fault(network, *zener, FaultKind::open);
  TransientOptions options;
  options.duration_s = 0.5;
  const auto run = run_transient(faulty, StateVector{}, options);
  REQUIRE(run.usable);
  dropfront::report::DeckOptions deck;
  deck.run_periods = 25;
  const auto theirs =
      dropfront::support::run_ngspice(dropfront::report::make_deck(faulty, "open zener", deck));
  // Source: ngspice on the project's own deck, from empty, over the same half second. Its diodes are smooth
  // junctions, a tenth of a volt each: 3 %.
  REQUIRE_THAT(run.rail_max_V, WithinRel(theirs.at("rail_max"), 0.03));
}

TEST_CASE("A resistive supply agrees with ngspice, clamped and pulled below its clamp", "[wiring]") {
  for (const double load_A : {0.5e-3, 3.4e-3}) {
    ElementValues v = yardstick_values();
    v.reservoir_F = 47e-6;
    v.rail_current_A = load_A;
    const Network network = resistive().build(v);
    const SteadyState ours = solve_steady_state(network);
    REQUIRE(ours.usable());
    dropfront::report::DeckOptions options;
    options.initial_V.assign(ours.start.begin(), ours.start.end());
    options.run_periods = 24;
    const auto theirs = dropfront::support::run_ngspice(
        dropfront::report::make_deck(network, "resistive yardstick", options));
    // Source: ngspice on the project's own deck, the diode as a smooth junction. Rail 0.2 V, power 3 %,
    // current 1 %, as for every arrangement.
    CHECK_THAT(ours.rail_min_V, WithinAbs(theirs.at("rail_min"), 0.2));
    CHECK_THAT(ours.rail_mean_V, WithinAbs(theirs.at("rail_mean"), 0.2));
    CHECK_THAT(ours.input_power_W, WithinRel(theirs.at("input_power"), 0.03));
    CHECK_THAT(ours.input_current_Arms, WithinRel(theirs.at("input_current"), 0.01));
  }
}
