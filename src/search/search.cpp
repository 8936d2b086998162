#include "dropfront/search/search.hpp"

#include <algorithm>
#include <limits>

#include "dropfront/search/close.hpp"
#include "dropfront/search/enumerate.hpp"
#include "dropfront/search/prospects.hpp"
#include "dropfront/search/rank.hpp"
#include "dropfront/search/relax.hpp"
#include "dropfront/search/sequence.hpp"
#include "dropfront/search/snap.hpp"

namespace dropfront::search {
namespace {

constexpr std::size_t scored_an_optimum = 4;

// Stages relax and snap: the first designs to score, and all others looked at on the way into the queue.
void relax_and_snap(Session& session, Prospects& queue) {
  session.report("relax", 0);
  const Relaxation relaxation = relax(session);
  session.report("snap", 0);
  std::vector<std::vector<Choice>> snapped(relaxation.optima.size());
  session.workers.for_each(snapped.size(), 1, [&](std::size_t i) {
    snapped[i] = snap(session, relaxation.optima[i], relaxation.range);
  });
  std::vector<Choice> first, rest;
  std::vector<Parent> parents;
  std::vector<std::size_t> made_from;
  for (const auto& choices : snapped)
    for (std::size_t i = 0; i < choices.size(); ++i)
      (i < scored_an_optimum ? first : rest).push_back(choices[i]);
  std::vector<Choice> scored;
  for (const Looked& looked : session.look_new(first)) scored.push_back(looked.choice);
  session.evaluate(scored);
  for (const auto& optimum : relaxation.optima)
    parents.push_back(Parent{optimum.design.categories, optimum.design.objectives, optimum.design.violation});
  for (std::size_t i = 0; i < snapped.size(); ++i)
    made_from.insert(made_from.end(), snapped[i].size() - std::min(scored_an_optimum, snapped[i].size()), i);
  for (std::size_t i = 0; i < snapped.size(); ++i)
    if (!snapped[i].empty()) parents[i].choice = snapped[i].front();
  queue.add(parents, rest, made_from);
}

// Designs spread evenly over the whole space, so that no corner of it goes unseen.
void scatter(Session& session, Prospects& queue) {
  const std::int64_t count = std::min({session.plan.evaluations / 10, session.plan.looks / 10}) + 1;
  const int slots = static_cast<int>(session.space.slots.size());
  std::vector<Choice> choices;
  std::vector<Parent> parents;
  std::vector<std::size_t> made_from;
  for (std::int64_t n = 0; n < count; ++n) {
    const std::vector<double> point = spread_point(n, slots, session.options.seed);
    Choice choice(slots);
    for (int s = 0; s < slots; ++s)
      choice[s] = static_cast<std::int32_t>(
          std::min(point[s] * session.space.slots[s].size, session.space.slots[s].size - 1.0));
    made_from.push_back(parents.size());
    parents.push_back(Parent{choice, {}, 0});
    choices.push_back(std::move(choice));
  }
  queue.add(parents, choices, made_from);
}

}  // namespace

SearchOutcome run_search(const Evaluator& evaluator, const SearchOptions& options) {
  Session session(evaluator, options);
  SearchOutcome outcome;
  if (session.space.size() >= 1 && worth_enumerating(session)) {
    outcome.exhaustive = enumerate(session);
    outcome.closed = outcome.exhaustive;
  } else if (session.space.size() >= 1) {
    Prospects queue(session);
    if (options.switches.relax && !session.axes.empty()) relax_and_snap(session, queue);
    // Once the closing has come to its end, designs from all over the space are looked at, by then with good
    // models: those that promise something are closed in turn.
    if (session.ledger.front().size() > 0) close(session, queue);
    scatter(session, queue);
    outcome.closed = close(session, queue);
  }
  session.report("rank", 0);
  const std::vector<Candidate> fillers = fillers_for(session, options.top);
  settle_near_misses(session);
  outcome.front = front_of(session.ledger);
  outcome.ranked = rank(outcome.front, fillers, options.top, evaluator.resolution());
  outcome.near_misses = session.ledger.near_misses().result();
  outcome.tallies = session.ledger.tallies();
  outcome.counts = session.ledger.counts();
  const bool budget_spent =
      options.budget && (session.looks_refused || session.pairs_refused || !session.may_look());
  outcome.cut_short = session.ended() || (budget_spent && !outcome.exhaustive);
  session.report("rank", 1);
  return outcome;
}

}  // namespace dropfront::search
