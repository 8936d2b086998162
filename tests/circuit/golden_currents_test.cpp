// Time-domain integrations of ideal half-wave and bridge droppers (40,000 steps a cycle, exact exponential a
// step, constant output voltage), computed independently of this engine and stated to six digits.
#include <cmath>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/steady_state.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

namespace {

struct Golden {
  double voltage_Vrms, frequency_Hz, dropper_F, series_ohm, output_V, drop_V;
  bool bridge;
  double mean_A, rms_A;
};

const Golden kTable[] = {
    {230, 50, 0.47e-6, 47, 12, 0.7, false, 14.9724e-3, 33.872e-3},
    {230, 50, 0.47e-6, 47, 12, 0.7, true, 29.3150e-3, 33.715e-3},
    {230, 50, 0.33e-6, 100, 5.1, 0.7, false, 10.6261e-3, 23.822e-3},
    {230, 50, 0.33e-6, 100, 5.1, 0.7, true, 21.0376e-3, 23.783e-3},
    {120, 60, 1.0e-6, 47, 5.1, 0.7, false, 19.9715e-3, 45.120e-3},
    {120, 60, 1.0e-6, 47, 5.1, 0.7, true, 39.1630e-3, 44.927e-3},
    {120, 60, 0.47e-6, 470, 5.1, 0.7, false, 9.3551e-3, 21.115e-3},
    {120, 60, 0.47e-6, 470, 5.1, 0.7, true, 18.3436e-3, 21.006e-3},
    {277, 60, 0.22e-6, 100, 24, 0.8, false, 10.0036e-3, 22.855e-3},
    {277, 60, 0.22e-6, 100, 24, 0.8, true, 19.3313e-3, 22.644e-3},
};

/// Nearly ideal parts: a milliohm of slope, a reservoir that holds the output still.
SteadyState solve(const Golden& g) {
  ElementValues v;
  v.mains = Waveform(g.voltage_Vrms, g.frequency_Hz);
  v.series_resistor_ohm = g.series_ohm;
  v.dropper_F = g.dropper_F;
  v.rectifier = {g.drop_V, 1e-3};
  v.clamp.main = {g.output_V, 1e-3};
  v.reservoir_F = 0.1;
  const auto* arrangement = find_arrangement(g.bridge ? "bridge-clamp-across" : "half-wave-clamp-across");
  return solve_steady_state(arrangement->build(v));
}

double clamp_mean_A(const Golden& g, const SteadyState& state) {
  // Every slope but the clamp's carries the full current; its loss over its voltage is its mean current.
  return state.loss_W[static_cast<std::size_t>(Owner::clamp)] / g.output_V;
}

}  // namespace

TEST_CASE("Mean and r.m.s. currents of ideal droppers agree with brute-force integration") {
  for (const auto& g : kTable) {
    const SteadyState state = solve(g);
    INFO(g.voltage_Vrms << " V " << g.output_V << " V bridge " << g.bridge << " " << state.reason);
    REQUIRE(state.usable());
    // The table's last digit is worth 3e-6 to 1e-5; a milliohm of slope moves less than 1e-5.
    REQUIRE_THAT(clamp_mean_A(g, state), WithinRel(g.mean_A, 5e-5));
    REQUIRE_THAT(state.input_current_Arms, WithinRel(g.rms_A, 5e-5));
  }
}

TEST_CASE("The charge-balance closed forms hold to 0.4 per cent") {
  for (const auto& g : kTable) {
    const SteadyState state = solve(g);
    const double crest_V = std::sqrt(2.0) * g.voltage_Vrms;
    const double closed_A = g.bridge
                                ? 4 * g.frequency_Hz * g.dropper_F * (crest_V - g.output_V - 2 * g.drop_V)
                                : g.frequency_Hz * g.dropper_F * (2 * crest_V - g.output_V - 2 * g.drop_V);
    REQUIRE_THAT(clamp_mean_A(g, state), WithinRel(closed_A, 4e-3));  // omega·Rs·C up to 0.083 here
  }
}
