#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "dropfront/problem/defaults.hpp"
#include "dropfront/problem/names.hpp"
#include "dropfront/problem/sections.hpp"

namespace dropfront::problem {
namespace {

using scoring::Objective;
using values::Unit;

std::vector<std::string> objective_names() {
  std::vector<std::string> names;
  for (const Objective objective : all_objectives()) names.emplace_back(objective_name(objective));
  return names;
}

void read_objectives(ObjectReader& reader, Problem& problem) {
  auto& objectives = problem.requirement.objectives;
  const auto given = reader.take("objectives");
  if (!given) {
    objectives = all_objectives();
    note_default(problem, reader.object(), "objectives",
                 fmt::format("{}", fmt::join(objective_names(), ", ")), "all that are known");
    return;
  }
  objectives.clear();
  for (const Cursor& entry : read_list(*given, "objectives: " + either(objective_names()))) {
    const Objective objective = all_objectives()[read_word(entry, objective_names())];
    if (std::find(objectives.begin(), objectives.end(), objective) != objectives.end()) {
      throw entry.error(
          fmt::format("found \"{}\" twice; allowed: each objective once", objective_name(objective)));
    }
    objectives.push_back(objective);
  }
}

/// Step of one objective in its own unit: currency, W, mm2, A.
double read_step(ObjectReader& reader, Objective objective, Problem& problem) {
  const std::string reason = "keeps fronts readable; 0 means raw values";
  switch (objective) {
    case Objective::cost:
      return quantity_or(problem, reader, "cost", Unit::count, kNotNegative, 0.001, reason);
    case Objective::standby_loss:
      return quantity_or(problem, reader, "standby_loss", Unit::watt, kNotNegative, 1e-3, reason);
    case Objective::board_area: {
      const double area_m2 =
          quantity_or(problem, reader, "board_area", Unit::square_metre, kNotNegative, 1e-6, reason);
      return std::round(area_m2 * 1e12) / 1e6;  // areas are kept to 1 um2
    }
    case Objective::current_margin:
      return quantity_or(problem, reader, "current_margin", Unit::ampere, kNotNegative, 1e-4, reason);
  }
  return 0;
}

void read_resolution(const Cursor& cursor, Problem& problem) {
  ObjectReader reader(cursor, keys::resolution);
  // A step for an objective that is not asked is checked and left: --set may narrow the objectives.
  const auto& asked = problem.requirement.objectives;
  for (const Objective objective : all_objectives()) {
    const bool wanted = std::find(asked.begin(), asked.end(), objective) != asked.end();
    if (!wanted && reader.has(objective_name(objective))) read_step(reader, objective, problem);
  }
  for (const Objective objective : asked) problem.resolution.push_back(read_step(reader, objective, problem));
  reader.finish();
}

std::int64_t whole_or(Problem& problem, ObjectReader& reader, std::string_view key, std::int64_t least,
                      std::int64_t most, std::int64_t fallback, const std::string& reason) {
  if (const auto given = reader.take(key)) return read_whole(*given, least, most);
  note_default(problem, reader.object(), key, fmt::format("{}", fallback), reason);
  return fallback;
}

}  // namespace

void read_settings(ObjectReader& reader, Problem& problem) {
  scoring::Requirement& requirement = problem.requirement;
  requirement.volume =
      whole_or(problem, reader, "volume", 1, 1000000000, 1000, "pieces a year, for price breaks");
  if (const auto currency = reader.take("currency")) {
    requirement.currency = read_text(*currency);
  } else {
    note_default(problem, reader.object(), "currency", "EUR", "only a label: prices are not converted");
  }
  const double placement =
      quantity_or(problem, reader, "placement_cost", Unit::count, {0, 1000, false}, 0, "parts only");
  requirement.placement_cost_micro = std::llround(placement * 1e6);
  if (const auto missing = reader.take("missing_ratings")) {
    requirement.accept_missing_ratings = read_word(*missing, {"refuse", "accept"}) == 1;
  } else {
    note_default(problem, reader.object(), "missing_ratings", "refuse",
                 "a rating that is not given is not a pass");
  }
  read_objectives(reader, problem);
  read_resolution(reader.take_object("resolution"), problem);
  problem.top = static_cast<int>(whole_or(problem, reader, "top", 1, 1000, 5, "designs a ranked set"));
  const std::vector<std::string> efforts{"quick", "normal", "deep"};
  if (const auto effort = reader.take("effort")) {
    problem.effort = efforts[read_word(*effort, efforts)];
  } else {
    note_default(problem, reader.object(), "effort", "normal", "enough for most problems");
  }
  problem.seed = static_cast<std::uint64_t>(
      whole_or(problem, reader, "seed", 0, 9007199254740991, 1, "the same seed gives the same result"));
}

}  // namespace dropfront::problem
