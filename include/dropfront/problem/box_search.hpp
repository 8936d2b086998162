#pragma once
#include <cstdint>
#include <optional>
#include <vector>

#include "dropfront/scoring/tolerance_box.hpp"

namespace dropfront::problem {

/// The worst point of a tolerance box that a search came upon.
struct BoxWorst {
  std::optional<double> value;   ///< absent: no point tried had an answer
  std::vector<double> position;  ///< in the unit cube, every entry in 0..1
  int evaluations = 0;
};

/// Looks for a worse point than the corner's vertex: each axis turned to its other end, those that made it
/// worse turned together; then NLopt inside the cube, by a quadratic model (BOBYQA) from the worst vertex and
/// by subspaces of simplices (SBPLX) from a point of its own. The log of exact evaluations decides.
/// `evaluations` >= 1: at most so many points are tried.
BoxWorst search_box(const scoring::ToleranceBox& box, scoring::BoxQuantity quantity, int evaluations,
                    std::uint64_t seed);

}  // namespace dropfront::problem
