#include "dropfront/search/axis.hpp"

#include <algorithm>
#include <cmath>
#include <numeric>

namespace dropfront::search {
namespace {

Axis build(const Slot& slot, int index) {
  Axis axis;
  axis.slot = index;
  const auto& c = slot.coordinate;
  std::vector<int> order(c.size());
  std::iota(order.begin(), order.end(), 0);
  std::stable_sort(order.begin(), order.end(), [&](int a, int b) { return c[a] < c[b]; });
  const double low = c[order.front()];
  const double extent = c[order.back()] - low;
  axis.step_of.resize(c.size());
  axis.position_of.resize(c.size());
  for (int option : order) {
    const double x = extent > 0 ? (c[option] - low) / extent : 0.0;
    if (axis.position.empty() || axis.position.back() < x) {
      axis.position.push_back(x);
      axis.options.emplace_back();
    }
    axis.options.back().push_back(option);
    axis.step_of[option] = static_cast<int>(axis.position.size()) - 1;
    axis.position_of[option] = x;
  }
  return axis;
}

}  // namespace

std::vector<int> Axis::around(double x) const {
  const int n = static_cast<int>(position.size());
  const int above =
      static_cast<int>(std::lower_bound(position.begin(), position.end(), x) - position.begin());
  if (above == n) return {n - 1};
  if (above == 0 || position[above] == x) return {above};
  if (position[above] - x < x - position[above - 1]) return {above, above - 1};
  return {above - 1, above};
}

std::vector<Axis> axes_of(const Space& space) {
  std::vector<Axis> axes;
  for (std::size_t s = 0; s < space.slots.size(); ++s)
    if (!space.slots[s].coordinate.empty()) axes.push_back(build(space.slots[s], static_cast<int>(s)));
  return axes;
}

std::vector<int> category_slots(const Space& space) {
  std::vector<int> slots;
  for (std::size_t s = 0; s < space.slots.size(); ++s)
    if (space.slots[s].category) slots.push_back(static_cast<int>(s));
  return slots;
}

}  // namespace dropfront::search
