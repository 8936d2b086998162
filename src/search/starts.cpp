#include "dropfront/search/starts.hpp"

#include <algorithm>
#include <map>
#include <utility>

#include "dropfront/search/relax.hpp"
#include "dropfront/search/sequence.hpp"
#include "dropfront/search/snap.hpp"

namespace dropfront::search {
namespace {

// Scores the bases of what was snapped, then queues the designs around them. A base that was scored before,
// or that its look rules out, still lends its place to the designs around it.
void take(SearchState& state, Prospects& prospects, const std::vector<RelaxedOptimum>& optima,
          const std::vector<Snapped>& snapped) {
  std::vector<Choice> bases, around;
  for (const Snapped& s : snapped) bases.insert(bases.end(), s.bases.begin(), s.bases.end());
  std::vector<Choice> scored;
  for (Looked& looked : state.look_new(bases)) scored.push_back(std::move(looked.choice));
  std::map<Choice, Merged> results;
  for (Merged& merged : state.evaluate(scored)) results.emplace(merged.choice, std::move(merged));
  std::vector<Parent> parents;
  std::vector<std::size_t> made_from;
  for (std::size_t i = 0; i < snapped.size(); ++i) {
    around.insert(around.end(), snapped[i].around.begin(), snapped[i].around.end());
    made_from.insert(made_from.end(), snapped[i].around.size(), i);
    const auto found = results.find(snapped[i].bases.front());
    if (found == results.end())
      parents.push_back(Parent{snapped[i].bases.front(), optima[i].design.objectives, 0, -1});
    else
      parents.push_back(Parent{found->first, found->second.quantities, 0, found->second.entered.tag});
  }
  prospects.add(parents, around, made_from);
}

}  // namespace

void relax_and_snap(SearchState& state, Prospects& prospects) {
  state.report("relax", 0);
  const Relaxation relaxation = relax(state);
  state.report("snap", 0);
  std::vector<Snapped> snapped(relaxation.starts.size());
  state.workers.for_each(snapped.size(), 1, [&](std::size_t i) {
    snapped[i] = snap_dear(state, relaxation.starts[i], relaxation.range);
  });
  take(state, prospects, relaxation.starts, snapped);
  state.report("snap", 0.5);
  snapped.assign(relaxation.optima.size(), {});
  state.workers.for_each(snapped.size(), 1, [&](std::size_t i) {
    snapped[i] = snap(state, relaxation.optima[i], relaxation.range);
  });
  take(state, prospects, relaxation.optima, snapped);
}

void scatter(SearchState& state, Prospects& prospects) {
  const std::int64_t count = std::min(state.plan.evaluations / 5, state.plan.looks / 10) + 1;
  const int slots = static_cast<int>(state.space.slots.size());
  std::vector<Choice> choices;
  std::vector<Parent> parents;
  std::vector<std::size_t> made_from;
  for (std::int64_t n = 0; n < count; ++n) {
    const std::vector<double> point = spread_point(n, slots, state.options.seed);
    Choice choice(slots);
    for (int s = 0; s < slots; ++s) {
      const double size = state.space.slots[s].size;
      choice[s] = static_cast<std::int32_t>(std::min(point[s] * size, size - 1));
    }
    made_from.push_back(parents.size());
    parents.push_back(Parent{choice, {}, 0, -1});
    choices.push_back(std::move(choice));
  }
  prospects.add(parents, choices, made_from);
}

}  // namespace dropfront::search
