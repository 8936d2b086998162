#pragma once
#include <vector>

#include "dropfront/search/relax.hpp"
#include "dropfront/search/search_state.hpp"

namespace dropfront::search {

/// The real designs about a relaxed one.
struct Snapped {
  /// On every axis an option at the nearest coordinate, in slots without an axis any option: the dearest, the
  /// one at three quarters and the cheapest in the order of their looks (violation, then weighted sum of the
  /// objectives a look tells). What a look does not tell, ratings above all, tends to be better in dear
  /// parts: the dear design is the one most likely to comply, the cheap one the one to hope for.
  std::vector<Choice> bases;
  /// All one-slot changes of the bases to options at the coordinates on both sides, and the bases with all
  /// axes moved below or all above.
  std::vector<Choice> around;
};

/// None twice, none of the bases among the others.
Snapped snap(const SearchState& state, const RelaxedOptimum& optimum, const ObjectiveRange& range);

/// The same from the dearest base alone.
Snapped snap_dear(const SearchState& state, const RelaxedOptimum& optimum, const ObjectiveRange& range);

}  // namespace dropfront::search
