#include <fmt/format.h>

#include "dropfront/problem/defaults.hpp"
#include "dropfront/problem/names.hpp"
#include "dropfront/problem/sections.hpp"
#include "dropfront/problem/support.hpp"
#include "dropfront/scoring/discharge_rules.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::problem {
namespace {

using scoring::ConnectionKind;
using values::Unit;

std::optional<scoring::DischargeRule> default_rule(ConnectionKind kind) {
  switch (kind) {
    case ConnectionKind::plug:
      return scoring::discharge_rule("60335-1");
    case ConnectionKind::switched:
      return scoring::DischargeRule{
          60, 5, 0, "IEC 60204-1 clause 6.2.4: at most 60 V within 5 s (as restated, copy not kept)"};
    case ConnectionKind::fixed:
      return std::nullopt;
  }
  return std::nullopt;
}

std::optional<scoring::DischargeRule> read_discharge(ObjectReader& limits, Problem& problem) {
  const ConnectionKind kind = problem.requirement.connection.kind;
  const std::string connected = "a " + std::string(connection_name(kind)) + " connection";
  const auto given = limits.take("discharge");
  if (!given) {
    const auto rule = default_rule(kind);
    if (rule) {
      note_default(problem, limits.object(), "discharge",
                   fmt::format("{} V after {} s", rule->voltage_V, rule->after_s),
                   connected + ": " + rule->basis);
    } else {
      note_default(problem, limits.object(), "discharge", "none", connected);
      problem.cautions.push_back(
          "limits.discharge: none for a fixed connection; the voltage left after switching off is not "
          "checked");
    }
    return rule;
  }
  if (given->node().kind == Node::Kind::text) {
    std::vector<std::string> words = scoring::discharge_rule_names();
    words.emplace_back("none");
    const std::string& word = given->node().text;
    if (auto rule = scoring::discharge_rule(word)) return rule;
    if (word != "none") {
      throw given->error(fmt::format(R"(found {}{}; allowed: {} or an object {{"voltage", "after"}})",
                                     describe(given->node()), values::did_you_mean(word, words),
                                     either(words)));
    }
    problem.cautions.push_back(
        "limits.discharge: \"none\"; the voltage left after unplugging is not checked");
    return std::nullopt;
  }
  ObjectReader reader(*given, keys::discharge_rule);
  scoring::DischargeRule rule;
  rule.voltage_V = read_quantity(reader.require("voltage"), Unit::volt, kPositive);
  rule.after_s = read_quantity(reader.require("after"), Unit::second, kPositive);
  const bool plug = kind == ConnectionKind::plug;
  rule.not_below_F =
      quantity_or(problem, reader, "not_below", Unit::farad, kNotNegative, plug ? 0.1e-6 : 0,
                  plug ? "IEC 60335-1 clause 22.5 (as restated, copy not kept)" : "no exemption stated");
  reader.finish();
  rule.basis = "the problem's own rule";
  return rule;
}

scoring::Surge read_surge(const Cursor& cursor, Problem& problem) {
  ObjectReader reader(cursor, keys::surge);
  scoring::Surge surge;
  surge.voltage_V = read_quantity(reader.require("voltage"), Unit::volt, {0, 1e5, true});
  surge.source_ohm = quantity_or(problem, reader, "source", Unit::ohm, {1e-3, 1e6, false}, 2,
                                 "IEC 61000-4-5 combination wave, line to line");
  reader.finish();
  return surge;
}

scoring::Dip read_dip(const Cursor& cursor) {
  ObjectReader reader(cursor, keys::dip);
  scoring::Dip dip;
  dip.residual = read_quantity(reader.require("residual"), Unit::share, kShare);
  dip.cycles = read_quantity(reader.require("cycles"), Unit::count, {0, 10000, true});
  reader.finish();
  return dip;
}

void caution_unless(bool checked, const std::string& key, Problem& problem) {
  if (!checked) problem.cautions.push_back(key + " is not checked by this version");
}

}  // namespace

void read_limits(const Cursor& cursor, Problem& problem) {
  ObjectReader reader(cursor, keys::limits);
  scoring::Limits& limits = problem.requirement.limits;
  limits.standby_power_W =
      quantity_or_none(problem, reader, "standby_power", Unit::watt, {0, 100, true}, "absent: no check");
  limits.current_margin = quantity_or(problem, reader, "current_margin", Unit::share, {0, 10, false}, 0,
                                      "the worst case already holds ageing and tolerances");
  limits.start_time_s =
      quantity_or_none(problem, reader, "start_time", Unit::second, {0, 600, true}, "absent: no check");
  if (limits.start_time_s) caution_unless(checks("supply.start_time"), "limits.start_time", problem);
  limits.discharge = read_discharge(reader, problem);
  if (const auto surge = reader.take("surge")) {
    limits.surge = read_surge(*surge, problem);
    caution_unless(checks("resistor.surge"), "limits.surge", problem);
  } else {
    note_default(problem, cursor, "surge", "none", "absent: no check");
  }
  limits.fast_burst_V =
      quantity_or_none(problem, reader, "fast_burst", Unit::volt, {0, 1e5, true}, "absent: no estimate");
  if (const auto dips = reader.take("dips")) {
    for (const Cursor& dip : read_list(*dips, "dips {\"residual\", \"cycles\"}"))
      limits.dips.push_back(read_dip(dip));
    caution_unless(checks("supply.dip"), "limits.dips", problem);
  } else {
    note_default(problem, cursor, "dips", "none", "absent: no check");
  }
  if (const auto series_rated = reader.take("series_rated")) {
    limits.series_rated = read_truth(*series_rated);
  } else {
    note_default(problem, cursor, "series_rated", "false",
                 "a dropper not rated for series use is a caution and loses more over its life");
  }
  reader.finish();
}

void read_derating(const Cursor& cursor, Problem& problem) {
  ObjectReader reader(cursor, keys::derating);
  scoring::Derating& d = problem.requirement.derating;
  const Allowed share{0, 2, true};
  const std::string practice = "common practice";
  d.resistor_power = quantity_or(problem, reader, "resistor.power", Unit::share, share, 0.60, practice);
  d.reservoir_voltage = quantity_or(problem, reader, "reservoir.voltage", Unit::share, share, 0.80, practice);
  d.dropper_voltage =
      quantity_or(problem, reader, "dropper.voltage", Unit::share, share, 1.00, "the class holds it");
  d.clamp_power =
      quantity_or(problem, reader, "clamp.power", Unit::share, share, 1.00, "the junction limit holds it");
  d.junction_K = quantity_or(problem, reader, "junction", Unit::kelvin, {0, 150, false}, 25,
                             practice + ", below the maximum");
  reader.finish();
}

}  // namespace dropfront::problem
