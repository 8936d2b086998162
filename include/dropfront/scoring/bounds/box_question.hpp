#pragma once
#include <algorithm>
#include <limits>
#include <vector>

#include "dropfront/scoring/bounds/box_ends.hpp"

namespace dropfront::scoring {

/// What a bound rule is asked: one box on one supply.
struct BoxQuestion {
  const DesignBox& box;
  const BoxEnds& ends;
  const BoundContext& context;
  const SupplyLines& supply;
  bool lists_turned = false;  ///< for the tests that show that the direction of a list matters

  const circuit::Arrangement& wiring() const { return *box.arrangement; }
  bool full_wave() const { return box.arrangement->full_wave; }
  bool ahead() const { return box.arrangement->clamp_ahead; }

  /// Least of f over a list: what no entry of it can undercut.
  template <class Entry, class Function>
  double least_over(const std::vector<Entry>& list, Function f) const {
    return over(list, f, !lists_turned);
  }
  /// Greatest of f over a list.
  template <class Entry, class Function>
  double greatest_over(const std::vector<Entry>& list, Function f) const {
    return over(list, f, lists_turned);
  }

 private:
  template <class Entry, class Function>
  static double over(const std::vector<Entry>& list, Function f, bool least) {
    double best = f(list.front());
    for (std::size_t i = 1; i < list.size(); ++i) {
      const double next = f(list[i]);
      if (next != next) return next;  // not a number: it can then discard nothing
      if (least ? next < best : next > best) best = next;
    }
    return best;
  }
};

}  // namespace dropfront::scoring
