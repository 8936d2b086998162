#include "dropfront/report/confirmation_text.hpp"

#include <fmt/core.h>

#include <algorithm>
#include <array>

#include "dropfront/report/for_people.hpp"
#include "dropfront/report/text_table.hpp"

namespace dropfront::report {

namespace {

std::vector<const Entry*> confirmed(const Result& result) {
  std::vector<const Entry*> entries;
  for (const auto* list : {&result.front, &result.extras})
    for (const auto& entry : *list)
      if (entry.confirmation && !entry.confirmation->box.empty()) entries.push_back(&entry);
  return entries;
}

double departure(const problem::BoxFinding& finding) {
  return std::abs(*finding.inside - *finding.corner) / std::max(1e-12, std::abs(*finding.corner));
}

/// The design where the corner of one quantity was exceeded most; null where it never was.
const Entry* worst_exceeded(const std::vector<const Entry*>& entries, std::size_t q, int& count) {
  const Entry* worst = nullptr;
  count = 0;
  for (const Entry* entry : entries) {
    const auto& finding = entry->confirmation->box[q];
    if (!finding.corner_exceeded) continue;
    ++count;
    if (worst == nullptr || departure(finding) > departure(worst->confirmation->box[q])) worst = entry;
  }
  return worst;
}

std::string exceeded_text(const std::vector<const Entry*>& entries) {
  TextTable table({"worse than the corner", ">designs", ">most in no", ">corner", ">inside", ">limit"});
  for (std::size_t q = 0; q < scoring::kBoxQuantities; ++q) {
    int count = 0;
    const Entry* entry = worst_exceeded(entries, q, count);
    if (entry == nullptr) continue;
    const auto& finding = entry->confirmation->box[q];
    const auto unit = scoring::box_quantity_unit(finding.quantity);
    table.row({std::string(scoring::box_quantity_name(finding.quantity)), std::to_string(count),
               std::to_string(entry->number), with_unit(*finding.corner, unit),
               with_unit(*finding.inside, unit), finding.limit ? with_unit(*finding.limit, unit) : "-"});
  }
  return table.empty() ? "" : table.text();
}

std::string broken_text(const std::vector<const Entry*>& entries) {
  std::string text;
  for (const Entry* entry : entries)
    for (const auto& finding : entry->confirmation->box) {
      if (finding.pass.value_or(true) || !finding.corner_exceeded) continue;
      const auto unit = scoring::box_quantity_unit(finding.quantity);
      text += wrapped(
          fmt::format("Design {} breaks {} inside its tolerances: {} where {} {} is asked.", entry->number,
                      scoring::box_quantity_name(finding.quantity), with_unit(*finding.worst(), unit),
                      scoring::least_counts(finding.quantity) ? ">=" : "<=", with_unit(*finding.limit, unit)),
          "  ");
    }
  return text;
}

std::string sample_text(const std::vector<const Entry*>& entries, std::string_view effort) {
  TextTable table(
      {">no", ">yield", ">at least", ">margin mA, least", ">1 %", ">median", ">standby mW, median", ">99 %"});
  for (const Entry* entry : entries) {
    const auto& sample = entry->confirmation->sample;
    if (!sample || sample->yields.empty()) continue;
    const auto& yield = sample->yields.back();
    const auto milli = [](const std::optional<problem::Quantiles>& of, double problem::Quantiles::*which,
                          int decimals) {
      return of ? rounded(1000 * ((*of).*which), decimals) : std::string("-");
    };
    using Q = problem::Quantiles;
    table.row({std::to_string(entry->number), fmt::format("{:.2f} %", 100 * yield.share),
               fmt::format("{:.2f} %", 100 * yield.low), milli(sample->margin_A, &Q::least, 2),
               milli(sample->margin_A, &Q::one_percent, 2), milli(sample->margin_A, &Q::median, 2),
               milli(sample->standby_W, &Q::median, 0),
               milli(sample->standby_W, &Q::ninety_nine_percent, 0)});
  }
  if (table.empty()) return "";
  std::string text = wrapped(fmt::format(
      "{} builds with parts uniform inside their tolerances, each at its worst mains, ambient and age{}:",
      counted(problem::kScrambles * problem::kBuildsAScramble),
      effort == "deep" ? "" : " (--effort deep samples every ranked design)"));
  return text + table.text();
}

/// The dearest spreads of the design that leads the balanced set (or the last set).
std::string cost_text(const Result& result) {
  if (result.ranked.empty() || result.ranked.back().numbers.empty()) return "";
  const Entry* entry = find_entry(result, result.ranked.back().numbers.front());
  if (entry == nullptr || !entry->confirmation) return "";
  auto costs = entry->confirmation->costs;
  std::stable_sort(costs.begin(), costs.end(),
                   [](const auto& a, const auto& b) { return a.margin_A > b.margin_A; });
  std::string list;
  for (const auto& cost : costs) {
    if (!(cost.margin_A > 5e-6)) continue;  // below what two decimals of a milliampere show
    if (!list.empty()) list += ", ";
    list += fmt::format("{} {} {}", cost.slot, cost.what, rounded(1000 * cost.margin_A, 2));
  }
  if (list.empty()) return "";
  return wrapped(fmt::format("Margin that each spread alone costs design {}, mA: {}.", entry->number, list));
}

}  // namespace

std::string confirmation_text(const Result& result) {
  const auto entries = confirmed(result);
  if (entries.empty()) return "";
  int tried = 0;
  for (const Entry* entry : entries) tried += entry->confirmation->evaluations;
  const std::string exceeded = exceeded_text(entries);
  std::string text = wrapped(
      fmt::format("Confirmed: inside all tolerances of the {} ranked designs, the line, the ambient, the "
                  "load and the age, "
                  "{} points were tried for a worse one than the corners'{}",
                  entries.size(), counted(tried),
                  exceeded.empty() ? "; none was found." : ". Found, and used for the tightest check:"));
  text += exceeded + broken_text(entries) + sample_text(entries, result.effort) + cost_text(result);
  return text;
}

}  // namespace dropfront::report
