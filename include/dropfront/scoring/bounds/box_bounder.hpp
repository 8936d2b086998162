#pragma once
#include "dropfront/scoring/bounds/bound_context.hpp"
#include "dropfront/scoring/bounds/box.hpp"

namespace dropfront::scoring {

/// Bounds boxes of designs against one requirement. Total and thread-safe; depends on its arguments only.
/// With several supplies a member must keep its limits on each: one supply's broken check is enough, the
/// standby bound is the greatest over supplies, the margin bound the least. `requirement` must outlive it.
class BoxBounder {
 public:
  explicit BoxBounder(const Requirement& requirement);

  /// `depth` 0: nothing is solved; 1: a few steady states; 2: available currents too, where the box is small
  /// enough for them (about half a millisecond). A deeper bound is never looser. Once a limit
  /// is shown to be broken the objectives not worked out by then are left absent.
  BoxBound bound(const DesignBox& box, int depth) const;

  /// Drops parts that another part of the same list replaces at no loss: see replaces.hpp. Returns how many
  /// designs of the box were dropped.
  double reduce(DesignBox& box) const;

 private:
  BoundContext context_;
};

}  // namespace dropfront::scoring
