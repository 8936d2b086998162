#include "dropfront/problem/limit_knobs.hpp"

#include <algorithm>

#include "dropfront/scoring/load_profile.hpp"
#include "dropfront/values/year.hpp"

namespace dropfront::problem {
namespace {

using scoring::Check;
using scoring::Design;
using scoring::Requirement;

constexpr double kWide = 1e6;

double the_value(const Check& check, const Design&, const Requirement&) { return *check.value; }

/// A check whose limit goes with the derating `share`.
template <double scoring::Derating::*share>
double in_proportion(const Check& check, const Design&, const Requirement& wide) {
  return wide.derating.*share * *check.value / *check.limit;
}

template <double scoring::Derating::*share>
LimitKnob derating(std::string_view key, std::vector<std::string_view> checks) {
  return {key,
          "",
          true,
          std::move(checks),
          [](const Requirement& r) { return std::optional(r.derating.*share); },
          [](Requirement& r) { r.derating.*share = kWide; },
          in_proportion<share>};
}

double figure_of(const Check& check, std::string_view name) {
  for (const auto& term : check.figures)
    if (term.name == name) return term.value;
  return 0;
}

double start_load_A(const Check& check, const Design& design, const Requirement&) {
  const double spare_A = *check.value - figure_of(check, "overhead_current_A");
  const auto& stage = *design.output_stage;
  if (stage.kind != parts::StageKind::step_down) return spare_A;
  return spare_A * figure_of(check, "starting_rail_V") * stage.efficiency.value_or(0) /
         stage.output_voltage_V;
}

/// The derated reservoir voltage limits two rails; the limit of rail.max may also be the stage's.
double reservoir_share(const Check& check, const Design& design, const Requirement&) {
  return *check.value / design.reservoir->rated_voltage_V;
}

LimitKnob discharge() {
  return {"limits.discharge.voltage",
          "V",
          true,
          {"discharge.voltage"},
          [](const Requirement& r) -> std::optional<double> {
            if (!r.limits.discharge) return std::nullopt;
            return r.limits.discharge->voltage_V;
          },
          [](Requirement& r) {
            r.limits.discharge->voltage_V = kWide;
            r.limits.discharge->share_of_start.reset();
            r.limits.discharge->more_when_small = false;
          },
          the_value};
}

std::vector<LimitKnob> make_knobs() {
  std::vector<LimitKnob> knobs;
  knobs.push_back({"output.start_load",
                   "A",
                   false,
                   {"supply.start"},
                   [](const Requirement& r) { return std::optional(r.output.start_load_A); },
                   [](Requirement& r) { r.output.start_load_A = -kWide; },
                   start_load_A});
  knobs.push_back({"surroundings.life",
                   "years",
                   false,
                   {"reservoir.life"},
                   [](const Requirement& r) { return std::optional(r.surroundings.life_years); },
                   [](Requirement& r) { r.surroundings.life_years = 1e-9; },
                   [](const Check& check, const Design&, const Requirement&) {
                     return *check.value / values::kHoursPerYear;
                   }});
  knobs.push_back({"surroundings.max_height",
                   "mm",
                   true,
                   {"board.height"},
                   [](const Requirement& r) { return r.surroundings.max_height_mm; },
                   [](Requirement& r) { r.surroundings.max_height_mm = kWide; },
                   the_value});
  knobs.push_back({"limits.standby_power",
                   "W",
                   true,
                   {"standby.power"},
                   [](const Requirement& r) { return r.limits.standby_power_W; },
                   [](Requirement& r) { r.limits.standby_power_W = kWide; },
                   the_value});
  knobs.push_back({"limits.current_margin",
                   "",
                   false,
                   {"supply.margin"},
                   [](const Requirement& r) { return std::optional(r.limits.current_margin); },
                   [](Requirement& r) { r.limits.current_margin = -kWide; },
                   [](const Check& check, const Design&, const Requirement& r) {
                     return *check.value / scoring::load_profile(r.output).heaviest_output_A();
                   }});
  knobs.push_back({"limits.start_time",
                   "s",
                   true,
                   {"supply.start_time"},
                   [](const Requirement& r) { return r.limits.start_time_s; },
                   [](Requirement& r) { r.limits.start_time_s = kWide; },
                   the_value});
  knobs.push_back(discharge());
  knobs.push_back({"limits.surge",
                   "",
                   true,
                   {},
                   [](const Requirement& r) -> std::optional<double> {
                     return r.limits.surge ? std::optional(r.limits.surge->voltage_V) : std::nullopt;
                   },
                   [](Requirement& r) { r.limits.surge.reset(); },
                   nullptr});
  knobs.push_back({"limits.dips",
                   "",
                   true,
                   {},
                   [](const Requirement& r) -> std::optional<double> {
                     return r.limits.dips.empty() ? std::nullopt : std::optional(1.0);
                   },
                   [](Requirement& r) { r.limits.dips.clear(); },
                   nullptr});
  knobs.push_back({"limits.series_rated",
                   "",
                   true,
                   {},
                   [](const Requirement& r) -> std::optional<double> {
                     return r.limits.series_rated ? std::optional(1.0) : std::nullopt;
                   },
                   [](Requirement& r) { r.limits.series_rated = false; },
                   nullptr});
  knobs.push_back(derating<&scoring::Derating::resistor_power>("derating.resistor.power",
                                                               {"resistor.power", "discharge.power"}));
  knobs.push_back(derating<&scoring::Derating::reservoir_voltage>("derating.reservoir.voltage",
                                                                  {"rail.max", "reservoir.voltage"}));
  knobs.back().needed = reservoir_share;
  knobs.push_back(
      derating<&scoring::Derating::dropper_voltage>("derating.dropper.voltage", {"dropper.voltage"}));
  knobs.push_back(derating<&scoring::Derating::clamp_power>("derating.clamp.power", {"clamp.power"}));
  knobs.push_back({"derating.junction",
                   "K",
                   false,
                   {"clamp.junction", "output_stage.junction"},
                   [](const Requirement& r) { return std::optional(r.derating.junction_K); },
                   [](Requirement& r) { r.derating.junction_K = -kWide; },
                   [](const Check& check, const Design&, const Requirement& r) {
                     return r.derating.junction_K + *check.limit - *check.value;
                   }});
  return knobs;
}

}  // namespace

const std::vector<LimitKnob>& limit_knobs() {
  static const std::vector<LimitKnob> knobs = make_knobs();
  return knobs;
}

std::optional<double> needed_value(const LimitKnob& knob, const std::vector<scoring::Check>& checks,
                                   const scoring::Design& design, const scoring::Requirement& wide) {
  std::optional<double> needed;
  for (const auto& check : checks) {
    if (std::find(knob.checks.begin(), knob.checks.end(), check.id) == knob.checks.end()) continue;
    if (!check.value || !check.limit || knob.needed == nullptr) continue;
    const double value = knob.needed(check, design, wide);
    if (!needed || (knob.at_most ? value > *needed : value < *needed)) needed = value;
  }
  return needed;
}

bool keeps(const LimitKnob& knob, double value, double asked) {
  return knob.at_most ? value <= asked : value >= asked;
}

}  // namespace dropfront::problem
