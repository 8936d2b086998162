#pragma once
#include <optional>
#include <string>
#include <vector>

#include "dropfront/parts/protection.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::problem {

/// Words for the side of the series resistor a varistor stands on; the first is the line's.
inline const std::vector<std::string> kVaristorPlaces{"before", "after"};

/// Why a varistor cannot stand on these supplies: its clamping voltage is not above the crest of the highest
/// line, so that the mains alone would drive it. Absent: it can, or its clamping voltage is not given.
std::optional<std::string> low_varistor(const parts::Varistor& part, const scoring::Requirement& requirement);

}  // namespace dropfront::problem
