#pragma once
#include "dropfront/search/proof.hpp"
#include "dropfront/search/search_state.hpp"

namespace dropfront::search {

/// Whether a proof is asked for, or the space small enough to make one anyway.
bool worth_proving(const SearchState& state);

/// Stage prove: branch and bound over lists of options. A box is thinned out (Bounder::reduce) and discarded
/// when every member breaks a limit or when the front rejects its bound; small boxes are settled design by
/// design, others split. The front rejects a bound by the keys of the objectives and, where all keys are
/// equal, only if no member can be the representative (least raw objectives, then least choice); so the front
/// at the end is the front of the space, design for design. Designs evaluated before count as scored and are
/// not evaluated again.
///
/// Boxes are taken up depth first in batches of a fixed size; a batch sees the front as it was before, and is
/// merged in order: any thread count gives the same front and the same counts. The stop flag, the time and
/// the budget (designs looked at and boxes bounded together) leave the rest open and say so.
Proof prove(SearchState& state, const Bounder& bounder);

}  // namespace dropfront::search
