// Dips, load bursts and starts against ngspice, from the same states and at the same mains phases.
#include <fmt/format.h>

#include <algorithm>
#include <string>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/disturbance.hpp"
#include "dropfront/circuit/start_up.hpp"
#include "dropfront/report/deck.hpp"
#include "support/catch.hpp"
#include "support/ngspice.hpp"

namespace dropfront::circuit {
namespace {

using Catch::Matchers::WithinRel;

constexpr double kPeriod_s = 0.02;
constexpr double kRecovery = 3;  // periods

/// Two arrangements, two mains phases each: at several points of what the engine can be wrong about.
struct Point {
  const char* arrangement;
  double phase_deg;
};
constexpr Point kPoints[] = {
    {"half-wave-clamp-ahead", 290}, {"half-wave-clamp-ahead", 45}, {"bridge-clamp-across", 115}};

ElementValues loaded_values() {
  ElementValues v = ordinary_values();
  v.rail_current_A = 10e-3;
  return v;
}

/// The orbit of `network` at a mains phase.
RunPoint on_orbit(const Network& network, double phase_deg) {
  const SteadyState steady = solve_steady_state(network);
  REQUIRE(steady.usable());
  RailRun run(network);
  RunPoint at{network.period_start_s, steady.start, 0};
  double until_s = phase_deg / 360 * kPeriod_s;
  while (until_s < at.time_s) until_s += kPeriod_s;
  REQUIRE(run.advance(until_s - at.time_s, at));
  return at;
}

std::string replaced(std::string text, const std::string& from, const std::string& to) {
  const auto place = text.find(from);
  REQUIRE(place != std::string::npos);
  return text.replace(place, from.size(), to);
}

/// A deck that runs from `at` through the event and three periods of recovery, measured but for its first
/// fiftieth of a period, in which the simulator finds its feet.
std::string event_deck(const Network& network, const RunPoint& at, double duration_s) {
  report::DeckOptions options;
  options.initial_V.assign(at.x.begin(), at.x.end());
  options.start_time_s = at.time_s;
  options.run_periods = duration_s / kPeriod_s + kRecovery;
  options.measured_periods = options.run_periods - 0.02;
  options.max_step_periods = 5e-4;
  return report::make_deck(network, "event", options);
}

/// The mains behind a gate: the generator's voltage is multiplied by it, or the line opened while it is 0.
std::string gated(const std::string& deck, Node line, double duration_s, bool open) {
  const std::string head = fmt::format("VM1 n{} 0 SIN", line);
  std::string gate = fmt::format("VG gate 0 PWL(0 0 {0} 0 {1} 1)\n", duration_s, duration_s + 1e-6);
  if (open) {
    gate += fmt::format("BG sine line I=V(sine,line)*(1e-9+V(gate)*1e3)\nVM1 n{} line DC 0\n", line);
  } else {
    gate += fmt::format("BG line 0 V=V(gate)*V(sine)\nVM1 n{} line DC 0\n", line);
  }
  return replaced(deck, head, gate + "VS sine 0 SIN");
}

/// Agreement asked: least rail within 2 %.
void check_dip(const Point& point, bool open, double duration_s) {
  INFO(point.arrangement << " at " << point.phase_deg << (open ? " open" : " shorted"));
  const Arrangement& wiring = *find_arrangement(point.arrangement);
  const ElementValues v = loaded_values();
  const Network network = wiring.build(v);
  ElementValues dipped = v;
  dipped.mains = v.mains.scaled(0);
  if (open) dipped.source_ohm = 1e9;
  Disturbance disturbed(network, wiring.build(dipped), duration_s, solve_steady_state(network), 5);
  const auto ours = disturbed.at(point.phase_deg);
  REQUIRE(ours.usable);
  const std::string deck = event_deck(network, on_orbit(network, point.phase_deg), duration_s);
  const auto theirs = support::run_ngspice(gated(deck, network.source.a, duration_s, open));
  INFO("ours " << ours.rail_V << ", ngspice " << theirs.at("rail_min"));
  CHECK_THAT(ours.rail_V, WithinRel(theirs.at("rail_min"), 0.02));
}

TEST_CASE("the least rail of a mains interruption agrees with ngspice, generator shorted and line open",
          "[events]") {
  for (const Point& point : kPoints) {
    for (const bool open : {false, true}) check_dip(point, open, 0.5 * kPeriod_s);
  }
  check_dip(kPoints[0], true, 3 * kPeriod_s);
}

TEST_CASE("the least rail of a load burst agrees with ngspice", "[events]") {
  constexpr double kBurst_A = 40e-3, kBurst_s = 15e-3;
  for (const Point& point : kPoints) {
    INFO(point.arrangement << " at " << point.phase_deg);
    const Arrangement& wiring = *find_arrangement(point.arrangement);
    const ElementValues v = loaded_values();
    const Network network = wiring.build(v);
    ElementValues more = v;
    more.rail_current_A += kBurst_A;
    Disturbance disturbed(network, wiring.build(more), kBurst_s, solve_steady_state(network), 5);
    const auto ours = disturbed.at(point.phase_deg);
    REQUIRE(ours.usable);
    const std::string pulse = fmt::format(
        "IB n{} {} PULSE(0 {} 0 1n 1n {})\n.options method", network.rail,
        network.rail_return == 0 ? "0" : fmt::format("n{}", network.rail_return), kBurst_A, kBurst_s);
    const std::string deck = event_deck(network, on_orbit(network, point.phase_deg), kBurst_s);
    const auto theirs = support::run_ngspice(replaced(deck, ".options method", pulse));
    INFO("ours " << ours.rail_V << ", ngspice " << theirs.at("rail_min"));
    CHECK_THAT(ours.rail_V, WithinRel(theirs.at("rail_min"), 0.02));
  }
}

TEST_CASE("the time from switching on to the required rail agrees with ngspice", "[events]") {
  constexpr double kRequired_V = 9;
  for (const Point& point : kPoints) {
    INFO(point.arrangement << " at " << point.phase_deg);
    const Arrangement& wiring = *find_arrangement(point.arrangement);
    const Network network = wiring.build(loaded_values());
    StartUp starter(network, std::nullopt, 0, 0, kRequired_V);
    const auto ours = starter.at(point.phase_deg, 2);
    REQUIRE(ours.outcome == StartUp::Outcome::reached);
    report::DeckOptions options;
    options.start_time_s = point.phase_deg / 360 * kPeriod_s;
    options.run_periods = options.measured_periods = ours.time_s / kPeriod_s + 2;
    const std::string last =
        fmt::format(".measure tran reached WHEN V(rail)={} RISE=LAST\n.save", kRequired_V);
    const auto theirs =
        support::run_ngspice(replaced(report::make_deck(network, "start", options), ".save", last));
    INFO("ours " << ours.time_s << ", ngspice " << theirs.at("reached"));
    // Times within 2 %: a valley of the ripple that one sees above the level and the other below would be a
    // whole period and fail here.
    CHECK_THAT(ours.time_s, WithinRel(theirs.at("reached"), 0.02));
  }
}

}  // namespace
}  // namespace dropfront::circuit
