// Combination-wave surges against ngspice: peaks and energies within 5 %.
#include <fmt/core.h>

#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/circuit/surge_wave.hpp"
#include "dropfront/circuit/transient.hpp"
#include "dropfront/circuit/varistor.hpp"
#include "dropfront/report/deck.hpp"
#include "support/catch.hpp"
#include "support/ngspice.hpp"
#include "support/sample_designs.hpp"

namespace dropfront::circuit {
namespace {

using Catch::Matchers::WithinRel;

constexpr double kRunPeriods = 0.025;  // 0.5 ms: ten times the wave's half-value time

double their_energy_J(const support::Measures& measures, char kind, std::size_t number) {
  return measures.at(std::string("energy_") + kind + std::to_string(number + 1));
}

/// 1 kV behind 2 ohm on the positive crest, from the state a running supply has there.
void compare(const Arrangement& arrangement, double surge_V, bool guarded, bool before) {
  INFO(arrangement.name << ", " << surge_V << " V" << (guarded ? ", varistor " : "")
                        << (guarded ? (before ? "before" : "after") : ""));
  ElementValues values = support::sample_designs(arrangement).front().values;
  values.rail_current_A = 0;
  values.dropper_esr_ohm = 0;
  values.source_ohm = 2;
  values.varistor_before = before;
  if (guarded) {
    values.varistor = varistor_branches({430, 710, 50}, 400);
    values.varistor_ways = surge_V > 0 ? 1 : -1;
  }
  const double start_s = values.mains.crest_time_s();
  const double crest_V = values.mains.crest_V();
  values.mains =
      values.mains.with_pulse(start_s, surge_V * SurgeWave::kScale, SurgeWave::kFront_s, SurgeWave::kTail_s);
  const Network network = arrangement.build(values);
  const double rail_V = values.clamp.main.threshold_V;
  StateVector start{};
  for (std::size_t i = 0; i < network.capacitors.size(); ++i)
    start[i] = network.capacitors[i].owner == Owner::dropper ? crest_V - rail_V : rail_V;

  TransientOptions run;
  run.start_time_s = start_s;
  run.duration_s = kRunPeriods * values.mains.period_s();
  const Transient ours = run_transient(network, start, run);
  REQUIRE(ours.usable);

  report::DeckOptions options;
  options.initial_V.assign(start.begin(), start.end());
  options.start_time_s = start_s;
  options.run_periods = options.measured_periods = kRunPeriods;
  options.max_step_periods = 5e-6;  // 0.1 us against a front of 0.4 us; the simulator goes finer by itself
  options.measure_energies = true;
  // A varistor's junctions beside an idle bridge leave the simulator without a step to take.
  if (guarded) options.branches = report::BranchForm::piecewise;
  const auto theirs = support::run_ngspice(report::make_deck(network, "surge", options));

  CHECK_THAT(ours.rail_max_V, WithinRel(theirs.at("rail_max"), 0.05));
  double varistor_J = 0, their_varistor_J = 0;
  for (std::size_t r = 0; r < network.resistors.size(); ++r) {
    if (network.resistors[r].owner != Owner::series_resistor && network.resistors[r].owner != Owner::line)
      continue;
    CHECK_THAT(ours.resistor_energy_J[r], WithinRel(their_energy_J(theirs, 'r', r), 0.05));
  }
  double clamp_J = 0, their_clamp_J = 0;
  for (std::size_t b = 0; b < network.branches.size(); ++b) {
    const Owner owner = network.branches[b].owner;
    if (owner == Owner::varistor) {
      varistor_J += ours.branch_energy_J[b];
      their_varistor_J += their_energy_J(theirs, 'd', b);
    }
    if (owner == Owner::clamp) {
      clamp_J += ours.branch_energy_J[b];
      their_clamp_J += their_energy_J(theirs, 'd', b);
    }
  }
  CHECK_THAT(clamp_J, WithinRel(their_clamp_J, 0.05));
  if (guarded && surge_V > 0) {
    CHECK(varistor_J > 0.01);
    CHECK_THAT(varistor_J, WithinRel(their_varistor_J, 0.05));
  }
}

TEST_CASE("a surge on the crest agrees with ngspice in peak and energies, varistor or not", "[surge]") {
  for (const char* name : {"half-wave-clamp-across", "bridge-clamp-across"}) {
    const Arrangement& arrangement = *find_arrangement(name);
    compare(arrangement, 1000, false, true);
    compare(arrangement, 1000, true, true);
    compare(arrangement, -1000, true, true);
  }
  compare(*find_arrangement("half-wave-clamp-ahead"), 1000, true, false);
  compare(*find_arrangement("bridge-clamp-ahead"), 2000, true, true);
}

TEST_CASE("a varistor's few pieces take the energy of its whole law", "[surge]") {
  // The law itself as a current source in ngspice: I = 50 A·(V/710 V)^(1/exponent). Energy and peak voltage 2
  // %: the stated 2 % of voltage from a thirtieth of the greatest current up.
  const VaristorLaw law{430, 710, 50};
  const Waveform mains(253, 50);
  const double crest_s = mains.crest_time_s(), crest_V = mains.crest_V();
  Network network;
  const Node line = network.add_node(), top = network.add_node(), rail = network.add_node();
  network.source = {
      line, mains.with_pulse(crest_s, 1000 * SurgeWave::kScale, SurgeWave::kFront_s, SurgeWave::kTail_s)};
  network.resistors.push_back({line, top, 2, Owner::line});
  for (const Curve& piece : varistor_branches(law, current_behind_A(law, crest_V + 1000, 2)))
    network.branches.push_back({top, 0, piece.threshold_V, piece.slope_ohm, Owner::varistor});
  network.resistors.push_back({top, rail, 1e6, Owner::leak});
  network.capacitors.push_back({rail, 0, 1e-9, Owner::reservoir});
  network.rail = top;
  TransientOptions run;
  run.start_time_s = crest_s;
  run.duration_s = 0.5e-3;
  const Transient ours = run_transient(network, {crest_V}, run);
  REQUIRE(ours.usable);

  const std::string deck = fmt::format(
      "varistor law\n"
      "BS line 0 V={}*cos(314.159265*time)+{}*(exp(-time/{})-exp(-time*{}))\n"
      "R1 line top 2\n"
      "BV top 0 I=50*pwr(uramp(V(top))/710,{})\n"
      "BP power 0 V=V(top)*V(line,top)/2\n"
      ".options method=gear reltol=1e-4\n"
      ".tran 0.1u 500u 0 0.1u uic\n"
      ".measure tran energy INTEG V(power) from=0 to=500u\n"
      ".measure tran peak MAX V(top) from=0 to=500u\n"
      ".end\n",
      crest_V, 1000 * SurgeWave::kScale, SurgeWave::kTail_s, 1 / SurgeWave::kTail_s + 1 / SurgeWave::kFront_s,
      1 / law.exponent());
  const auto theirs = support::run_ngspice(deck);
  CHECK_THAT(ours.loss_J[static_cast<int>(Owner::varistor)], WithinRel(theirs.at("energy"), 0.02));
  CHECK_THAT(ours.rail_max_V, WithinRel(theirs.at("peak"), 0.02));
}

}  // namespace
}  // namespace dropfront::circuit
