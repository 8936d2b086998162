#include "dropfront/search/snap.hpp"

#include <algorithm>
#include <cmath>
#include <set>
#include <utility>

namespace dropfront::search {
namespace {

using Options = std::vector<std::int32_t>;

constexpr double dear = 1.0;
constexpr double middle = 0.75;
constexpr double cheap = 0.0;

class Snapper {
 public:
  Snapper(const SearchState& state, const RelaxedOptimum& optimum, const ObjectiveRange& range)
      : state_(state),
        optimum_(optimum),
        range_(range),
        here_(state.space.slots.size()),
        near_(state.space.slots.size()) {
    for (std::size_t a = 0; a < state.axes.size(); ++a) place(state.axes[a], optimum.design.position[a]);
    for (std::size_t s = 0; s < here_.size(); ++s) {
      if (!here_[s].empty()) continue;
      const Slot& slot = state.space.slots[s];
      for (std::int32_t option = 0; option < slot.size; ++option)
        if (!slot.category || option == optimum.design.categories[s]) here_[s].push_back(option);
      near_[s] = here_[s];
    }
  }

  // The design with the option at this share of the way from the best look to the worst, in every slot.
  Choice base(double share) const {
    Choice choice;
    for (const Options& options : here_) choice.push_back(options.front());
    for (int pass = 0; pass < 2; ++pass)
      for (std::size_t s = 0; s < here_.size(); ++s) {
        if (here_[s].size() < 2) continue;
        std::vector<std::pair<std::pair<double, double>, std::int32_t>> order;
        for (std::int32_t option : here_[s]) {
          choice[s] = option;
          order.emplace_back(merit(choice), option);
        }
        std::sort(order.begin(), order.end());
        // Options whose looks break a check come last and are no choice as long as others do not.
        std::size_t sound = 0;
        while (sound < order.size() && order[sound].first.first <= order[0].first.first) ++sound;
        const auto at = static_cast<std::size_t>(share * static_cast<double>(sound - 1) + 0.5);
        choice[s] = order[at].second;
      }
    return choice;
  }

  std::vector<Choice> around(const std::vector<Choice>& bases) const {
    std::set<Choice> seen(bases.begin(), bases.end());
    std::vector<Choice> result;
    const auto offer = [&](Choice choice) {
      if (seen.insert(choice).second) result.push_back(std::move(choice));
    };
    for (const Choice& from : bases) {
      Choice below = from, above = from;
      for (const Axis& axis : state_.axes) {
        below[axis.slot] = near_[axis.slot].front();
        above[axis.slot] = near_[axis.slot].back();
      }
      offer(below);
      offer(above);
      for (std::size_t s = 0; s < near_.size(); ++s)
        for (std::int32_t option : near_[s]) {
          Choice changed = from;
          changed[s] = option;
          offer(std::move(changed));
        }
    }
    return result;
  }

 private:
  void place(const Axis& axis, double position) {
    const std::vector<int> steps = axis.around(position);
    here_[axis.slot].assign(axis.options[steps[0]].begin(), axis.options[steps[0]].end());
    const int last = static_cast<int>(axis.position.size()) - 1;
    const auto ends = std::minmax_element(steps.begin(), steps.end());
    // On a hit both neighbours still count: the relaxed price law is not the list's.
    const bool hit = steps.size() == 1;
    for (int step = std::max(0, *ends.first - hit); step <= std::min(last, *ends.second + hit); ++step)
      near_[axis.slot].insert(near_[axis.slot].end(), axis.options[step].begin(), axis.options[step].end());
  }

  // How good a look is for the aim: violation first, then the weighted sum of what is known.
  std::pair<double, double> merit(const Choice& choice) const {
    const Evaluation look = state_.evaluator.look(choice);
    double sum = 0;
    for (std::size_t k = 0; k < look.objectives.size(); ++k)
      if (!std::isnan(look.objectives[k]))
        sum += (optimum_.weights[k] + 0.05) * range_.scaled(static_cast<int>(k), look.objectives[k]);
    const double violation = look.outcome == Outcome::compliant ? 0 : std::max(look.violation, 1e-9);
    return {violation, sum};
  }

  const SearchState& state_;
  const RelaxedOptimum& optimum_;
  const ObjectiveRange& range_;
  std::vector<Options> here_;  ///< options of the bases, by slot
  std::vector<Options> near_;  ///< options tried one at a time
};

}  // namespace

Snapped snap(const SearchState& state, const RelaxedOptimum& optimum, const ObjectiveRange& range) {
  const Snapper snapper(state, optimum, range);
  Snapped result;
  for (double share : {dear, middle, cheap}) {
    Choice base = snapper.base(share);
    if (std::find(result.bases.begin(), result.bases.end(), base) == result.bases.end())
      result.bases.push_back(std::move(base));
  }
  result.around = snapper.around(result.bases);
  return result;
}

Snapped snap_dear(const SearchState& state, const RelaxedOptimum& optimum, const ObjectiveRange& range) {
  const Snapper snapper(state, optimum, range);
  Snapped result;
  result.bases.push_back(snapper.base(dear));
  result.around = snapper.around(result.bases);
  return result;
}

}  // namespace dropfront::search
