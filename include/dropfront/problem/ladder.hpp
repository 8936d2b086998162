#pragma once
#include <algorithm>
#include <cmath>
#include <cstdint>
#include <limits>
#include <vector>

#include "dropfront/parts/family.hpp"

namespace dropfront::problem {

/// One slot's parts by value, for designs between the options. A rung holds the parts of one value, cheapest
/// first; a part of any value is laid between the two nearest rungs.
template <class Part>
class Ladder {
 public:
  /// `value`: what the slot's coordinate is the logarithm of; > 0 for every part.
  Ladder(std::vector<const Part*> parts, double Part::*value, std::int64_t volume) : value_(value) {
    const auto price = [volume](const Part* part) {
      return parts::price_micro_at(part->info, volume).value_or(std::numeric_limits<std::int64_t>::max());
    };
    std::stable_sort(parts.begin(), parts.end(), [&](const Part* a, const Part* b) {
      return a->*value != b->*value ? a->*value < b->*value : price(a) < price(b);
    });
    for (const Part* part : parts) {
      if (rungs_.empty() || rungs_.back().front()->*value != part->*value) rungs_.emplace_back();
      rungs_.back().push_back(part);
    }
  }

  double least() const { return rungs_.front().front()->*value_; }
  double greatest() const { return rungs_.back().front()->*value_; }

  bool empty() const { return rungs_.empty(); }
  /// Of a ladder that is not empty: the part at `position` in [0, 1] of the logarithmic axis. From each rung
  /// beside it comes the cheapest part that `suffices`, else the one of the greatest `strength`.
  template <class Suffices, class Strength>
  Part at(double position, Suffices suffices, Strength strength) const {
    const double wanted = std::exp(std::log(least()) + position * (std::log(greatest()) - std::log(least())));
    std::size_t above = 0;
    while (above + 1 < rungs_.size() && rungs_[above].front()->*value_ < wanted) ++above;
    const std::size_t below = above > 0 ? above - 1 : 0;
    const Part& low = pick(rungs_[below], suffices, strength);
    const Part& high = pick(rungs_[above], suffices, strength);
    return parts::interpolate(low, high, std::clamp(wanted, low.*value_, high.*value_));
  }

 private:
  template <class Suffices, class Strength>
  static const Part& pick(const std::vector<const Part*>& rung, Suffices suffices, Strength strength) {
    const auto found =
        std::find_if(rung.begin(), rung.end(), [&](const Part* part) { return suffices(*part); });
    if (found != rung.end()) return **found;
    return **std::max_element(rung.begin(), rung.end(),
                              [&](const Part* a, const Part* b) { return strength(*a) < strength(*b); });
  }

  double Part::*value_;
  std::vector<std::vector<const Part*>> rungs_;
};

}  // namespace dropfront::problem
