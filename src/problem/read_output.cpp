#include <fmt/format.h>

#include <algorithm>
#include <set>

#include "dropfront/problem/defaults.hpp"
#include "dropfront/problem/sections.hpp"
#include "dropfront/problem/support.hpp"
#include "dropfront/values/quantity.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::problem {
namespace {

using scoring::Load;
using values::Unit;

Load read_load(const Cursor& cursor, Problem& problem) {
  ObjectReader reader(cursor, keys::load);
  Load load;
  const Cursor name = reader.require("name");
  load.name = read_text(name);
  if (load.name == "none")
    throw name.error("found the name \"none\"; that word means no load, choose another");
  if (const auto at = reader.take("at")) load.at_rail = read_word(*at, {"rail", "output"}) == 0;
  load.current_A = read_quantity(reader.require("current"), Unit::ampere, kNotNegative);
  if (const auto least = reader.take("min_voltage")) {
    if (!load.at_rail) {
      throw least->error(
          "found on a load at the output; \"min_voltage\" is allowed on loads {\"at\": \"rail\"} only");
    }
    load.min_voltage_V = read_quantity(*least, Unit::volt, kPositive);
  } else if (load.at_rail) {
    note_default(problem, cursor, "min_voltage", "V_required", "what the output stage needs at its input");
  }
  if (const auto duration = reader.take("for"))
    load.duration_s = read_quantity(*duration, Unit::second, kPositive);
  if (const auto period = reader.take("every")) {
    if (!load.duration_s) throw period->error("found without \"for\"; a load that repeats needs both");
    load.period_s = read_quantity(*period, Unit::second, kPositive);
    if (!(*load.duration_s <= *load.period_s)) {
      throw period->error(
          fmt::format("found a burst of {} every {}; allowed: a burst not longer than its period",
                      values::format_quantity(*load.duration_s, Unit::second),
                      values::format_quantity(*load.period_s, Unit::second)));
    }
  } else if (load.duration_s) {
    note_default(problem, cursor, "every", "once", "a burst without a period has the mean 0");
  }
  reader.finish();
  return load;
}

/// Index of the sustained output load that `better` prefers; ties: the first listed.
int pick(const std::vector<Load>& loads, bool (*better)(double, double)) {
  int best = -1;
  for (std::size_t i = 0; i < loads.size(); ++i) {
    if (loads[i].at_rail || loads[i].duration_s) continue;
    if (best < 0 || better(loads[i].current_A, loads[best].current_A)) best = static_cast<int>(i);
  }
  return best;
}

std::optional<int> read_standby_load(const Cursor& cursor, const std::vector<Load>& loads) {
  const std::string name = read_text(cursor);
  if (name == "none") return std::nullopt;
  std::vector<std::string> names{"none"};
  for (std::size_t i = 0; i < loads.size(); ++i) {
    if (loads[i].at_rail || loads[i].duration_s) continue;
    if (loads[i].name == name) return static_cast<int>(i);
    names.push_back(loads[i].name);
  }
  throw cursor.error(fmt::format("found \"{}\"{}; allowed: a load at the output without \"for\": {}", name,
                                 values::did_you_mean(name, names), either(names)));
}

}  // namespace

void read_output(const Cursor& output, Problem& problem) {
  ObjectReader reader(output, keys::output);
  scoring::OutputNeed& need = problem.requirement.output;
  need.voltage_V = read_quantity(reader.require("voltage"), Unit::volt, kPositive);
  need.tolerance =
      quantity_or(problem, reader, "tolerance", Unit::share, {0, 0.5, true}, 0.05, "a usual supply band");

  const Cursor list = reader.require("loads");
  std::set<std::string> names;
  bool burst = false;
  for (const Cursor& entry : read_list(list, "loads {\"name\", \"current\", ...}")) {
    need.loads.push_back(read_load(entry, problem));
    burst = burst || need.loads.back().duration_s;
    if (!names.insert(need.loads.back().name).second) {
      throw entry.error(
          fmt::format("found two loads named \"{}\"; allowed: unique names", need.loads.back().name));
    }
  }
  const int heaviest = pick(need.loads, [](double a, double b) { return a > b; });
  if (heaviest < 0 || !(need.loads[heaviest].current_A > 0)) {
    throw list.error("found no load at the output without \"for\" and above 0 A; at least one is needed");
  }
  if (const auto standby = reader.take("standby_load")) {
    need.standby_load = read_standby_load(*standby, need.loads);
  } else {
    need.standby_load = pick(need.loads, [](double a, double b) { return a < b; });
    note_default(problem, output, "standby_load", need.loads[*need.standby_load].name,
                 "the lightest sustained load at the output");
  }
  need.start_load_A =
      quantity_or(problem, reader, "start_load", Unit::ampere, kNotNegative, need.loads[heaviest].current_A,
                  "the heaviest sustained load at the output");
  reader.finish();
  if (burst && !checks("supply.burst")) {
    problem.cautions.push_back(
        "output.loads: a burst counts in the mean only; its dip is not checked by this version");
  }
}

}  // namespace dropfront::problem
