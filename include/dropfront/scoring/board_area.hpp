#pragma once
#include <cstdint>
#include <optional>

#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// Distance kept free around every part, half the gap between two.
inline constexpr std::int64_t kBoardMargin_um = 500;

/// Margin around a mains-side part: the greater of the board margin and half the creepage at the highest
/// line voltage of all supplies.
std::int64_t mains_margin_um(const Requirement& requirement);

/// Board area of a design in square micrometres: sum of count·(L + 2m)(W + 2m). Integer sums. Absent: a
/// placed part has no size.
std::optional<std::int64_t> board_area_um2(const Design& design, const Requirement& requirement);

}  // namespace dropfront::scoring
