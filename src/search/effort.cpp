#include "dropfront/search/effort.hpp"

#include <algorithm>

namespace dropfront::search {

EffortPlan plan_for(const SearchOptions& options) {
  EffortPlan plan{};
  switch (options.effort) {
    case Effort::quick:
      plan = {200'000, 6'000, 1'500, 5'000, 0, 10, 24, 8, 2, 0.0};
      break;
    case Effort::normal:
      plan = {1'000'000, 8'000, 2'500, 20'000, 1'000'000, 20, 64, 16, 3, 0.05};
      break;
    case Effort::deep:
      plan = {2'000'000, 100'000, 20'000, 60'000, 10'000'000, 40, 128, 32, 6, 1e9};
      break;
  }
  if (options.budget) {
    plan.looks = std::max<std::int64_t>(1, *options.budget);
    plan.relaxed = std::min(plan.relaxed, plan.looks);
  }
  return plan;
}

}  // namespace dropfront::search
