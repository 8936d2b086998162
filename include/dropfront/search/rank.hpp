#pragma once
#include <vector>

#include "dropfront/search/search_state.hpp"

namespace dropfront::search {

/// Front members in order of raw objectives, then choice.
std::vector<Candidate> front_of(const Ledger& ledger);

/// Designs off the front to fill short sets with: compliant ones already scored and, while a set of `top`
/// still lacks some, the best of those passed over, scored now.
std::vector<Candidate> fillers_for(SearchState& state, int top);

/// One set an objective ("objective <k>", k from 0), then "balanced", each with up to `top` designs, members
/// of the front before fillers. By objective: least key of it, ties by the keys in the problem's order, then
/// the raw values, then the choice. Balanced: least worst regret, (value - best) / (worst - best) over the
/// front (0 where all are equal), ties likewise.
std::vector<RankedSet> rank(const std::vector<Candidate>& front, const std::vector<Candidate>& fillers,
                            int top, const std::vector<double>& resolution);

/// Evaluates near misses to the end until the least shortfalls of each check are certain, within reason.
void settle_near_misses(SearchState& state);

}  // namespace dropfront::search
