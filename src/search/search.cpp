#include "dropfront/search/search.hpp"

#include "dropfront/search/close.hpp"
#include "dropfront/search/enumerate.hpp"
#include "dropfront/search/prospects.hpp"
#include "dropfront/search/prove.hpp"
#include "dropfront/search/rank.hpp"
#include "dropfront/search/starts.hpp"

namespace dropfront::search {
namespace {

/// The stages before the proof; true when they came to their end by themselves.
bool find_designs(SearchState& state) {
  Prospects prospects(state);
  if (state.options.switches.relax && !state.axes.empty()) relax_and_snap(state, prospects);
  scatter(state, prospects);
  return close(state, prospects);
}

}  // namespace

SearchOutcome run_search(const Evaluator& evaluator, const SearchOptions& options, const Bounder* bounder) {
  SearchState state(evaluator, options);
  SearchOutcome outcome;
  if (state.space.size() < 1 || worth_enumerating(state)) {
    outcome.proof = enumerate(state);
    outcome.exhaustive = outcome.closed = outcome.proof->complete;
  } else {
    const bool wanted = bounder && worth_proving(state);
    const std::int64_t looks = state.plan.looks;
    // The proof needs its share of what a budget allows.
    if (wanted && options.budget) state.plan.looks = (looks + 1) / 2;
    outcome.closed = find_designs(state);
    state.plan.looks = looks;
    if (wanted) outcome.proof = prove(state, *bounder);
  }
  state.report("rank", 0);
  const std::vector<Candidate> fillers = fillers_for(state, options.top);
  settle_near_misses(state);
  outcome.front = front_of(state.ledger);
  outcome.ranked = rank(outcome.front, fillers, options.top, evaluator.resolution());
  outcome.near_misses = state.ledger.near_misses().result();
  outcome.tallies = state.ledger.tallies();
  outcome.counts = state.ledger.counts();
  const bool budget_spent =
      options.budget && (state.looks_refused || state.pairs_refused || !state.may_look());
  const bool proven = outcome.proof && outcome.proof->complete;
  outcome.cut_short = state.ended() || (!proven && (budget_spent || outcome.proof));
  state.report("rank", 1);
  return outcome;
}

}  // namespace dropfront::search
