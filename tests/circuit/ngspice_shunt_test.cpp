#include <algorithm>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/steady_state.hpp"
#include "dropfront/report/deck.hpp"
#include "support/catch.hpp"
#include "support/ngspice.hpp"

namespace dropfront::circuit {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;

TEST_CASE("Thyristor shunts agree with ngspice, alternating ones included", "[shunt]") {
  // Reference: ngspice on the project's own deck (latch on a memory node, smooth diodes). Rail 2 % or 0.2 V,
  // current 1 %, power 3 %.
  struct Row {
    const char* arrangement;
    double load_A;
    double esr_ohm;
  };
  const Row rows[] = {{"half-wave-thyristor-shunt", 5e-3, 0.8}, {"half-wave-thyristor-shunt", 15e-3, 1.5},
                      {"half-wave-thyristor-shunt", 19e-3, 3},  {"bridge-thyristor-shunt", 5e-3, 0.8},
                      {"bridge-thyristor-shunt", 12e-3, 1.5},   {"bridge-thyristor-shunt", 18e-3, 3}};
  for (const Row& row : rows) {
    INFO(row.arrangement << " " << row.load_A);
    ElementValues v = ordinary_values();
    v.dropper_F *= row.arrangement[0] == 'b' ? 0.5 : 1;
    v.clamp.main = {11.2, 9};
    v.reservoir_F = 100e-6;
    v.reservoir_esr_ohm = row.esr_ohm;
    v.rail_current_A = row.load_A;
    const Network network = find_arrangement(row.arrangement)->build(v);
    const SteadyState ours = solve_steady_state(network);
    REQUIRE(ours.usable());
    report::DeckOptions options;
    options.initial_V.assign(ours.start.begin(), ours.start.end());
    options.start_time_s = network.period_start_s;
    options.run_periods = 48;
    options.measured_periods = 32;
    const auto theirs = support::run_ngspice(report::make_deck(network, row.arrangement, options));
    const auto volts = [](double reference) { return WithinAbs(reference, std::max(0.2, 0.02 * reference)); };
    CHECK_THAT(ours.rail_min_V, volts(theirs.at("rail_min")));
    CHECK_THAT(ours.rail_mean_V, volts(theirs.at("rail_mean")));
    CHECK_THAT(ours.rail_max_V, volts(theirs.at("rail_max")));
    CHECK_THAT(ours.input_power_W, WithinRel(theirs.at("input_power"), 0.03));
    CHECK_THAT(ours.input_current_Arms, WithinRel(theirs.at("input_current"), 0.01));
  }
}

}  // namespace
}  // namespace dropfront::circuit
