#pragma once
#include "dropfront/search/prospects.hpp"
#include "dropfront/search/search_state.hpp"

namespace dropfront::search {

/// Stage close. Takes front members in spread order, looks at every one-part change of each, and evaluates
/// the most promising designs found, batch by batch, until no member is left to take up and no design waits;
/// then the two-part changes of coupled slots, and again. While nothing complies the designs that break
/// limits least are taken up instead. Returns true when it came to that end by itself with no one-part change
/// left out.
bool close(SearchState& state, Prospects& queue);

}  // namespace dropfront::search
