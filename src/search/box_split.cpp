#include "dropfront/search/box_split.hpp"

#include <algorithm>
#include <cmath>
#include <map>

namespace dropfront::search {
namespace {

using Options = std::vector<std::int32_t>;

/// The options of a slot by group, in order of the group's first option.
std::vector<Options> groups_of(const Slot& slot) {
  std::vector<Options> groups;
  std::map<int, std::size_t> place;
  for (int option = 0; option < slot.size; ++option) {
    const int group = !slot.group.empty() ? slot.group[option] : slot.category ? option : 0;
    const auto found = place.emplace(group, groups.size());
    if (found.second) groups.push_back({});
    groups[found.first->second].push_back(option);
  }
  return groups;
}

double range(const std::vector<double>& values) {
  const auto ends = std::minmax_element(values.begin(), values.end());
  return values.empty() ? 0 : *ends.second - *ends.first;
}

/// Marks the values in the upper half of their range; false when all are equal.
bool upper_half(const std::vector<double>& values, std::vector<bool>& upper) {
  const auto ends = std::minmax_element(values.begin(), values.end());
  if (!(*ends.first < *ends.second)) return false;
  const double middle = *ends.first + (*ends.second - *ends.first) / 2;
  for (std::size_t i = 0; i < values.size(); ++i)
    // The greatest is always above, the least never.
    upper[i] = values[i] > middle || values[i] == *ends.second;
  return true;
}

}  // namespace

BoxSplitter::BoxSplitter(const Evaluator& evaluator) : space_(evaluator.space()) {
  for (const Slot& slot : space_.slots)
    if (slot.size < 1) return;
  Choice base(space_.slots.size(), 0);
  for (std::size_t s = 0; s < base.size(); ++s) {
    const Slot& slot = space_.slots[s];
    std::vector<Place> places(static_cast<std::size_t>(slot.size));
    for (int option = 0; option < slot.size; ++option) {
      base[s] = option;
      Place& place = places[option];
      if (!slot.coordinate.empty()) place.coordinate = slot.coordinate[option];
      place.known = evaluator.look(base).objectives;
      for (double& value : place.known)
        if (!std::isfinite(value)) value = 0;
    }
    base[s] = 0;
    places_.push_back(std::move(places));
  }
}

std::vector<Box> BoxSplitter::roots() const {
  std::vector<Box> boxes{Box{}};
  for (const Slot& slot : space_.slots) {
    std::vector<Box> longer;
    for (const Box& box : boxes)
      for (const Options& group : groups_of(slot)) {
        longer.push_back(box);
        longer.back().options.push_back(group);
      }
    boxes = std::move(longer);
  }
  return boxes;
}

double BoxSplitter::spread(int slot, const Options& options, const std::vector<double>& extent) const {
  std::vector<double> values;
  for (const auto option : options) values.push_back(places_[slot][option].coordinate);
  double result = range(values);
  for (std::size_t k = 0; k < extent.size(); ++k) {
    values.clear();
    for (const auto option : options) values.push_back(places_[slot][option].known[k]);
    if (extent[k] > 0) result += range(values) / extent[k];
  }
  return result;
}

int BoxSplitter::widest(const Box& box, const std::vector<double>& extent) const {
  int widest = -1;
  double greatest = -1;
  for (std::size_t s = 0; s < box.options.size(); ++s) {
    if (box.options[s].size() < 2) continue;
    const double here = spread(static_cast<int>(s), box.options[s], extent);
    if (!(here > greatest)) continue;
    greatest = here;
    widest = static_cast<int>(s);
  }
  return widest;
}

std::pair<Box, Box> BoxSplitter::split(const Box& box, int slot) const {
  const Options& options = box.options[slot];
  std::vector<bool> upper(options.size(), false);
  std::vector<double> values;
  for (const auto option : options) values.push_back(places_[slot][option].coordinate);
  bool parted = upper_half(values, upper);
  for (std::size_t k = 0; !parted && k < places_[slot][options[0]].known.size(); ++k) {
    values.clear();
    for (const auto option : options) values.push_back(places_[slot][option].known[k]);
    parted = upper_half(values, upper);
  }
  for (std::size_t i = options.size() / 2; !parted && i < options.size(); ++i) upper[i] = true;
  std::pair<Box, Box> halves{box, box};
  halves.first.options[slot].clear();
  halves.second.options[slot].clear();
  for (std::size_t i = 0; i < options.size(); ++i)
    (upper[i] ? halves.second : halves.first).options[slot].push_back(options[i]);
  return halves;
}

}  // namespace dropfront::search
