#include "dropfront/report/problem_text.hpp"

#include <fmt/core.h>

#include <algorithm>

#include "dropfront/problem/names.hpp"
#include "dropfront/report/cautions.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/report/summary_text.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

std::string spread_text(const values::Spread& spread, std::string_view unit) {
  if (spread.low == spread.nominal && spread.nominal == spread.high) return with_unit(spread.nominal, unit);
  return with_unit(spread.low, unit) + " to " + with_unit(spread.high, unit) + " (nominal " +
         with_unit(spread.nominal, unit) + ")";
}

std::string load_text(const scoring::Load& load, bool standby) {
  std::string text = load.name + ": " + with_unit(load.current_A, "A");
  if (load.at_rail) text += " from the rail";
  if (load.min_voltage_V) text += ", at least " + with_unit(*load.min_voltage_V, "V");
  if (load.duration_s) {
    text += ", for " + with_unit(*load.duration_s, "s");
    text += load.period_s ? " every " + with_unit(*load.period_s, "s") : ", once";
  }
  if (standby) text += " (standby)";
  return text;
}

void limit_rows(TextTable& table, const scoring::Limits& limits) {
  const auto limit = [&table](std::string text) { table.row({std::move(text)}); };
  if (limits.standby_power_W)
    limit(fmt::format("standby power <= {}", with_unit(*limits.standby_power_W, "W")));
  limit(fmt::format("current margin >= {} of the heaviest load", percent(limits.current_margin)));
  if (limits.start_time_s) limit(fmt::format("start time <= {}", with_unit(*limits.start_time_s, "s")));
  if (const auto& rule = limits.discharge)
    limit(fmt::format("discharged to {} after {}{}",
                      rule->share_of_start ? percent(*rule->share_of_start) + " of the crest"
                                           : with_unit(rule->voltage_V, "V"),
                      with_unit(rule->after_s, "s"), rule->name.empty() ? "" : " (" + rule->name + ")"));
  if (const auto& surge = limits.surge)
    limit(fmt::format("surge {} behind {}", with_unit(surge->voltage_V, "V"),
                      with_unit(surge->source_ohm, "ohm")));
  if (limits.fast_burst_V)
    limit(fmt::format("fast bursts of {}: energy estimated, not checked",
                      with_unit(*limits.fast_burst_V, "V")));
  for (const auto& dip : limits.dips)
    limit(fmt::format("dip to {} for {}", percent(dip.residual), with_unit(dip.cycles, "cycles")));
  if (limits.series_rated) limit("series-rated droppers only");
}

std::string asked_text(const scoring::Requirement& need) {
  TextTable table({"asked", ""});
  for (const auto& supply : need.supplies)
    table.row(
        {fmt::format("mains {}", supply.name), fmt::format("{}, {}", spread_text(supply.voltage_Vrms, "V"),
                                                           spread_text(supply.frequency_Hz, "Hz"))});
  table.row({"output", with_unit(need.output.voltage_V, "V") + " within " + percent(need.output.tolerance)});
  for (std::size_t i = 0; i < need.output.loads.size(); ++i)
    table.row({i == 0 ? "loads" : "", load_text(need.output.loads[i], need.output.standby_load == int(i))});
  table.row({"surroundings", spread_text(need.surroundings.ambient_degC, "degC") + ", enclosure " +
                                 with_unit(need.surroundings.enclosure_K_per_W, "K/W") + ", life " +
                                 with_unit(need.surroundings.life_years, "years")});
  table.row({"connection", std::string(problem::connection_name(need.connection.kind))});
  TextTable limits({"limits"});
  limit_rows(limits, need.limits);
  std::string objectives;
  for (const auto objective : need.objectives)
    objectives += fmt::format("{}{}", objectives.empty() ? "" : ", ", problem::objective_name(objective));
  return table.text() + '\n' + limits.text() + "\n  objectives: " + objectives + "\n";
}

/// What the problem leaves out, then what rows of the lists may leave out; what `before` says too is left
/// out.
std::string defaults_text(const problem::Problem& problem, const problem::Problem* before) {
  const auto said = [before](const problem::Default& filled) {
    return before && std::any_of(before->defaults.begin(), before->defaults.end(), [&](const auto& other) {
             return other.key == filled.key && other.value == filled.value;
           });
  };
  TextTable keys({"filled in", "value", "why"});
  TextTable columns({"left out in a row", "value", "why"});
  for (const auto& filled : problem.defaults) {
    if (said(filled)) continue;
    const bool of_lists = filled.key.find(".csv ") != std::string::npos;
    (of_lists ? columns : keys).row({filled.key, filled.value, filled.reason});
  }
  std::string text;
  for (const TextTable* table : {&keys, &columns})
    if (!table->empty()) text += '\n' + table->text();
  return text;
}

}  // namespace

std::string problem_text(const problem::Problem& problem, const search::Space& space,
                         const problem::Problem* before) {
  std::string text = wrapped(problem.title) + asked_text(problem.requirement);
  text += defaults_text(problem, before);
  text += '\n' + slots_text(problem, space);
  if (before && before->cautions == problem.cautions) return text;
  return text + '\n' + cautions_text(with_standing_cautions(problem.cautions));
}

}  // namespace dropfront::report
