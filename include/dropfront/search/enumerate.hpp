#pragma once
#include "dropfront/search/proof.hpp"
#include "dropfront/search/session.hpp"

namespace dropfront::search {

/// Whether the space is small enough for the effort and the budget.
bool worth_enumerating(const Session& session);

/// Looks at every design of the space and evaluates, in order of what the looks tell (cheapest first), all
/// that the front does not reject. Complete when it came to the end.
Proof enumerate(Session& session);

}  // namespace dropfront::search
