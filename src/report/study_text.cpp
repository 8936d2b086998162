#include <fmt/core.h>

#include <algorithm>

#include "dropfront/report/for_people.hpp"
#include "dropfront/report/make_result.hpp"
#include "dropfront/report/ranked_table.hpp"
#include "dropfront/report/study.hpp"
#include "dropfront/report/summary_text.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

std::string values_text(const problem::Variation& values) {
  std::string text;
  for (const auto& [key, value] : values) text += (text.empty() ? "" : ", ") + value;
  return text;
}

std::string across_text(const Study& study) {
  // One currency for all, unless it is what varies.
  std::string currency;
  for (const auto& combination : study.combinations) {
    if (!combination.result) continue;
    const std::string& own = combination.result->problem->requirement.currency;
    if (!currency.empty() && own != currency) {
      currency.clear();
      break;
    }
    currency = own;
  }
  TextTable table({"combination", "status", ">front", ">least " + (currency.empty() ? "cost" : currency),
                   ">least mW", ">least mm2", ">most margin mA"});
  for (const auto& combination : study.combinations) {
    const std::string values = values_text(combination.values);
    if (!combination.result) {
      table.row({values, "not searched"});
      continue;
    }
    const Result& result = *combination.result;
    const auto best = [&result](scoring::Objective objective) { return best_on_front(result, objective); };
    table.row({values, std::string(status_name(result.status)), std::to_string(result.front.size()),
               rounded(best(scoring::Objective::cost), 3),
               rounded(thousandfold(best(scoring::Objective::standby_loss)), 0),
               rounded(best(scoring::Objective::board_area), 0),
               rounded(thousandfold(best(scoring::Objective::current_margin)), 2)});
  }
  return table.text();
}

/// The first design of the set `name` of each combination that has one.
std::string first_designs(const Study& study, const std::string& name) {
  std::vector<Line> lines;
  std::string currency;
  for (const auto& combination : study.combinations) {
    if (!combination.result) continue;
    for (const auto& list : combination.result->ranked) {
      if (list.name != name || list.numbers.empty()) continue;
      lines.push_back(
          {values_text(combination.values), find_entry(*combination.result, list.numbers.front())});
      currency = combination.result->problem->requirement.currency;
    }
  }
  if (lines.empty()) return "";
  return '\n' + ranked_heading(name) + '\n' + design_table("", lines, currency);
}

}  // namespace

std::string study_body(const Study& study) {
  std::string text = wrapped(study.title);
  text += std::string(std::min(kTextWidth, display_width(study.title)), '-') + "\n";
  text += fmt::format("{} problems, one search each.\n\n", study.combinations.size());
  text += across_text(study);
  for (const char* name : {"cheapest", "lowest_standby", "smallest", "most_margin", "balanced"})
    text += first_designs(study, name);
  for (const auto& combination : study.combinations)
    if (combination.result && combination.result->front.empty())
      text += '\n' + summary_body(*combination.result);
  return text;
}

std::string study_text(const Study& study) {
  return study_body(study) + '\n' + cautions_text(study.cautions);
}

}  // namespace dropfront::report
