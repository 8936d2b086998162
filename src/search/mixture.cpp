#include "dropfront/search/mixture.hpp"

#include <algorithm>

namespace dropfront::search {
namespace {

std::int32_t changed(const Space& space, const std::vector<Axis>& axes, int slot, std::int32_t option,
                     values::RandomStream& random) {
  const auto axis = std::find_if(axes.begin(), axes.end(), [slot](const Axis& a) { return a.slot == slot; });
  if (axis == axes.end()) return static_cast<std::int32_t>(random.below(space.slots[slot].size));
  const int last = static_cast<int>(axis->position.size()) - 1;
  const int step = axis->step_of[option] + static_cast<int>(random.below(7)) - 3;
  const auto& options = axis->options[std::clamp(step, 0, last)];
  return options[random.below(options.size())];
}

}  // namespace

Choice mix(const Space& space, const std::vector<Axis>& axes, const Choice& first, const Choice& second,
           values::RandomStream& random) {
  Choice mixture = first;
  const int slots = static_cast<int>(mixture.size());
  for (int s = 0; s < slots; ++s)
    if (random.below(2) == 1) mixture[s] = second[s];
  for (int s = 0; s < slots; ++s)
    if (random.below(slots) == 0) mixture[s] = changed(space, axes, s, mixture[s], random);
  if (mixture == first) {
    const int s = static_cast<int>(random.below(slots));
    mixture[s] = changed(space, axes, s, mixture[s], random);
  }
  return mixture;
}

}  // namespace dropfront::search
