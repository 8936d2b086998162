#include "dropfront/search/relaxed_log.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <utility>

#include "dropfront/search/nlopt_run.hpp"

namespace dropfront::search {

RelaxedDesign evaluate_relaxed(const Evaluator& evaluator, const Choice& categories,
                               const std::vector<double>& position) {
  Evaluation e = evaluator.relaxed(categories, position);
  RelaxedDesign design;
  design.categories = categories;
  design.position = position;
  design.violation = std::isfinite(e.violation) ? std::clamp(e.violation, 0.0, penalty_cap) : penalty_cap;
  for (double& x : e.objectives) {
    if (std::isfinite(x)) continue;
    x = 0;
    design.violation = penalty_cap;
  }
  design.objectives = std::move(e.objectives);
  design.headroom = std::move(e.headroom);
  return design;
}

const RelaxedDesign* best_of(const RelaxedLog& log, const std::vector<double>& weights,
                             const ObjectiveRange& range) {
  const RelaxedDesign* best = nullptr;
  double least = 0;
  for (const RelaxedDesign& design : log) {
    const double value = achievement(design.objectives, design.violation, weights, range);
    if (best && !(value < least)) continue;
    best = &design;
    least = value;
  }
  return best;
}

std::vector<RelaxedDesign> spread_of(const RelaxedLog& log, std::size_t wanted, const ObjectiveRange& range) {
  std::vector<std::pair<std::pair<double, double>, const RelaxedDesign*>> order;
  for (const RelaxedDesign& design : log) {
    const auto weights = balanced_aim(static_cast<int>(design.objectives.size()));
    order.push_back({{design.violation, achievement(design.objectives, 0, weights, range)}, &design});
  }
  std::stable_sort(order.begin(), order.end(),
                   [](const auto& a, const auto& b) { return a.first < b.first; });
  const auto complying = static_cast<std::size_t>(
      std::count_if(order.begin(), order.end(), [](const auto& entry) { return entry.first.first == 0; }));
  if (complying == 0) wanted = std::min<std::size_t>(wanted, 2);
  order.resize(std::min(order.size(), std::max(complying, wanted)));
  std::vector<double> nearest(order.size(), std::numeric_limits<double>::infinity());
  std::vector<RelaxedDesign> chosen;
  while (chosen.size() < std::min(wanted, order.size())) {
    const auto pick = std::max_element(nearest.begin(), nearest.end()) - nearest.begin();
    chosen.push_back(*order[static_cast<std::size_t>(pick)].second);
    for (std::size_t i = 0; i < order.size(); ++i) {
      double square = 0;
      for (std::size_t k = 0; k < chosen.back().position.size(); ++k) {
        const double d = order[i].second->position[k] - chosen.back().position[k];
        square += d * d;
      }
      nearest[i] = std::min(nearest[i], square);
    }
  }
  return chosen;
}

std::vector<double> balanced_aim(int objectives) {
  return std::vector<double>(static_cast<std::size_t>(objectives), 1.0 / objectives);
}

}  // namespace dropfront::search
