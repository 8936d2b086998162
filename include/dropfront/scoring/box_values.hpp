#pragma once
#include <optional>

#include "dropfront/scoring/operating_point.hpp"
#include "dropfront/scoring/tolerance_box.hpp"

namespace dropfront::scoring {

/// A quantity of a solved point (all but the margin). Absent: no steady state.
std::optional<double> box_value(BoxQuantity quantity, const Design& design, const Supply& supply,
                                const OperatingPoint& point);

}  // namespace dropfront::scoring
