#pragma once
#include <cstdint>
#include <limits>
#include <vector>

namespace dropfront::search {

/// Many choices at once: per slot the ascending list of its options; every combination is a member.
struct Box {
  std::vector<std::vector<std::int32_t>> options;  ///< one list a slot, none empty
  double members() const {
    double n = 1;
    for (const auto& list : options) n *= static_cast<double>(list.size());
    return n;
  }
};

/// How a bound is known; the weakest class used names the certificate.
enum class BoundKind { exact, theorem, monotone };

/// What no member of a box can beat, as evaluated: less than any figure the evaluator could give a member,
/// whatever its solver's stop tolerance does to the last digits.
struct Bounds {
  std::vector<double> objectives;  ///< one an objective, in its own unit, minimised; -infinity: not known
  std::vector<BoundKind> kinds;    ///< one an objective
  /// May be left empty. Else vectors like `objectives`, exact in kind (-infinity: not known), such that no
  /// member is below all of them: each is in every objective at least as large as one of these.
  std::vector<std::vector<double>> corners;
  int broken = -1;  ///< index into the evaluator's check names that every member breaks
  BoundKind broken_kind = BoundKind::theorem;
  /// Filled in by outlook(), in an order of its own: the shares of limits that no member stays below; above 1
  /// every member breaks that limit.
  std::vector<double> shares;
  bool undefined = false;  ///< every member lacks a figure without which it cannot comply (exact)
};

/// The bridge from boxes to whatever is being designed. Total, thread-safe, depends on its arguments only.
/// A box it is asked about holds, in every slot, options of one group (see Slot) only.
class Bounder {
 public:
  virtual ~Bounder() = default;
  /// `depth` 0: what needs no solving; 1: a few points solved; 2: whole corners. A deeper bound need not
  /// repeat what a lesser one says.
  virtual Bounds bound(const Box& box, int depth) const = 0;
  /// As depth 0, with `shares` filled in: how far a box is from being discarded. Need not know anything.
  virtual Bounds outlook(const Box& box) const { return bound(box, 0); }
  /// What an objective must not exceed in any design that complies, and the check that says so.
  struct Limit {
    double value = std::numeric_limits<double>::infinity();
    int check = -1;  ///< -1: none
  };
  virtual Limit limit_on(int /*objective*/) const { return {}; }
  /// True: no member's objective is below `value`. May be cheaper than a bound on it (one question at one
  /// point), and sharper; known no better than monotone. Nothing need be known.
  virtual bool out_of_reach(const Box& /*box*/, int /*objective*/, double /*value*/) const { return false; }
  /// Drops options that another option of the same slot replaces at no loss in every member (equal in what
  /// the circuit sees, not dearer, not larger, ratings no worse where they could matter in this box). Where
  /// the objectives that are asked for do not tell the two apart, the smaller index must be the one that
  /// stays: it is the representative of equal vectors. Returns how many designs were dropped.
  virtual double reduce(Box& box) const = 0;
  /// How it is known that what reduce() drops is no loss.
  virtual BoundKind reduce_kind() const { return BoundKind::theorem; }
};

}  // namespace dropfront::search
