#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/scoring/requirement.hpp"

namespace dropfront::problem {

/// The words of the problem file for the objectives: cost, standby_loss, board_area, current_margin.
std::string_view objective_name(scoring::Objective objective);
std::optional<scoring::Objective> find_objective(std::string_view name);

/// plug, switched, fixed.
std::string_view connection_name(scoring::ConnectionKind kind);

}  // namespace dropfront::problem
