#include "dropfront/report/confirm_ranked.hpp"

#include <algorithm>

namespace dropfront::report {

namespace {

/// Firsts of the sets, balanced before the others; then, for an effort that samples all, everything else.
std::vector<int> sample_order(const Result& result, const std::vector<Entry*>& entries, bool all) {
  std::vector<int> order;
  const auto add = [&](int number) {
    for (std::size_t i = 0; i < entries.size(); ++i)
      if (entries[i]->number == number) order.push_back(static_cast<int>(i));
  };
  for (const bool balanced : {true, false})
    for (const auto& list : result.ranked)
      if (!list.numbers.empty() && (list.name == "balanced") == balanced) add(list.numbers.front());
  for (std::size_t i = 0; all && i < entries.size(); ++i) order.push_back(static_cast<int>(i));
  return order;
}

void use(const problem::BoxFinding& finding, Entry& entry) {
  if (!finding.corner_exceeded) return;
  const auto headroom = finding.headroom();
  if (!headroom || (entry.tightest_headroom && *entry.tightest_headroom <= *headroom)) return;
  entry.tightest_check = scoring::box_quantity_name(finding.quantity);
  entry.tightest_headroom = headroom;
  entry.tightest_supply = finding.supply;
  entry.tightest_inside = true;
}

}  // namespace

void confirm_ranked(Result& result, const search::SearchOptions& options) {
  std::vector<Entry*> entries;
  std::vector<scoring::Design> designs;
  for (auto* list : {&result.front, &result.extras})
    for (auto& entry : *list)
      if (entry.evidence) {
        entries.push_back(&entry);
        designs.push_back(entry.design);
      }
  if (entries.empty()) return;
  auto plan = problem::confirm_plan(options.effort);
  if (result.status == Status::cut_short) plan.sample_units = 0;  // who sets a limit of time or work means it
  auto confirmations =
      problem::confirm(*result.problem, designs, sample_order(result, entries, plan.sample_units < 0), plan,
                       options.threads, options.stop);
  for (std::size_t i = 0; i < entries.size(); ++i) {
    entries[i]->confirmation = std::move(confirmations[i]);
    if (!entries[i]->confirmation) continue;
    for (const auto& finding : entries[i]->confirmation->box) use(finding, *entries[i]);
  }
}

}  // namespace dropfront::report
