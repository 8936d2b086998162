#include "dropfront/circuit/rail_run.hpp"

#include <cmath>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/transient.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

TEST_CASE("Runs of the rail in pieces give what one run with all energies gives") {
  for (const auto& arrangement : arrangements()) {
    if (!arrangement.dropper) continue;  // these values are a dropper's
    const ElementValues v = ordinary_values();
    const Network network = arrangement.build(v);
    TransientOptions options;
    options.start_time_s = 0.003;
    options.duration_s = 0.05;
    const auto whole = run_transient(network, {-300.0, 2.0}, options);
    RailRun run(network);
    RunPoint at{0.003, {-300.0, 2.0}, 0};
    Extremes rail;
    for (const double piece_s : {0.0071, 0.02, 0.0009, 0.022}) REQUIRE(run.advance(piece_s, at, &rail));
    INFO(arrangement.name);
    // The same closed forms, cut elsewhere: rounding only.
    REQUIRE_THAT(at.x[0], WithinAbs(whole.end[0], 1e-6));
    REQUIRE_THAT(at.x[1], WithinAbs(whole.end[1], 1e-6));
    REQUIRE_THAT(rail.low, WithinAbs(whole.rail_min_V, 1e-6));
    REQUIRE_THAT(rail.high, WithinAbs(whole.rail_max_V, 1e-6));
    REQUIRE(at.latched == whole.latched);
  }
}

TEST_CASE("The moments at which a discharging capacitor passes a level are those of the exponential") {
  Network network;
  const Node line = network.add_node();
  network.source = {line, Waveform(230, 50).scaled(0)};
  const Node top = network.add_node();
  network.capacitors.push_back({top, 0, 1e-6, Owner::reservoir});
  network.resistors.push_back({top, 0, 1e5, Owner::discharge});
  network.resistors.push_back({line, top, 1e12, Owner::leak});
  network.rail = top;
  RailRun run(network);
  RunPoint at{0.5, {100.0}, 0};
  REQUIRE(run.advance(0.2, at));
  // Its voltage only falls: at or above 50 V from the beginning, below it to the end, and never at 101 V.
  REQUIRE(run.first_at_s(50).value() == 0.5);
  REQUIRE(run.last_below_s(50).value() == at.time_s);
  REQUIRE_FALSE(run.first_at_s(101));
  REQUIRE_FALSE(run.last_below_s(10));
}

TEST_CASE("A capacitor that charges through a resistor passes a level when the exponential says") {
  // From a capacitor a thousand times larger through 100 kohm: V = V0·(1 - e^(-t/RC)) to a thousandth.
  Network network;
  const Node line = network.add_node();
  network.source = {line, Waveform(230, 50).scaled(0)};
  const Node full = network.add_node(), top = network.add_node();
  network.capacitors.push_back({full, 0, 1e-3, Owner::dropper});
  network.capacitors.push_back({top, 0, 1e-6, Owner::reservoir});
  network.resistors.push_back({full, top, 1e5, Owner::discharge});
  network.resistors.push_back({line, top, 1e12, Owner::leak});
  network.rail = top;
  RailRun run(network);
  RunPoint at{0, {100.0, 0.0}, 0};
  REQUIRE(run.advance(0.5, at));
  const double expected_s = -0.1 * std::log(1 - 0.6);
  REQUIRE_THAT(run.first_at_s(60).value(), WithinRel(expected_s, 3e-3));
  REQUIRE_THAT(run.last_below_s(60).value(), WithinRel(expected_s, 3e-3));
}
