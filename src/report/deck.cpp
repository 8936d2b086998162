#include "dropfront/report/deck.hpp"

#include <fmt/core.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <iterator>
#include <numbers>
#include <string_view>

namespace dropfront::report {
namespace {

constexpr double kJunctionShare = 0.02;         // emission coefficient
constexpr double kJunctionSaturation_A = 1e-9;  // its reverse current: below any leakage that matters
constexpr double kThermal_V = 0.025864186;      // kT/q at 27 degC, the simulator's own temperature
constexpr double kJunctionReference_A = 1e-3;   // where the smooth curve meets the piecewise-linear one
// Without it a bridge whose diodes are all off hangs on the leak alone and some runs end for want of a step.
constexpr double kJunctionCapacitance_F = 2e-11;

constexpr std::array<std::string_view, static_cast<int>(circuit::Owner::count)> kOwnerNames{
    "line",    "series resistor", "dropper",       "discharge chain",
    "clamp",   "rectifier",       "reservoir",     "load",
    "leak",    "thyristor",       "gate resistor", "ceramic",
    "varistor"};

constexpr std::string_view kCaution =
    "* CAUTION. This circuit is not isolated from the mains: every node, the output and sensor leads\n"
    "* included, is at mains potential. Never touch it or connect earthed instruments to it while it runs;\n"
    "* use an isolating transformer; treat line and neutral as interchangeable.\n"
    "* This is a calculation, not an approval: local codes, the product's safety standard and licensed\n"
    "* practice decide.\n";

/// Text grows line by line; keeps the formatting in one place.
class Deck {
 public:
  template <typename... Args>
  void line(fmt::format_string<Args...> form, Args&&... args) {
    fmt::format_to(std::back_inserter(text_), form, std::forward<Args>(args)...);
    text_ += '\n';
  }
  void raw(std::string_view text) { text_ += text; }
  std::string take() { return std::move(text_); }

