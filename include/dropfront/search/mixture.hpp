#pragma once
#include <vector>

#include "dropfront/search/axis.hpp"
#include "dropfront/search/space.hpp"
#include "dropfront/values/random.hpp"

namespace dropfront::search {

/// A design mixed from two: each slot's option from either with even chance, then with a chance of one in the
/// number of slots changed: on an axis to an option one to three distinct coordinates away or at the same
/// one, without an axis to any. A mixture that equals `first` is changed in one slot at least.
Choice mix(const Space& space, const std::vector<Axis>& axes, const Choice& first, const Choice& second,
           values::RandomStream& random);

}  // namespace dropfront::search
