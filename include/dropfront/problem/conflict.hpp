#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/problem/binding.hpp"
#include "dropfront/problem/limit_knobs.hpp"
#include "dropfront/search/search.hpp"

namespace dropfront::problem {

/// One limit of a set that cannot hold together, and what it takes alone.
struct ConflictLimit {
  const LimitKnob* knob = nullptr;
  double asked = 0;
  /// The nearest value at which a design complies with every other limit of the problem as it is. Absent: no
  /// such design was found, or the limit has no value and `droppable` says whether dropping it admits one.
  std::optional<double> needed;
  bool droppable = false;
  bool proven = false;                   ///< no nearer value, or none at all, in these lists
  std::optional<search::Choice> choice;  ///< the design that value admits
};

/// Why nothing complies.
struct ConflictSet {
  /// Limits of which no design keeps all, while some keeps all but any one of them (where that was found).
  /// Empty: even without any of the problem's limits no design was found; then parts and ratings stand in the
  /// way.
  std::vector<ConflictLimit> limits;
  bool proven = false;        ///< that no design keeps them all
  bool every_design = false;  ///< by looking at every design; else by searches
  std::int64_t scored = 0;
};

/// Spaces up to this size are settled by scoring every design with all limits widened.
inline constexpr double kExplainEvery = 20000;

/// For a problem whose search found no compliant design. A set is found by deletion: limits are dropped one
/// after the other for good as long as the rest cannot hold; relaxations, one limit at a time, by a search
/// for the nearest value (its standby or margin bounds give a proof where the search makes one).
/// `every_below`: the size up to which every design is looked at. Deterministic; `options.stop` cuts it
/// short, and nothing is then proven.
ConflictSet explain_conflict(const Problem& problem, const search::SearchOptions& options,
                             double every_below = kExplainEvery);

}  // namespace dropfront::problem
