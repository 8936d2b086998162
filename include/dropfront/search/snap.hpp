#pragma once
#include <vector>

#include "dropfront/search/relax.hpp"
#include "dropfront/search/session.hpp"

namespace dropfront::search {

/// The real designs about one relaxed optimum, none twice: the base design, then all others that were looked
/// at on the way, by merit of their looks.
///
/// Base design: on every axis the nearest coordinate; among the options there, and for slots without an axis
/// among all, the one whose look is best (least violation, then least weighted sum of the objectives a look
/// tells), slot by slot, twice. Then every one-slot change of it to the options of the coordinates on both
/// sides, and the designs with all axes moved below or all above.
std::vector<Choice> snap(const Session& session, const RelaxedOptimum& optimum, const ObjectiveRange& range);

}  // namespace dropfront::search
