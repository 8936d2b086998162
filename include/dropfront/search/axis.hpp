#pragma once
#include <vector>

#include "dropfront/search/space.hpp"

namespace dropfront::search {

/// A slot's options along its continuous axis: the distinct coordinates in ascending order, scaled to [0, 1]
/// (all 0 when there is but one), and the options at each.
struct Axis {
  int slot = 0;
  std::vector<double> position;           ///< distinct, ascending
  std::vector<std::vector<int>> options;  ///< at each position, ascending
  std::vector<int> step_of;               ///< option -> index into `position`
  std::vector<double> position_of;        ///< option -> position

  /// Indices of the distinct positions on both sides of x (one of them alone beyond the ends or on a hit);
  /// first: the nearest.
  std::vector<int> around(double x) const;
};

/// One axis for each slot with coordinates, in slot order: the entries of Evaluator::relaxed's position.
std::vector<Axis> axes_of(const Space& space);

/// Slots that are categories, in slot order.
std::vector<int> category_slots(const Space& space);

}  // namespace dropfront::search
