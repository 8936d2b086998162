#pragma once
#include <string_view>
#include <vector>

#include "dropfront/scoring/requirement.hpp"

namespace dropfront::problem {

/// The words of the problem file for the objectives: cost, standby_loss, board_area, current_margin.
std::string_view objective_name(scoring::Objective objective);
const std::vector<scoring::Objective>& all_objectives();  ///< in that order

/// plug, switched, fixed.
std::string_view connection_name(scoring::ConnectionKind kind);

}  // namespace dropfront::problem
