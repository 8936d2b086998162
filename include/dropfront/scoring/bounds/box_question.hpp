#pragma once
#include <algorithm>
#include <memory>
#include <optional>
#include <vector>

#include "dropfront/scoring/bounds/box_ends.hpp"
#include "dropfront/scoring/bounds/corner_charge.hpp"
#include "dropfront/scoring/bounds/rich_composite.hpp"

namespace dropfront::scoring {

/// What a bound rule is asked: one box on one supply.
struct BoxQuestion {
  BoxQuestion(const DesignBox& of, const BoxEnds& its_ends, const BoundContext& in, const SupplyLines& on)
      : box(of), ends(its_ends), context(in), supply(on) {}

  const DesignBox& box;
  const BoxEnds& ends;
  const BoundContext& context;
  const SupplyLines& supply;
  bool lists_turned = false;  ///< for the tests that show that the direction of a list matters
  bool verdict_only = false;  ///< whether a share exceeds 1 is all that matters: loops may stop early

  bool full_wave() const { return box.arrangement->full_wave; }
  bool ahead() const { return box.arrangement->clamp_ahead; }
  /// corner_charge of this question, worked out once.
  const CornerCharge& charge(BoxCorner corner) const;
  /// The composite of this question, made once; null where it can say nothing.
  RichComposite* rich() const;

  /// Least of f over a list: what no entry of it can undercut.
  template <class Entry, class Function>
  double least_over(const std::vector<Entry>& list, Function f) const {
    return over(list, f, !lists_turned);
  }
  /// Least share of what is allowed over a list. With `verdict_only` the first that does not exceed 1 will
  /// do.
  template <class Entry, class Function>
  double least_share(const std::vector<Entry>& list, Function f) const {
    if (!verdict_only) return least_over(list, f);
    double least = f(list.front());
    for (std::size_t i = 1; i < list.size() && least > 1; ++i) {
      const double next = f(list[i]);
      if (!(next >= least)) least = next;
    }
    return least;
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
  mutable std::optional<CornerCharge> charges_[2];
  mutable std::shared_ptr<RichComposite> rich_;
};

}  // namespace dropfront::scoring
