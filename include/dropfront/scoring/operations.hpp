#pragma once
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/score.hpp"

namespace dropfront::scoring {

/// The rows of `operation` on one supply, available currents included: nominal, lean_cold, lean_hot,
/// rich_empty, rich_loaded, standby, standby_worst.
SupplyOperations operations_of(Evidence& evidence);

}  // namespace dropfront::scoring
