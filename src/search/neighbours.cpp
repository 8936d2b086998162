#include "dropfront/search/neighbours.hpp"

#include <algorithm>
#include <cstdlib>

namespace dropfront::search {
namespace {

std::vector<std::int32_t> options_near(const Space& space, const std::vector<Axis>& axes, int slot, int own,
                                       int window) {
  const auto axis = std::find_if(axes.begin(), axes.end(), [slot](const Axis& a) { return a.slot == slot; });
  std::vector<std::int32_t> options;
  for (int option = 0; option < space.slots[slot].size; ++option) {
    if (option == own) continue;
    if (axis != axes.end() && std::abs(axis->step_of[option] - axis->step_of[own]) > window) continue;
    options.push_back(option);
  }
  return options;
}

}  // namespace

std::vector<Choice> one_part_changes(const Space& space, const Choice& choice) {
  std::vector<Choice> result;
  for (std::size_t s = 0; s < space.slots.size(); ++s)
    for (int option = 0; option < space.slots[s].size; ++option) {
      if (option == choice[s]) continue;
      result.push_back(choice);
      result.back()[s] = option;
    }
  return result;
}

std::vector<Choice> two_part_changes(const Space& space, const std::vector<Axis>& axes, const Choice& choice,
                                     int window) {
  std::vector<Choice> result;
  for (const auto& pair : space.coupled) {
    const auto firsts = options_near(space, axes, pair.first, choice[pair.first], window);
    const auto seconds = options_near(space, axes, pair.second, choice[pair.second], window);
    for (std::int32_t first : firsts)
      for (std::int32_t second : seconds) {
        result.push_back(choice);
        result.back()[pair.first] = first;
        result.back()[pair.second] = second;
      }
  }
  return result;
}

}  // namespace dropfront::search
