#include "dropfront/search/search.hpp"

#include "dropfront/search/close.hpp"
#include "dropfront/search/enumerate.hpp"
#include "dropfront/search/prospects.hpp"
#include "dropfront/search/rank.hpp"
#include "dropfront/search/starts.hpp"

namespace dropfront::search {
SearchOutcome run_search(const Evaluator& evaluator, const SearchOptions& options) {
  Session session(evaluator, options);
  SearchOutcome outcome;
  if (session.space.size() >= 1 && worth_enumerating(session)) {
    outcome.exhaustive = enumerate(session);
    outcome.closed = outcome.exhaustive;
  } else if (session.space.size() >= 1) {
    Prospects prospects(session);
    if (options.switches.relax && !session.axes.empty()) relax_and_snap(session, prospects);
    scatter(session, prospects);
    outcome.closed = close(session, prospects);
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
