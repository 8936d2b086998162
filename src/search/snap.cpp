#include "dropfront/search/snap.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

namespace dropfront::search {
namespace {

// How good a look is for an aim: violation first, then the weighted sum of what is known.
std::pair<double, double> merit(const Session& session, const Choice& choice,
                                const std::vector<double>& weights, const ObjectiveRange& range) {
  const Evaluation look = session.evaluator.look(choice);
  double sum = 0;
  for (std::size_t k = 0; k < look.objectives.size(); ++k)
    if (!std::isnan(look.objectives[k]))
      sum += (weights[k] + 0.05) * range.scaled(static_cast<int>(k), look.objectives[k]);
  double violation = look.violation;
  if (look.outcome != Outcome::compliant) violation = std::max(violation, 1e-9);
  return {violation, sum};
}

std::vector<std::int32_t> all_options(int size) {
  std::vector<std::int32_t> options(size);
  for (int i = 0; i < size; ++i) options[i] = i;
  return options;
}

}  // namespace

std::vector<Choice> snap(const Session& session, const RelaxedOptimum& optimum, const ObjectiveRange& range) {
  const Space& space = session.space;
  Choice base = optimum.design.categories;
  std::vector<std::vector<std::int32_t>> here(space.slots.size());  // options of the base design
  std::vector<std::vector<std::int32_t>> near(space.slots.size());  // options tried one at a time
  for (std::size_t a = 0; a < session.axes.size(); ++a) {
    const Axis& axis = session.axes[a];
    const std::vector<int> steps = axis.around(optimum.design.position[a]);
    here[axis.slot].assign(axis.options[steps[0]].begin(), axis.options[steps[0]].end());
    const int last = static_cast<int>(axis.position.size()) - 1;
    const auto ends = std::minmax_element(steps.begin(), steps.end());
    // On a hit both neighbours still count: the relaxed price law is not the list's.
    const bool single = steps.size() == 1;
    for (int step = std::max(0, *ends.first - single); step <= std::min(last, *ends.second + single); ++step)
      near[axis.slot].insert(near[axis.slot].end(), axis.options[step].begin(), axis.options[step].end());
    base[axis.slot] = here[axis.slot].front();
  }
  for (std::size_t s = 0; s < space.slots.size(); ++s) {
    if (!here[s].empty()) continue;
    here[s] = space.slots[s].category ? std::vector<std::int32_t>{base[s]} : all_options(space.slots[s].size);
    near[s] = here[s];
  }
  std::vector<std::pair<std::pair<double, double>, Choice>> others;
  for (int pass = 0; pass < 2; ++pass)
    for (std::size_t s = 0; s < space.slots.size(); ++s) {
      if (here[s].size() < 2) continue;
      std::vector<std::pair<std::pair<double, double>, std::int32_t>> tried;
      for (std::int32_t option : here[s]) {
        base[s] = option;
        tried.emplace_back(merit(session, base, optimum.weights, range), option);
        others.emplace_back(tried.back().first, base);
      }
      base[s] = std::min_element(tried.begin(), tried.end())->second;
    }

  const auto offer = [&](const Choice& choice) {
    others.emplace_back(merit(session, choice, optimum.weights, range), choice);
  };
  Choice below = base;
  Choice above = base;
  for (std::size_t s = 0; s < space.slots.size(); ++s)
    for (std::int32_t option : near[s]) {
      Choice changed = base;
      changed[s] = option;
      offer(changed);
    }
  for (const Axis& axis : session.axes) {
    below[axis.slot] = near[axis.slot].front();
    above[axis.slot] = near[axis.slot].back();
  }
  offer(below);
  offer(above);
  std::sort(others.begin(), others.end());
  others.erase(std::unique(others.begin(), others.end()), others.end());
  std::vector<Choice> result{base};
  for (auto& other : others)
    if (other.second != result.front()) result.push_back(std::move(other.second));
  return result;
}

}  // namespace dropfront::search
