#include "dropfront/search/search_state.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace dropfront::search {
namespace {

// Stands for the headroom of a check that holds when the evaluator does not tell it.
constexpr double unknown_headroom = 0.05;

}  // namespace

SearchState::SearchState(const Evaluator& the_evaluator, const SearchOptions& the_options)
    : evaluator(the_evaluator),
      space(the_evaluator.space()),
      options(the_options),
      plan(plan_for(the_options)),
      axes(axes_of(space)),
      codec(space),
      workers(the_options.threads),
      ledger(the_evaluator),
      model(static_cast<int>(axes.size()),
            the_evaluator.objective_count() + static_cast<int>(the_evaluator.check_names().size())),
      relaxed_model(model),
      record(space),
      compliant_range(the_evaluator.objective_count()),
      seen_(codec),
      evaluated_(codec),
      categories_(category_slots(space)),
      broken_in_evaluation_(the_evaluator.check_names().size()) {
  if (options.time_s) {
    using Clock = std::chrono::steady_clock;
    deadline_ = Clock::now() +
                std::chrono::duration_cast<Clock::duration>(std::chrono::duration<double>(*options.time_s));
  }
}

bool SearchState::over() const {
  if (halted_.load(std::memory_order_relaxed)) return true;
  const bool stop = options.stop && options.stop->load(std::memory_order_relaxed);
  return stop || (options.time_s && std::chrono::steady_clock::now() >= deadline_);
}

bool SearchState::ended() {
  const bool over = this->over();
  if (over) halted_.store(true, std::memory_order_relaxed);
  return over;
}

void SearchState::lift_evaluation_limit() { plan.evaluations = evaluations_ + (std::int64_t{1} << 60); }

std::vector<Looked> SearchState::look_new(const std::vector<Choice>& choices) {
  std::vector<std::size_t> fresh;
  const std::int64_t left = plan.looks - ledger.counts().looked;
  for (std::size_t i = 0; i < choices.size(); ++i) {
    if (static_cast<std::int64_t>(fresh.size()) >= left) {
      looks_refused = true;
      break;
    }
    if (seen_.insert(choices[i])) fresh.push_back(i);
  }
  std::vector<Evaluation> looks(fresh.size());
  workers.for_each(fresh.size(), 64, [&](std::size_t i) { looks[i] = evaluator.look(choices[fresh[i]]); });
  std::vector<Looked> alive;
  for (std::size_t i = 0; i < fresh.size(); ++i) {
    const Choice& choice = choices[fresh[i]];
    if (!ledger.look(choice, looks[i])) continue;
    alive.push_back(Looked{choice, std::move(looks[i].objectives), fresh[i]});
  }
  return alive;
}

std::vector<double> SearchState::quantities_of(const Evaluation& evaluation) const {
  std::vector<double> quantities = evaluation.objectives;
  const std::size_t checks = evaluator.check_names().size();
  if (evaluation.headroom.size() == checks)
    // Far from its limit the exact figure of a headroom says little and would only bend the fit.
    for (double h : evaluation.headroom) quantities.push_back(std::isnan(h) ? h : std::clamp(h, -1.0, 1.0));
  else if (evaluation.complete && evaluation.outcome == Outcome::compliant)
    quantities.insert(quantities.end(), checks, unknown_headroom);
  quantities.resize(evaluation.objectives.size() + checks, std::numeric_limits<double>::quiet_NaN());
  if (evaluation.headroom.empty())
    for (std::size_t i = 0; i < evaluation.broken.size(); ++i)
      quantities[evaluation.objectives.size() + evaluation.broken[i]] =
          -std::min(evaluation.shortfall[i], 1.0);
  return quantities;
}

void SearchState::learn(const Choice& choice, const Evaluation& evaluation) {
  record.note(choice, evaluation.outcome == Outcome::breaks_limits);
  model.add(region_of(choice), position_of(choice), quantities_of(evaluation));
  if (evaluation.outcome == Outcome::compliant) compliant_range.take(evaluation.objectives);
  for (std::int16_t check : evaluation.broken) ++broken_in_evaluation_[check];
}

FrontGauge SearchState::gauge() const {
  std::vector<double> least(evaluator.objective_count(), 0.0);
  if (!compliant_range.empty())
    for (std::size_t k = 0; k < least.size(); ++k)
      least[k] = 0.1 * compliant_range.extent(static_cast<int>(k));
  return FrontGauge(ledger.front(), least);
}

std::vector<int> SearchState::telling_checks() const {
  std::vector<int> checks;
  for (std::size_t c = 0; c < broken_in_evaluation_.size(); ++c)
    if (broken_in_evaluation_[c] >= 5) checks.push_back(static_cast<int>(c));
  return checks;
}

std::vector<Merged> SearchState::evaluate(const std::vector<Choice>& choices) {
  std::vector<Merged> merged;
  for (std::size_t start = 0; start < choices.size() && may_evaluate() && !ended();) {
    const std::int64_t left = plan.evaluations - evaluations_;
    const std::size_t count = static_cast<std::size_t>(
        std::min<std::int64_t>({evaluation_batch, static_cast<std::int64_t>(choices.size() - start), left}));
    std::vector<Evaluation> results(count);
    const ParetoArchive& front = ledger.front();
    workers.for_each(count, 1, [&](std::size_t i) {
      const Choice& choice = choices[start + i];
      results[i] = evaluator.evaluate(choice, [&front, &choice](const std::vector<double>& objectives) {
        return front.rejects(objectives, choice);
      });
    });
    for (std::size_t i = 0; i < count; ++i) {
      const Choice& choice = choices[start + i];
      learn(choice, results[i]);
      evaluated_.insert(choice);
      merged.push_back(Merged{choice, ledger.merge(choice, results[i]), quantities_of(results[i])});
    }
    evaluations_ += static_cast<std::int64_t>(count);
    start += count;
  }
  return merged;
}

std::vector<Evaluation> SearchState::evaluate_apart(const std::vector<Choice>& choices,
                                                    const Dominated& dominated) {
  std::vector<Evaluation> results(choices.size());
  workers.for_each(choices.size(), 1,
                   [&](std::size_t i) { results[i] = evaluator.evaluate(choices[i], dominated); });
  return results;
}

void SearchState::report(const std::string& stage, double fraction) {
  if (!options.progress) return;
  Progress progress;
  progress.stage = stage;
  progress.fraction = std::clamp(fraction, 0.0, 1.0);
  progress.looked = ledger.counts().looked;
  progress.scored = ledger.counts().scored;
  progress.front = ledger.front().size();
  options.progress(progress);
}

std::vector<double> SearchState::position_of(const Choice& choice) const {
  std::vector<double> position(axes.size());
  for (std::size_t a = 0; a < axes.size(); ++a) position[a] = axes[a].position_of[choice[axes[a].slot]];
  return position;
}

std::int64_t SearchState::region_of(const Choice& choice) const {
  std::int64_t region = 0;
  for (int slot : categories_) region = region * space.slots[slot].size + choice[slot];
  return region;
}

}  // namespace dropfront::search
