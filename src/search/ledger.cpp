#include "dropfront/search/ledger.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/search/objective_key.hpp"

namespace dropfront::search {
namespace {

constexpr std::size_t passed_over_kept = 2000;
constexpr std::size_t broken_kept = 64;

bool all_known(const std::vector<double>& objectives) {
  return std::all_of(objectives.begin(), objectives.end(), [](double x) { return std::isfinite(x); });
}

}  // namespace

Ledger::Ledger(const Evaluator& evaluator)
    : front_(evaluator.resolution()),
      tallies_(evaluator.check_names().size()),
      near_misses_(static_cast<int>(evaluator.check_names().size())),
      passed_over_(evaluator.objective_count(), Shortlist(passed_over_kept)),
      nearest_broken_(broken_kept) {
  counts_.space = evaluator.space().size();
  turned_away_.broken.resize(evaluator.check_names().size());
}

void Ledger::note_broken(const Choice& choice, const Evaluation& evaluation) {
  for (std::size_t i = 0; i < evaluation.broken.size(); ++i) {
    CheckTally& tally = tallies_[evaluation.broken[i]];
    const double shortfall = evaluation.shortfall[i];
    const bool closer = tally.failed == 0 || shortfall < tally.least_shortfall ||
                        (shortfall == tally.least_shortfall && choice < tally.closest);
    ++tally.failed;
    if (!closer) continue;
    tally.least_shortfall = shortfall;
    tally.closest = choice;
  }
  near_misses_.suggest(choice, evaluation);
  if (compliant_.empty()) nearest_broken_.offer({evaluation.violation}, choice);
}

void Ledger::pass_over(const Choice& choice, const std::vector<double>& objectives) {
  const std::vector<double> keys = objective_keys(objectives, front_.resolution());
  for (std::size_t k = 0; k < keys.size(); ++k) {
    if (std::isnan(objectives[k])) continue;
    std::vector<double> measures{keys[k]};
    measures.insert(measures.end(), keys.begin(), keys.end());
    passed_over_[k].offer(std::move(measures), choice);
  }
}

bool Ledger::look(const Choice& choice, const Evaluation& evaluation) {
  ++counts_.looked;
  if (evaluation.outcome != Outcome::compliant) {
    Evaluation partial = evaluation;
    partial.complete = false;  // a look never makes all checks
    note_broken(choice, partial);
    ++(evaluation.broken.empty() ? turned_away_.undefined : turned_away_.broken[evaluation.broken.front()]);
    return false;
  }
  if (!front_.rejects(evaluation.objectives, choice)) return true;
  ++turned_away_.dominated;
  pass_over(choice, evaluation.objectives);
  return false;
}

Entered Ledger::merge(const Choice& choice, const Evaluation& evaluation) {
  Entered entered;
  if (evaluation.complete) ++counts_.scored;
  if (!evaluation.broken.empty() || evaluation.outcome == Outcome::breaks_limits) {
    note_broken(choice, evaluation);
    return entered;
  }
  if (!evaluation.complete) {
    if (front_.rejects(evaluation.objectives, choice)) pass_over(choice, evaluation.objectives);
    return entered;
  }
  if (evaluation.outcome != Outcome::compliant || !all_known(evaluation.objectives)) return entered;
  ++counts_.compliant;
  entered.tag = static_cast<std::int64_t>(compliant_.size());
  compliant_.push_back(Candidate{choice, evaluation, false});
  entered.front = front_.insert(evaluation.objectives, choice, entered.tag, &entered.removed);
  return entered;
}

}  // namespace dropfront::search
