#pragma once
#include "dropfront/search/prospects.hpp"
#include "dropfront/search/search_state.hpp"

namespace dropfront::search {

/// Stages relax and snap. The relaxed optima are snapped and scored; so is the dear snap of a few well spread
/// relaxed designs of every region, since a region without a scored design could not be compared with others.
/// All designs around the optima are looked at and queued.
void relax_and_snap(SearchState& state, Prospects& prospects);

/// Looks at designs spread evenly over the whole space and queues them, so that no corner goes unseen.
void scatter(SearchState& state, Prospects& prospects);

}  // namespace dropfront::search
