#pragma once
#include <string_view>
#include <vector>

#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring {

/// One bound: what it bounds, how it is known, where it holds. Exactly one of the two functions is set.
struct BoundRule {
  std::string_view id;  ///< a check id, or the objective: cost, board_area, current_margin, standby_loss
  BoundClass bound_class = BoundClass::theorem;
  /// 0: nothing is solved; 1: up to four steady states; 2: rich corners and plug-ins; 3: available currents.
  int depth = 0;
  std::string_view range;  ///< where it says something; elsewhere it says nothing
  bounds::ObjectiveBound* objective = nullptr;
  bounds::LimitBound* limit = nullptr;
};

/// All bounds, cheap ones first.
const std::vector<BoundRule>& bound_table();

}  // namespace dropfront::scoring
