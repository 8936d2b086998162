#pragma once
#include "dropfront/search/proof.hpp"
#include "dropfront/search/search_state.hpp"

namespace dropfront::search {

/// Whether the space is small enough for the effort and the budget.
bool worth_enumerating(const SearchState& state);

/// Looks at every design of the space and evaluates, in order of what the looks tell (cheapest first), all
/// that the front does not reject. Complete when it came to the end.
Proof enumerate(SearchState& state);

}  // namespace dropfront::search
