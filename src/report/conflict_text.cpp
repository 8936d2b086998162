#include "dropfront/report/conflict_text.hpp"

#include <fmt/core.h>

#include <algorithm>
#include <set>

#include "dropfront/report/design_slots.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/report/ranked_table.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

/// Value and limit of a broken check in its own unit.
std::string found_text(const std::optional<scoring::Check>& check) {
  if (!check || !check->value) return "-";
  return check->yes_or_no() ? "no" : with_unit(*check->value, check->unit);
}

std::string limit_text(const std::optional<scoring::Check>& check) {
  if (!check || !check->limit) return "-";
  if (check->yes_or_no()) return "yes";
  return (check->at_most ? "<= " : ">= ") + with_unit(*check->limit, check->unit);
}

std::string closest_text(const Result::Conflict& conflict) {
  const std::string missed = percent(conflict.least_shortfall);
  const auto& check = conflict.closest;
  if (!check || !check->value || !check->limit) return "missed its limit by " + missed;
  if (check->yes_or_no()) return "answers no where yes is asked";
  return fmt::format("reaches {} where {} is asked, missed by {}", found_text(check), limit_text(check),
                     missed);
}

/// A limit's value as a person writes it; shares as percent.
std::string limit_value(const problem::LimitKnob& knob, double value) {
  if (!knob.needed) return "set";
  return knob.unit.empty() ? rounded(100 * value, 1) + " %" : with_unit(value, knob.unit);
}

std::string explained_text(const Result::Explained& explained) {
  const auto& set = explained.set;
  if (set.limits.empty())
    return wrapped(set.proven
                       ? "Even without any of the problem's limits no design complies: parts and their "
                         "ratings stand in the way."
                       : "Even without any of the problem's limits no design was found: parts and their "
                         "ratings stand in the way.");
  std::string text =
      wrapped(set.limits.size() == 1
                  ? fmt::format("One limit alone {} be kept:", set.proven ? "cannot" : "could not")
                  : fmt::format("These limits {} be kept together{}", set.proven ? "cannot" : "could not",
                                ", while all but any one of them can where a relaxation stands:"));
  TextTable table({"limit", ">asked", ">alone enough at", ""});
  for (std::size_t i = 0; i < set.limits.size(); ++i) {
    const auto& limit = set.limits[i];
    const std::string enough = limit.needed      ? limit_value(*limit.knob, *limit.needed)
                               : limit.droppable ? "without it"
                                                 : "-";
    table.row({std::string(limit.knob->key), limit_value(*limit.knob, limit.asked), enough,
               limit.proven ? "proven" : "as far as searched"});
    if (i < explained.designs.size() && explained.designs[i])
      table.note(part_names(*explained.designs[i]), 6);
  }
  return text + table.text();
}

}  // namespace

std::string near_misses_text(const Result& result, std::size_t most) {
  std::vector<const Result::NearMiss*> misses;
  for (const auto& miss : result.near_misses) misses.push_back(&miss);
  if (misses.size() > most) {
    // The nearest of each limit, nearest first.
    std::stable_sort(misses.begin(), misses.end(),
                     [](const auto* a, const auto* b) { return a->shortfall < b->shortfall; });
    std::set<std::string> named;
    misses.erase(std::remove_if(misses.begin(), misses.end(),
                                [&](const auto* miss) { return !named.insert(miss->check).second; }),
                 misses.end());
    misses.resize(std::min(most, misses.size()));
  }
  if (misses.empty()) return "";
  TextTable near({"one limit broken", ">value", ">limit", ">dropper", ">resistor", ">clamp", ">reservoir"});
  for (const auto* miss : misses) {
    const auto& design = miss->design;
    near.row(
        {miss->check, found_text(miss->broken), limit_text(miss->broken),
         design.dropper ? times(design.dropper_count) + with_unit(design.dropper->capacitance_F, "F") : "-",
         times(design.series_resistor_count) + short_value(*design.series_resistor),
         short_value(*design.clamp), short_value(*design.reservoir)});
    near.note(part_names(design), 6);
  }
  return near.text();
}

std::string nothing_found(const Result& result) {
  std::string text = proven(result) && result.proof->enumerated
                         ? "No design of this problem complies: every one was looked at.\n"
                     : proven(result) ? "No design of this problem complies.\n"
                                      : "No compliant design was found.\n";
  if (result.explained)
    text += explained_text(*result.explained);
  else if (result.effort == "quick")
    text += "Which limits cannot be kept together is worked out from normal effort on.\n";
  if (result.conflict.empty()) return text;
  const auto& worst = result.conflict.front();
  text += wrapped(fmt::format("Failed most often: {}, by {} designs; the best of them {}.", worst.check,
                              counted(static_cast<double>(worst.failed)), closest_text(worst)));
  TextTable table({"limit broken", ">designs", ">best value", ">limit", ">missed by"});
  for (const auto& conflict : result.conflict)
    table.row({conflict.check, counted(static_cast<double>(conflict.failed)), found_text(conflict.closest),
               limit_text(conflict.closest), percent(conflict.least_shortfall)});
  text += '\n' + table.text();
  const std::string near = near_misses_text(result, result.near_misses.size());
  return near.empty() ? text : text + '\n' + near;
}

}  // namespace dropfront::report
