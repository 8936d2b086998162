#pragma once
#include <vector>

#include "dropfront/search/achievement.hpp"
#include "dropfront/search/evaluation.hpp"

namespace dropfront::search {

/// A relaxed design: one combination of category options, a position on every axis.
struct RelaxedDesign {
  Choice categories;  ///< entries of slots that are no categories: 0
  std::vector<double> position;
  std::vector<double> objectives;
  double violation = 0;
  std::vector<double> headroom;  ///< as in Evaluation
};

/// All relaxed designs evaluated in one region, in order.
using RelaxedLog = std::vector<RelaxedDesign>;

/// Evaluates; a violation or an objective that is not finite becomes a finite penalty.
RelaxedDesign evaluate_relaxed(const Evaluator& evaluator, const Choice& categories,
                               const std::vector<double>& position);

/// The design of least achievement for an aim; null when the log is empty.
const RelaxedDesign* best_of(const RelaxedLog& log, const std::vector<double>& weights,
                             const ObjectiveRange& range);

/// Up to `wanted` designs of a log: from those of least violation the best for a balanced aim, then each time
/// the one farthest from those chosen. A log without a complying design gives two at most.
std::vector<RelaxedDesign> spread_of(const RelaxedLog& log, std::size_t wanted, const ObjectiveRange& range);

/// Equal weights.
std::vector<double> balanced_aim(int objectives);

}  // namespace dropfront::search
