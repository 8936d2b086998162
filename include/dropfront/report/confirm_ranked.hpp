#pragma once
#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// Confirms every ranked design of `result` as far as the effort of `options` goes (problem/confirm.hpp) and
/// uses what comes out: a limit that is tighter inside the tolerances than at any corner becomes the design's
/// tightest. The sample goes to the first design of each set, the balanced one before the others.
void confirm_ranked(Result& result, const search::SearchOptions& options);

}  // namespace dropfront::report
