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

  /// By the rules of `depth` and less: see BoundRule. A deeper bound is never looser. Once a limit is shown
  /// to be broken the objectives not worked out by then are left absent.
  BoxBound bound(const DesignBox& box, int depth) const { return bound(box, 0, depth); }
  /// By the rules of those depths only.
  BoxBound bound(const DesignBox& box, int least_depth, int depth) const;
  /// As depth 0, with `shares`.
  BoxBound outlook(const DesignBox& box) const;

  /// Drops parts that another part of the same list replaces at no loss: see replaces.hpp. Returns how many
  /// designs of the box were dropped.
  double reduce(DesignBox& box) const;

 private:
  BoxBound ask(const DesignBox& box, int least_depth, int depth, bool shares) const;

  BoundContext context_;
};

}  // namespace dropfront::scoring
