// Boxes of a space drawn at random, and their members.
#pragma once
#include <algorithm>
#include <vector>

#include "dropfront/search/box.hpp"
#include "dropfront/search/space.hpp"
#include "dropfront/values/random.hpp"

namespace dropfront::problem::testing {

/// A box with up to `most` options in each slot, drawn evenly, one arrangement and one kind of stage.
inline search::Box random_box(const search::Space& space, std::uint64_t most, values::RandomStream& random) {
  search::Box box;
  for (const search::Slot& slot : space.slots) {
    std::vector<std::int32_t> options;
    const auto size = static_cast<std::uint64_t>(slot.size);
    const std::uint64_t wanted = slot.category ? 1 : 1 + random.below(most);
    for (std::uint64_t n = 0; n < wanted; ++n)
      options.push_back(static_cast<std::int32_t>(random.below(size)));
    std::sort(options.begin(), options.end());
    options.erase(std::unique(options.begin(), options.end()), options.end());
    box.options.push_back(options);
  }
  return box;
}

inline std::vector<search::Choice> members_of(const search::Box& box) {
  std::vector<search::Choice> all{{}};
  for (const auto& list : box.options) {
    std::vector<search::Choice> longer;
    for (const auto& start : all)
      for (const auto option : list) {
        longer.push_back(start);
        longer.back().push_back(option);
      }
    all = std::move(longer);
  }
  return all;
}

}  // namespace dropfront::problem::testing
