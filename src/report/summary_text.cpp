#include "dropfront/report/summary_text.hpp"

#include <fmt/core.h>

#include <algorithm>
#include <set>

#include "dropfront/report/confirmation_text.hpp"
#include "dropfront/report/design_slots.hpp"
#include "dropfront/report/for_people.hpp"
#include "dropfront/report/proof_text.hpp"
#include "dropfront/report/ranked_table.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

std::string counts_text(const Result& result) {
  const auto& counts = result.counts;
  std::string text = counted(static_cast<double>(counts.looked)) + " designs looked at, " +
                     counted(static_cast<double>(counts.scored)) + " scored in full, of " +
                     counted(counts.space) + " possible";
  if (proven(result) && result.proof->enumerated) text += " (all of them)";
  return text + ".";
}

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

std::string nothing_found(const Result& result) {
  std::string text = proven(result) && result.proof->enumerated
                         ? "No design of this problem complies: every one was looked at.\n"
                     : proven(result) ? "No design of this problem complies.\n"
                                      : "No compliant design was found.\n";
  if (result.conflict.empty()) return text;
  const auto& worst = result.conflict.front();
  text += wrapped(fmt::format("Failed most often: {}, by {} designs; the best of them {}.", worst.check,
                              counted(static_cast<double>(worst.failed)), closest_text(worst)));
  TextTable table({"limit broken", ">designs", ">best value", ">limit", ">missed by"});
  for (const auto& conflict : result.conflict)
    table.row({conflict.check, counted(static_cast<double>(conflict.failed)), found_text(conflict.closest),
               limit_text(conflict.closest), percent(conflict.least_shortfall)});
  text += '\n' + table.text();
  if (result.near_misses.empty()) return text;
  TextTable near({"one limit broken", ">value", ">limit", ">dropper", ">resistor", ">clamp", ">reservoir"});
  for (const auto& miss : result.near_misses) {
    const auto& design = miss.design;
    near.row(
        {miss.check, found_text(miss.broken), limit_text(miss.broken),
         design.dropper ? times(design.dropper_count) + with_unit(design.dropper->capacitance_F, "F") : "-",
         times(design.series_resistor_count) + short_value(*design.series_resistor),
         short_value(*design.clamp), short_value(*design.reservoir)});
    near.note(part_names(design), 6);
  }
  return text + '\n' + near.text();
}

}  // namespace

std::string cautions_text(const std::vector<std::string>& cautions) {
  std::string text = "Cautions\n";
  for (const auto& caution : cautions) text += wrapped(caution, "  - ");
  return text;
}

std::string summary_body(const Result& result) {
  std::string text = wrapped(result.problem->title);
  text += std::string(std::min(kTextWidth, display_width(result.problem->title)), '-') + "\n";
  if (result.status == Status::cut_short && !proven(result))
    text += "Cut short: better designs may exist among those not looked at.\n";
  text += wrapped(counts_text(result));
  if (!result.closed && !proven(result) && result.status != Status::cut_short)
    text += wrapped(fmt::format(
        "The {} effort was spent before the search had run out of promising designs: {}.", result.effort,
        result.effort == "deep" ? "better ones may exist" : "a greater --effort may find better ones"));
  if (const std::string proof = proof_text(result); !proof.empty()) text += wrapped(proof);
  if (result.front.empty()) return text + nothing_found(result);
  text += wrapped(counted(static_cast<double>(result.front.size())) +
                  " on the front: no design found is as good in every objective and better in one.");
  std::set<int> described;
  for (const auto& list : result.ranked)
    text += '\n' + ranked_heading(list.name) + '\n' + ranked_table(result, list, described);
  if (!result.extras.empty()) text += "  * complies, not on the front\n";
  if (const std::string confirmed = confirmation_text(result); !confirmed.empty()) text += '\n' + confirmed;
  return text + "\n" +
         wrapped(
             "Margin: output current to spare in the worst case at the end of life. Standby: nominal "
             "mains, worst new parts. Tightest: the check with the least headroom left.");
}

std::string summary_text(const Result& result) {
  return summary_body(result) + '\n' + cautions_text(result.cautions);
}

}  // namespace dropfront::report
