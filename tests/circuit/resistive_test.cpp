#include <cmath>
#include <numbers>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/available_current.hpp"
#include "dropfront/circuit/steady_state.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

namespace {

/// Mean of (Vp·sin - E)+ / R over a period: (sqrt(Vp² - E²) - E·acos(E/Vp)) / (pi·R).
double closed_form_A(double crest_V, double level_V, double ohm) {
  return (std::sqrt(crest_V * crest_V - level_V * level_V) - level_V * std::acos(level_V / crest_V)) /
         (std::numbers::pi * ohm);
}

}  // namespace

TEST_CASE("A resistive supply delivers the closed-form mean current of a resistor and a diode") {
  for (const double ohm : {10e3, 33e3, 100e3}) {
    ElementValues v = yardstick_values();
    v.series_resistor_ohm = ohm;
    v.reservoir_F = 2200e-6;  // next to no ripple: the rail stands still at its minimum
    v.reservoir_esr_ohm = 0;
    const double required_V = 9;
    const auto found = find_available_current(resistive().build, v, required_V);
    INFO(found.reason);
    REQUIRE(found.usable);
    // The diode's slope is 2e-5 of the resistor, the ripple left some 1e-4 of the crest's rise over the rail.
    const double expected_A = closed_form_A(230 * std::sqrt(2.0), required_V + v.rectifier.threshold_V, ohm);
    CHECK_THAT(found.current_A, WithinRel(expected_A, 1e-3));
  }
}

TEST_CASE("A resistive supply's input power is nearly half of V squared over R, loaded or not") {
  ElementValues v = yardstick_values();
  double before_W = 0;
  for (const double load_A : {0.1e-3, 1e-3, 2.5e-3}) {
    v.rail_current_A = load_A;
    const SteadyState state = solve_steady_state(resistive().build(v));
    REQUIRE(state.usable());
    REQUIRE(state.energy_residual < 1e-6);
    // Rail and diode take 2·Vo·Vf-mean of it away: E/Vp is 4 %.
    CHECK_THAT(state.input_power_W, WithinRel(230.0 * 230.0 / (2 * 33e3), 0.06));
    if (before_W > 0) CHECK_THAT(state.input_power_W, WithinRel(before_W, 0.02));
    before_W = state.input_power_W;
  }
}
