#include "dropfront/problem/limit_search.hpp"

#include <atomic>
#include <cmath>
#include <limits>
#include <memory>

#include "dropfront/problem/box_binding.hpp"
#include "dropfront/problem/score_view.hpp"
#include "dropfront/problem/slot_space.hpp"
#include "dropfront/scoring/score.hpp"

namespace dropfront::problem {
namespace {

using scoring::Depth;

Problem with_requirement(const Problem& problem, const scoring::Requirement& requirement,
                         std::vector<scoring::Objective> objectives) {
  Problem other = problem;
  other.requirement = requirement;
  other.requirement.objectives = std::move(objectives);
  other.resolution.assign(other.requirement.objectives.size(), 0);
  return other;
}

/// A problem seen with one objective: how far one limit, here widened, would have to go.
class OneLimit : public search::Evaluator {
 public:
  OneLimit(const Problem& widened, const LimitKnob& knob)
      : problem_(widened),
        knob_(knob),
        slots_(make_space(widened.offers)),
        scorer_(problem_.requirement),
        view_(problem_.requirement) {}

  const search::Space& space() const override { return slots_.space; }
  int objective_count() const override { return 1; }
  const std::vector<double>& resolution() const override { return resolution_; }
  const std::vector<std::string>& check_names() const override { return view_.check_names(); }

  search::Evaluation look(const search::Choice& choice) const override {
    return seen(choice, scorer_, Depth::cheap);
  }
  search::Evaluation evaluate(const search::Choice& choice,
                              const search::Dominated& dominated) const override {
    return seen(choice, scorer_, dominated ? Depth::compliant : Depth::full);
  }
  search::Evaluation relaxed(const search::Choice&, const std::vector<double>&) const override {
    search::Evaluation none;  // not asked for: relaxations are switched off
    none.objectives = {0};
    none.violation = 1;
    return none;
  }

 private:
  search::Evaluation seen(const search::Choice& choice, const scoring::Scorer& scorer, Depth depth) const {
    const scoring::Design design = design_of(problem_.offers, slots_.ids, choice);
    const scoring::Score score = scorer.score(design, depth);
    search::Evaluation evaluation = view_.evaluation(score);
    const auto needed = needed_value(knob_, score.checks, design, problem_.requirement);
    double objective = std::numeric_limits<double>::quiet_NaN();
    if (needed) objective = knob_.at_most ? *needed : -*needed;
    // A design to which the limit does not apply needs nothing of it.
    if (!needed && score.complete) objective = -1e30;
    evaluation.objectives = {objective};
    return evaluation;
  }

  const Problem& problem_;
  const LimitKnob& knob_;
  SlotSpace slots_;
  scoring::Scorer scorer_;
  ScoreView view_;
  std::vector<double> resolution_{0};
};

bool settled(const search::SearchOutcome& outcome) {
  return !outcome.cut_short && outcome.proof && outcome.proof->complete;
}

search::SearchOptions quiet(const search::SearchOptions& options) {
  search::SearchOptions own = options;
  own.progress = nullptr;
  own.top = 1;
  // A search with one aim and no table to fill ends sooner than the one that found nothing.
  if (own.effort == search::Effort::normal) own.effort = search::Effort::quick;
  return own;
}

/// The knobs whose value is one of the search's objectives: their searches have bounds, and may end in
/// proofs.
std::optional<scoring::Objective> objective_of(const LimitKnob& knob) {
  if (knob.key == "limits.standby_power") return scoring::Objective::standby_loss;
  if (knob.key == "limits.current_margin") return scoring::Objective::current_margin;
  return std::nullopt;
}

}  // namespace

Feasibility feasible(const Problem& problem, const scoring::Requirement& requirement,
                     const search::SearchOptions& options) {
  const Problem other = with_requirement(problem, requirement, {scoring::Objective::cost});
  const auto bound = bind(other);
  const auto bounds = bind_bounds(other);
  search::SearchOptions own = quiet(options);
  std::atomic<bool> enough{false};
  own.stop = &enough;
  own.progress = [&](const search::Progress& progress) {
    const bool told = options.stop != nullptr && options.stop->load(std::memory_order_relaxed);
    if (progress.front > 0 || told) enough.store(true);
  };
  const auto outcome = search::run_search(*bound, own, bounds.get());
  return {!outcome.front.empty(), outcome.front.empty() && settled(outcome), outcome.counts.scored};
}

ConflictLimit nearest_value(const Problem& problem, const LimitKnob& knob,
                            const search::SearchOptions& options, std::int64_t& scored) {
  ConflictLimit limit;
  limit.knob = &knob;
  limit.asked = *knob.asked(problem.requirement);
  scoring::Requirement requirement = problem.requirement;
  knob.widen(requirement);
  search::SearchOptions own = quiet(options);
  search::SearchOutcome outcome;
  const auto objective = objective_of(knob);
  const Problem other =
      with_requirement(problem, requirement, {objective.value_or(scoring::Objective::cost)});
  if (objective) {
    const auto bound = bind(other);
    const auto bounds = bind_bounds(other);
    outcome = search::run_search(*bound, own, bounds.get());
  } else {
    const OneLimit evaluator(other, knob);
    own.switches.relax = false;
    outcome = search::run_search(evaluator, own);
  }
  scored += outcome.counts.scored;
  limit.proven = settled(outcome);
  if (outcome.front.empty()) return limit;
  limit.droppable = true;
  limit.choice = outcome.front.front().choice;
  if (knob.needed != nullptr) {
    // The value from the design itself, by its own score.
    const SlotSpace slots = make_space(other.offers);
    const scoring::Design design = design_of(other.offers, slots.ids, *limit.choice);
    const auto score = scoring::score(design, other.requirement, Depth::compliant);
    limit.needed = needed_value(knob, score.checks, design, other.requirement);
  }
  return limit;
}

}  // namespace dropfront::problem
