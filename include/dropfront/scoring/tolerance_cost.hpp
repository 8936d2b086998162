#pragma once
#include <optional>
#include <string_view>
#include <vector>

#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// What one part's spread takes from the margin: the margin with that part alone exactly nominal, or that
/// part alone not ageing, less the margin.
struct ToleranceCost {
  std::string_view slot;
  std::string_view what;  ///< "tolerance" or "ageing"
  double margin_A = 0;    ///< >= 0 but for what a part's other end is worth
};

/// Part by part, one at a time; only where a part has a tolerance (or ages) and both margins have an answer.
/// Margins are the corners' (lean, end of life), the least over supplies.
std::vector<ToleranceCost> tolerance_costs(const Design& design, const Requirement& requirement);

}  // namespace dropfront::scoring
