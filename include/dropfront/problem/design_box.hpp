#pragma once
#include "dropfront/problem/slot_space.hpp"
#include "dropfront/scoring/bounds/box.hpp"
#include "dropfront/search/box.hpp"

namespace dropfront::problem {

/// The parts that a box's options stand for. The box must hold one arrangement.
scoring::DesignBox design_box(const Offers& offers, const std::vector<SlotId>& ids, const search::Box& box);

/// Drops the options whose parts are no longer in `left`, whose lists must be those of design_box(box) with
/// entries taken out and none moved.
void keep_parts(const Offers& offers, const std::vector<SlotId>& ids, const scoring::DesignBox& left,
                search::Box& box);

}  // namespace dropfront::problem
