#pragma once
#include <vector>

#include "dropfront/search/axis.hpp"
#include "dropfront/search/space.hpp"

namespace dropfront::search {

/// Every design that differs from `choice` in one slot, in order of slot, then option.
std::vector<Choice> one_part_changes(const Space& space, const Choice& choice);

/// Designs that differ in both slots of a coupled pair, for every pair of the space. On an axis only options
/// within `window` distinct coordinates on either side are tried; slots without an axis try all options.
std::vector<Choice> two_part_changes(const Space& space, const std::vector<Axis>& axes, const Choice& choice,
                                     int window);

}  // namespace dropfront::search