 private:
  std::string text_;
};

/// A title or note must not break out of its line.
std::string one_line(std::string text) {
  std::replace_if(
      text.begin(), text.end(), [](char c) { return static_cast<unsigned char>(c) < ' '; }, ' ');
  return text;
}

std::string_view name_of(circuit::Owner owner) { return kOwnerNames[static_cast<std::size_t>(owner)]; }
std::string node(circuit::Node n) { return n == 0 ? "0" : fmt::format("n{}", n); }
std::string across(circuit::Node a, circuit::Node b) {
  if (b == 0) return fmt::format("V({})", node(a));
  return a == 0 ? fmt::format("(-V({}))", node(b)) : fmt::format("V({},{})", node(a), node(b));
}

void write_source(Deck& deck, const circuit::SourceElement& source, double start_time_s) {
  deck.line(
      "* Mains: one source a tone, in series from the neutral up; phase in degrees at the start of the run");
  const auto& tones = source.waveform.tones();
  const auto& pulse = source.waveform.exponentials();
  std::string below = "0";
  for (std::size_t i = 0; i < tones.size(); ++i) {
    const bool last = i + 1 == tones.size() && pulse.empty();
    const std::string top = last ? node(source.a) : fmt::format("mains{}", i + 1);
    const double turns = tones[i].order * source.waveform.frequency_Hz() * start_time_s;
    const double phase_deg = tones[i].phase_rad * 180 / std::numbers::pi + 360 * (turns - std::floor(turns));
    deck.line("VM{} {} {} SIN(0 {} {} 0 0 {})", i + 1, top, below, tones[i].amplitude_V,
              tones[i].order * source.waveform.frequency_Hz(), phase_deg);
    below = top;
  }
  if (pulse.empty()) return;
  deck.line("* A pulse on top of it: exponentials that add up to nothing until it begins");
  std::string sum;
  for (const auto& part : pulse) {
    sum += fmt::format("{}{}*exp(-{}*uramp(time-({})))", sum.empty() ? "" : "+", part.amplitude_V,
                       part.rate_per_s, source.waveform.pulse_start_s() - start_time_s);
  }
  deck.line("BS {} {} V={}", node(source.a), below, sum);
}

/// One diode of a branch; a paired branch is two alike, each with half the threshold and slope.
struct Leg {
  std::string name;
  circuit::Node a, b;
  double threshold_V, slope_ohm;
};

std::vector<Leg> legs_of(const circuit::BranchElement& branch, std::size_t index) {
  const std::string name = fmt::format("{}", index + 1);
  if (!branch.paired()) return {{name, branch.a, branch.b, branch.threshold_V, branch.slope_ohm}};
  const double threshold_V = branch.threshold_V / 2, slope_ohm = branch.slope_ohm / 2;
  return {{name, branch.a, branch.b, threshold_V, slope_ohm},
          {name + "b", branch.a2, branch.b2, threshold_V, slope_ohm}};
}

void write_branches(Deck& deck, const std::vector<circuit::BranchElement>& branches, BranchForm form) {
  if (branches.empty()) return;
  deck.line("* One-way branches: open below the threshold, threshold + slope x current above");
  const double junction_V =
      kJunctionShare * kThermal_V * std::log(1 + kJunctionReference_A / kJunctionSaturation_A);
  for (std::size_t i = 0; i < branches.size(); ++i)
    for (const Leg& leg : legs_of(branches[i], i)) {
      deck.line("* {}: {} V, {} ohm", name_of(branches[i].owner), leg.threshold_V, leg.slope_ohm);
      if (form == BranchForm::piecewise) {
        deck.line("B{} {} {} I=uramp({}-({}))/{}", leg.name, node(leg.a), node(leg.b), across(leg.a, leg.b),
                  leg.threshold_V, leg.slope_ohm);
      } else {
        deck.line("VT{0} {1} d{0} DC {2}", leg.name, node(leg.a), leg.threshold_V - junction_V);
        deck.line("D{0} d{0} {1} DM{0}", leg.name, node(leg.b));
        deck.line(".model DM{} D(IS={} N={} RS={} CJO={})", leg.name, kJunctionSaturation_A, kJunctionShare,
                  leg.slope_ohm, kJunctionCapacitance_F);
      }
    }
}

void write_loads(Deck& deck, const std::vector<circuit::LoadElement>& loads) {
  int number = 0;
  for (const auto& load : loads) {
    ++number;
    const std::string a = node(load.a), b = node(load.b), v = across(load.a, load.b);
    deck.line("* load: constant current, falling in proportion to the voltage below the cut-off");
    if (load.slope_S != 0) deck.line("* its first chord alone is written here: {} S", load.slope_S);
    if (!(load.cutoff_V > 0))
      deck.line("IL{} {} {} DC {}", number, a, b, load.current_A);
    else
      deck.line("BL{} {} {} I={}*({}-uramp({}-{}))/{}", number, a, b, load.current_A, v, v, load.cutoff_V,
                load.cutoff_V);
  }
}

/// A latch on a one-nanofarad memory node (1 us): it fires and drops out by the currents it is rated by.
void write_thyristors(Deck& deck, const circuit::Network& network) {
  for (std::size_t i = 0; i < network.thyristors.size(); ++i) {
    const auto& t = network.thyristors[i];
    const auto& gate = network.resistors[static_cast<std::size_t>(t.gate_resistor)];
    const std::size_t n = i + 1;
    const std::string on_A = fmt::format("uramp({}-({}))/{}", across(t.a, t.b), t.on_voltage_V, t.slope_ohm);
    const std::string gate_A = fmt::format("{}/{}", across(gate.a, gate.b), gate.resistance_ohm);
    deck.line("* thyristor: on {} V, {} ohm; fires at {} A of gate current, holds above {} A", t.on_voltage_V,
              t.slope_ohm, t.trigger_A, t.holding_A);
    const auto step = [](const std::string& value, double at) {  // soft over a fiftieth of the threshold
      return fmt::format("(0.5+0.5*tanh(({}-{})/{}))", value, at, 0.02 * at);
    };
    const std::string q = fmt::format("V(latch{})", n);
    deck.line("BY{} {} {} I={}*{}", n, node(t.a), node(t.b), q, on_A);
    deck.line("CZ{} {} {} 20p", n, node(t.a), node(t.b));
    deck.line("CY{} latch{} 0 1n IC=0", n, n);
    // Its own current holds it, the gate's starts it: either fills the memory.
    deck.line("BZ{} 0 latch{} I=1m*(1-(1-{})*(1-{})-{})", n, n,
              step(fmt::format("{}*{}", q, on_A), t.holding_A), step(gate_A, t.trigger_A), q);
  }
}

void write_passives(Deck& deck, const circuit::Network& network, const std::vector<double>& initial_V) {
  for (std::size_t i = 0; i < network.resistors.size(); ++i) {
    const auto& r = network.resistors[i];
    if (!std::isfinite(r.resistance_ohm)) continue;
    deck.line("* {}", name_of(r.owner));
    deck.line("R{} {} {} {}", i + 1, node(r.a), node(r.b), r.resistance_ohm);
  }
  for (std::size_t i = 0; i < network.capacitors.size(); ++i) {
    const auto& c = network.capacitors[i];
    deck.line("* {}", name_of(c.owner));
    deck.line("C{} {} {} {} IC={}", i + 1, node(c.a), node(c.b), c.capacitance_F,
              i < initial_V.size() ? initial_V[i] : 0.0);
  }
}

/// Probes: the rail and the power as node voltages, so that every .measure looks at one plain vector.
void write_probes(Deck& deck, const circuit::Network& network, const DeckOptions& options) {
  deck.line("* Probes (no current drawn): rail voltage, power taken from the mains{}",
            options.measure_energies ? ", power in each element" : "");
  deck.line("EP rail 0 {} {} 1", node(network.rail), node(network.rail_return));
  deck.line("BP power 0 V=-{}*I(VM1)", across(network.source.a, 0));
  if (!options.measure_energies) return;
  for (std::size_t i = 0; i < network.resistors.size(); ++i) {
    const auto& r = network.resistors[i];
    if (!std::isfinite(r.resistance_ohm)) continue;
    deck.line("BPR{0} pr{0} 0 V={1}*{1}/{2}", i + 1, across(r.a, r.b), r.resistance_ohm);
  }
  for (std::size_t i = 0; i < network.branches.size(); ++i) {
    std::string power;
    for (const Leg& leg : legs_of(network.branches[i], i)) {
      const std::string v = across(leg.a, leg.b);
      if (!power.empty()) power += '+';
      power += options.branches == BranchForm::smooth
                   ? fmt::format("{}*I(VT{})", v, leg.name)
                   : fmt::format("{}*uramp({}-({}))/{}", v, v, leg.threshold_V, leg.slope_ohm);
    }
    deck.line("BPD{0} pd{0} 0 V={1}", i + 1, power);
  }
}

void write_run(Deck& deck, const circuit::Network& network, const DeckOptions& options) {
  const double period_s = network.source.waveform.period_s();
  const double stop_s = options.run_periods * period_s;
  const double window_s = std::min(options.measured_periods, options.run_periods) * period_s;
  const double from_s = stop_s - window_s;
  const bool compare = 2 * window_s <= stop_s;
  const double step_s = options.max_step_periods * period_s;
  // Vectors are kept from a little ahead of the first window only: long runs stay small in memory.
  const double keep_s = std::max(0.0, from_s - window_s - 10 * step_s);
  deck.line(".options method=gear reltol={} abstol=1e-8 vntol=1e-5", options.relative_tolerance);
  deck.line(".tran {} {} {} {} uic", step_s, stop_s, keep_s, step_s);
  const auto measure = [&](std::string_view name, std::string_view what, std::string_view vector) {
    deck.line(".measure tran {} {} {} from={} to={}", name, what, vector, from_s, stop_s);
  };
  std::string saved = "V(rail) V(power) I(VM1)";
  measure("rail_min", "MIN", "V(rail)");
  measure("rail_mean", "AVG", "V(rail)");
  measure("rail_max", "MAX", "V(rail)");
  measure("input_power", "AVG", "V(power)");
  measure("input_current", "RMS", "I(VM1)");
  if (compare)
    deck.line(".measure tran rail_min_before MIN V(rail) from={} to={}", from_s - window_s, from_s);
  if (options.measure_energies) {
    const auto energy = [&](char kind, std::size_t number) {
      measure(fmt::format("energy_{}{}", kind, number), "INTEG", fmt::format("V(p{}{})", kind, number));
      saved += fmt::format(" V(p{}{})", kind, number);
    };
    for (std::size_t i = 0; i < network.resistors.size(); ++i)
      if (std::isfinite(network.resistors[i].resistance_ohm)) energy('r', i + 1);
    for (std::size_t i = 0; i < network.branches.size(); ++i) energy('d', i + 1);
  }
  deck.line(".save {}", saved);
  deck.line(".end");
}

}  // namespace

std::string make_deck(const circuit::Network& network, const std::string& title, const DeckOptions& options) {
  Deck deck;
  deck.line("{}", one_line(title));
  deck.raw(kCaution);
  for (const std::string& note : options.notes) deck.line("* {}", one_line(note));
  deck.line("* Run with: ngspice -b FILE    Line {}, neutral 0, rail {} against {}.", node(network.source.a),
            node(network.rail), node(network.rail_return));
  write_source(deck, network.source, options.start_time_s);
  write_passives(deck, network, options.initial_V);
  write_branches(deck, network.branches, options.branches);
  write_loads(deck, network.loads);
  write_thyristors(deck, network);
  write_probes(deck, network, options);
  write_run(deck, network, options);
  return deck.take();
}

}  // namespace dropfront::report
