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
bool find_designs(Session& session) {
  Prospects prospects(session);
  if (session.options.switches.relax && !session.axes.empty()) relax_and_snap(session, prospects);
  scatter(session, prospects);
  return close(session, prospects);
}

}  // namespace

SearchOutcome run_search(const Evaluator& evaluator, const SearchOptions& options, const Bounder* bounder) {
  Session session(evaluator, options);
  SearchOutcome outcome;
  if (session.space.size() < 1 || worth_enumerating(session)) {
    outcome.proof = enumerate(session);
    outcome.exhaustive = outcome.closed = outcome.proof->complete;
  } else {
    const bool wanted = bounder && worth_proving(session);
    const std::int64_t looks = session.plan.looks;
    // The proof needs its share of what a budget allows.
    if (wanted && options.budget) session.plan.looks = (looks + 1) / 2;
    outcome.closed = find_designs(session);
    session.plan.looks = looks;
    if (wanted) outcome.proof = prove(session, *bounder);
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
  const bool proven = outcome.proof && outcome.proof->complete;
  outcome.cut_short = session.ended() || (!proven && (budget_spent || outcome.proof));
  session.report("rank", 1);
  return outcome;
}

}  // namespace dropfront::search
