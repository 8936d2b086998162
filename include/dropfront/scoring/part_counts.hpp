#pragma once
#include <vector>

#include "dropfront/parts/part_info.hpp"
#include "dropfront/scoring/design.hpp"

namespace dropfront::scoring {

/// One line of a design's bill of materials.
struct PlacedPart {
  const parts::PartInfo* info = nullptr;
  int count = 0;
  bool mains_side = false;  ///< fuse, varistor, series resistor, dropper, discharge: kept a creepage apart
};

/// What a design places on the board, in slot order. Clamps and rectifiers are counted by arrangement; a
/// direct output stage places nothing.
std::vector<PlacedPart> placed_parts(const Design& design);

}  // namespace dropfront::scoring
