#include "dropfront/report/explain.hpp"

namespace dropfront::report {

void explain(Result& result, const problem::BoundProblem& bound, const search::SearchOptions& options) {
  if (!result.front.empty() || result.status == Status::cut_short) return;
  // Some milliseconds a design: more than a quick search is worth.
  constexpr double kQuickEvery = 2000;
  if (options.effort == search::Effort::quick && bound.space().size() > kQuickEvery) return;
  Result::Explained explained;
  explained.set = problem::explain_conflict(*result.problem, options);
  for (const auto& limit : explained.set.limits)
    explained.designs.push_back(limit.choice ? std::optional(bound.design(*limit.choice)) : std::nullopt);
  result.explained = std::move(explained);
}

}  // namespace dropfront::report
