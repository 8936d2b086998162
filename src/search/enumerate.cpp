#include "dropfront/search/enumerate.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::search {
namespace {

// Smallest known values first, in the problem's order of objectives; unknown ones after known ones.
bool cheaper(const Looked& a, const Looked& b) {
  for (std::size_t k = 0; k < a.objectives.size(); ++k) {
    const bool a_known = !std::isnan(a.objectives[k]);
    const bool b_known = !std::isnan(b.objectives[k]);
    if (a_known != b_known) return a_known;
    if (a_known && a.objectives[k] != b.objectives[k]) return a.objectives[k] < b.objectives[k];
  }
  return a.choice < b.choice;
}

// Steps to the next choice, last slot fastest; false after the last one.
bool advance(Choice& choice, const Space& space) {
  for (std::size_t s = choice.size(); s-- > 0;) {
    if (++choice[s] < space.slots[s].size) return true;
    choice[s] = 0;
  }
  return false;
}

}  // namespace

bool worth_enumerating(const SearchState& state) {
  const double size = state.space.size();
  return state.options.switches.enumerate && size <= static_cast<double>(state.plan.exhaustive_limit) &&
         size <= static_cast<double>(state.plan.looks);
}

Proof enumerate(SearchState& state) {
  Proof proof;
  proof.enumerated = true;
  proof.space = state.space.size();
  proof.broken.resize(state.evaluator.check_names().size());
  proof.complete = proof.space < 1;  // a slot that offers nothing: an empty space
  if (proof.complete) return proof;
  std::vector<Choice> all;
  Choice choice(state.space.slots.size(), 0);
  do {
    all.push_back(choice);
  } while (advance(choice, state.space));
  std::vector<Looked> waiting = state.look_new(all);
  std::sort(waiting.begin(), waiting.end(), cheaper);
  state.lift_evaluation_limit();
  constexpr auto exact = static_cast<std::size_t>(BoundKind::exact);
  std::vector<Choice> batch;
  for (std::size_t next = 0; next < waiting.size() && !state.ended();) {
    batch.clear();
    for (; next < waiting.size() && batch.size() < evaluation_batch; ++next) {
      const Looked& design = waiting[next];
      if (state.ledger.front().rejects(design.objectives, design.choice)) {
        state.ledger.pass_over(design.choice, design.objectives);
        ++proof.dominated[exact];
      } else {
        batch.push_back(design.choice);
      }
    }
    proof.scored += static_cast<double>(state.evaluate(batch).size());
    state.report("close", static_cast<double>(next) / static_cast<double>(waiting.size()));
  }
  const Ledger::TurnedAway& away = state.ledger.turned_away();
  for (std::size_t c = 0; c < away.broken.size(); ++c) proof.broken[c][exact] += away.broken[c];
  proof.undefined += away.undefined;
  proof.dominated[exact] += away.dominated;
  proof.left = proof.space - proof.settled();
  proof.complete = proof.left == 0;
  return proof;
}

}  // namespace dropfront::search
