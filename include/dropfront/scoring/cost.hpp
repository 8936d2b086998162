#pragma once
#include <cstdint>
#include <optional>

#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// Cost of a design in millionths of the currency: sum of count·(price at the volume + placement cost).
/// Integer sums, so the order of addition does not matter. Absent: a placed part has no price.
std::optional<std::int64_t> cost_micro(const Design& design, const Requirement& requirement);

}  // namespace dropfront::scoring
