#include <cmath>
#include <numbers>

#include "dropfront/report/deck.hpp"
#include "support/catch.hpp"
#include "support/ngspice.hpp"

namespace dropfront::report {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using circuit::Network;
using circuit::Node;
using circuit::Owner;

constexpr double kSlope_ohm = 1e-3;  // ideal clamps: a slope too small to show

struct Row {
  double line_Vrms, frequency_Hz, dropper_F, series_ohm, output_V, drop_V;
  double half_A, half_Arms, bridge_A, bridge_Arms;
};

/// Time-domain integration with ideal clamps into a constant voltage (40 000 steps a cycle, exact exponential
/// a step): as restated, copy not kept; it agrees with f·C·(2·Vpk - Vo - 2·Vf) and 4·f·C·(Vpk - Vo - 2·Vf) to
/// 0.4 %.
constexpr Row kRows[] = {
    {230, 50, 0.47e-6, 47, 12, 0.7, 14.9724e-3, 33.872e-3, 29.3150e-3, 33.715e-3},
    {230, 50, 0.33e-6, 100, 5.1, 0.7, 10.6261e-3, 23.822e-3, 21.0376e-3, 23.783e-3},
    {120, 60, 1.0e-6, 47, 5.1, 0.7, 19.9715e-3, 45.120e-3, 39.1630e-3, 44.927e-3},
    {120, 60, 0.47e-6, 470, 5.1, 0.7, 9.3551e-3, 21.115e-3, 18.3436e-3, 21.006e-3},
    {277, 60, 0.22e-6, 100, 24, 0.8, 10.0036e-3, 22.855e-3, 19.3313e-3, 22.644e-3},
};

/// Mains, resistor, dropper; returns the node behind the dropper.
Node dropper_side(Network& n, const Row& row) {
  const Node line = n.add_node(), middle = n.add_node(), behind = n.add_node();
  n.source = {line, circuit::Waveform(row.line_Vrms, row.frequency_Hz)};
  n.resistors.push_back({line, middle, row.series_ohm, Owner::series_resistor});
  n.capacitors.push_back({middle, behind, row.dropper_F, Owner::dropper});
  return behind;
}

Network half_wave(const Row& row) {
  Network n;
  const Node behind = dropper_side(n, row), rail = n.add_node();
  n.branches.push_back({0, behind, row.drop_V, kSlope_ohm, Owner::rectifier});
  n.branches.push_back({behind, rail, row.drop_V, kSlope_ohm, Owner::rectifier});
  n.branches.push_back({rail, 0, row.output_V, kSlope_ohm, Owner::clamp});
  n.resistors.push_back({rail, 0, 1e9, Owner::leak});
  n.rail = rail;
  return n;
}

Network bridge(const Row& row) {
  Network n;
  const Node behind = dropper_side(n, row), positive = n.add_node(), negative = n.add_node();
  for (const Node ac : {behind, Node{0}}) {
    n.branches.push_back({ac, positive, row.drop_V, kSlope_ohm, Owner::rectifier});
    n.branches.push_back({negative, ac, row.drop_V, kSlope_ohm, Owner::rectifier});
    n.resistors.push_back({negative, ac, 1e9, Owner::leak});
    n.resistors.push_back({positive, ac, 1e9, Owner::leak});
  }
  n.branches.push_back({positive, negative, row.output_V, kSlope_ohm, Owner::clamp});
  n.rail = positive;
  n.rail_return = negative;
  return n;
}

void check(const Network& network, const Row& row, double mean_A, double rms_A, int diodes, BranchForm form) {
  DeckOptions options;
  options.branches = form;
  options.run_periods = 12;
  const auto found = support::run_ngspice(make_deck(network, "ideal clamps", options));
  // 0.2 %: millivolts of a junction against tens of volts, and the simulator's own step control.
  CHECK_THAT(found.at("input_current"), WithinRel(rms_A, 2e-3));
  // Energy: what the resistor leaves over is the mean output current times the drops in its way.
  const double left_W =
      found.at("input_power") - row.series_ohm * found.at("input_current") * found.at("input_current");
  CHECK_THAT(left_W / (row.output_V + diodes * row.drop_V), WithinRel(mean_A, 5e-3));
  CHECK_THAT(found.at("rail_max"), WithinAbs(row.output_V, 0.01));
}

TEST_CASE("a deck run by ngspice gives the known currents into ideal clamps") {
  for (const Row& row : kRows)
    for (const BranchForm form : {BranchForm::smooth, BranchForm::piecewise}) {
      INFO(row.line_Vrms << " V, " << row.dropper_F << " F, "
                         << (form == BranchForm::smooth ? "smooth" : "piecewise"));
      check(half_wave(row), row, row.half_A, row.half_Arms, 2, form);
      check(bridge(row), row, row.bridge_A, row.bridge_Arms, 2, form);
    }
}

/// Series R and C on two tones, no branch: power and current follow from impedances alone.
TEST_CASE("the tones of a deck add up with their phases and the run can begin at any mains time") {
  Network n;
  const Node line = n.add_node(), rail = n.add_node();
  const circuit::Waveform mains(230, 50, {{3, 0.3, 1.0}, {5, 0.2, -2.0}});
  n.source = {line, mains};
  n.resistors.push_back({line, rail, 100, Owner::series_resistor});
  n.resistors.push_back({rail, 0, 900, Owner::discharge});
  n.rail = rail;
  for (const double start_s : {0.0, 3.3e-3}) {
    DeckOptions options;
    options.start_time_s = start_s;
    options.run_periods = 0.05;
    options.measured_periods = 1e-3;  // the last 20 us: the value at one moment
    options.max_step_periods = 1e-4;
    const auto found = support::run_ngspice(make_deck(n, "tones", options));
    const double moment_s = start_s + (0.05 - 0.5e-3) * 0.02;
    // 0.3 V: a mains slope of up to 0.2 V/us times the simulator's step of 2 us; a wrong phase shows as tens
    // of volts.
    CHECK_THAT(found.at("rail_mean"), WithinAbs(0.9 * mains.value_V(moment_s), 0.3));
  }
}

TEST_CASE("the load of a deck is constant above its cut-off and falls in proportion below") {
  // A capacitor emptied by the load: straight from 10 V to the cut-off at 4 V, then exponential.
  Network n;
  const Node line = n.add_node(), rail = n.add_node();
  n.source = {line, circuit::Waveform(1, 50)};
  n.resistors.push_back({line, 0, 1e6, Owner::leak});
  n.capacitors.push_back({rail, 0, 10e-6, Owner::reservoir});
  n.loads.push_back({rail, 0, 2e-3, 4.0});
  n.rail = rail;
  DeckOptions options;
  options.initial_V = {10.0};
  const double straight_s = 6.0 * 10e-6 / 2e-3;  // 30 ms
  const double decay_s = 4.0 * 10e-6 / 2e-3;     // 20 ms
  options.run_periods = 2.5;                     // 50 ms: one time constant into the tail
  options.measured_periods = 2.5;
  const auto found = support::run_ngspice(make_deck(n, "load", options));
  CHECK_THAT(found.at("rail_min"), WithinRel(4.0 * std::exp(-(0.05 - straight_s) / decay_s), 2e-3));
  const double area_Vs = 7.0 * straight_s + 4.0 * decay_s * (1 - std::exp(-1.0));
  CHECK_THAT(found.at("rail_mean"), WithinRel(area_Vs / 0.05, 2e-3));
}

TEST_CASE("the energies of a deck add up to what the mains gave") {
  const Row& row = kRows[0];
  const Network n = half_wave(row);
  DeckOptions options;
  options.run_periods = 10;
  options.measured_periods = 2;
  options.measure_energies = true;
  const auto found = support::run_ngspice(make_deck(n, "energy", options));
  double spent_J = 0;
  for (const char* name : {"energy_r1", "energy_r2", "energy_d1", "energy_d2", "energy_d3"})
    spent_J += found.at(name);
  // 1 %: trapezoidal sums over the simulator's own steps; nothing is stored over whole periods once settled.
  CHECK_THAT(spent_J, WithinRel(found.at("input_power") * 2 / row.frequency_Hz, 0.01));
}

}  // namespace
}  // namespace dropfront::report
