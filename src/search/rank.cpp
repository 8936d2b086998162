#include "dropfront/search/rank.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/search/achievement.hpp"
#include "dropfront/search/objective_key.hpp"

namespace dropfront::search {
namespace {

// What designs are compared by, in this order.
struct Standing {
  bool filler;
  std::vector<double> measures;
  const Candidate* candidate;
  bool operator<(const Standing& other) const {
    if (filler != other.filler) return other.filler;
    if (measures != other.measures) return measures < other.measures;
    return candidate->choice < other.candidate->choice;
  }
};

double worst_regret(const std::vector<double>& objectives, const ObjectiveRange& range) {
  double worst = 0;
  for (std::size_t k = 0; k < objectives.size(); ++k) {
    const int at = static_cast<int>(k);
    const double extent = range.high(at) - range.low(at);
    // Off the front a value may lie beyond a front that does not differ in it.
    const double regret =
        extent > 0 ? (objectives[k] - range.low(at)) / extent : range.scaled(at, objectives[k]);
    worst = std::max(worst, regret);
  }
  return worst;
}

template <class Measure>
RankedSet ranked_by(const std::string& name, const std::vector<Candidate>& front,
                    const std::vector<Candidate>& fillers, int top, const std::vector<double>& resolution,
                    const Measure& measure) {
  std::vector<Standing> standings;
  const auto add = [&](const std::vector<Candidate>& candidates, bool filler) {
    for (const Candidate& c : candidates) {
      const auto& objectives = c.evaluation.objectives;
      std::vector<double> measures{measure(objectives)};
      const auto keys = objective_keys(objectives, resolution);
      measures.insert(measures.end(), keys.begin(), keys.end());
      measures.insert(measures.end(), objectives.begin(), objectives.end());
      standings.push_back(Standing{filler, std::move(measures), &c});
    }
  };
  add(front, false);
  if (static_cast<int>(front.size()) < top) add(fillers, true);
  std::sort(standings.begin(), standings.end());
  RankedSet set;
  set.name = name;
  for (const Standing& s : standings) {
    if (static_cast<int>(set.candidates.size()) == top) break;
    set.candidates.push_back(*s.candidate);
    set.candidates.back().on_front = !s.filler;
  }
  return set;
}

}  // namespace

std::vector<Candidate> front_of(const Ledger& ledger) {
  std::vector<Candidate> front;
  for (const ParetoArchive::Member* member : ledger.front().sorted()) {
    front.push_back(ledger.compliant()[member->tag]);
    front.back().on_front = true;
  }
  return front;
}

std::vector<Candidate> fillers_for(SearchState& state, int top) {
  std::vector<Candidate> fillers;
  const auto missing = [&] { return static_cast<std::int64_t>(top) - state.ledger.front().size(); };
  if (state.ledger.front().size() == 0 || missing() <= 0) return fillers;
  // Each set wants the next designs by its own objective, so each list is gone through until it gave enough.
  // All list members are dominated: scoring them cannot change the front.
  const Dominated until_broken = [](const std::vector<double>&) { return false; };
  std::set<Choice> tried;
  for (const Shortlist& list : state.ledger.passed_over()) {
    std::vector<Choice> waiting;
    for (const auto& entry : list.entries()) waiting.push_back(entry.second);
    std::int64_t found = 0;
    for (std::size_t next = 0; next < waiting.size() && found < missing() && !state.ended();) {
      std::vector<Choice> batch;
      for (; next < waiting.size() && batch.size() < 16; ++next)
        if (tried.insert(waiting[next]).second)
          batch.push_back(waiting[next]);
        else
          ++found;
      const std::vector<Evaluation> results = state.evaluate_apart(batch, until_broken);
      for (std::size_t i = 0; i < batch.size(); ++i)
        if (state.ledger.merge(batch[i], results[i]).tag >= 0) ++found;
    }
  }
  std::set<std::int64_t> members;
  for (const auto& member : state.ledger.front().entries())
    if (member.alive) members.insert(member.tag);
  for (std::size_t tag = 0; tag < state.ledger.compliant().size(); ++tag)
    if (!members.count(static_cast<std::int64_t>(tag))) fillers.push_back(state.ledger.compliant()[tag]);
  return fillers;
}

std::vector<RankedSet> rank(const std::vector<Candidate>& front, const std::vector<Candidate>& fillers,
                            int top, const std::vector<double>& resolution) {
  ObjectiveRange range(static_cast<int>(resolution.size()));
  for (const Candidate& c : front) range.take(c.evaluation.objectives);
  std::vector<RankedSet> sets;
  for (std::size_t k = 0; k < resolution.size(); ++k)
    sets.push_back(
        ranked_by("objective " + std::to_string(k), front, fillers, top, resolution,
                  [&](const std::vector<double>& o) { return objective_key(o[k], resolution[k]); }));
  sets.push_back(ranked_by("balanced", front, fillers, top, resolution,
                           [&](const std::vector<double>& o) { return worst_regret(o, range); }));
  return sets;
}

void settle_near_misses(SearchState& state) {
  NearMisses& misses = state.ledger.near_misses();
  const std::int64_t most = std::max<std::int64_t>(64, state.plan.evaluations / 20);
  for (std::int64_t spent = 0; spent < most && !state.ended();) {
    std::vector<Choice> open = misses.unsettled(NearMisses::kept);
    std::sort(open.begin(), open.end());
    open.erase(std::unique(open.begin(), open.end()), open.end());
    if (open.empty()) return;
    const std::vector<Evaluation> results = state.evaluate_apart(open, Dominated{});
    for (std::size_t i = 0; i < open.size(); ++i) misses.settle(open[i], results[i]);
    spent += static_cast<std::int64_t>(open.size());
  }
}

}  // namespace dropfront::search
