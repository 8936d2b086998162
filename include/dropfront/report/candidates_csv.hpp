#pragma once
#include <string>

#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// candidates.csv: one row a design, the front first, then ranked designs off it.
/// number, on_front, one column a slot (part names; discharge_count beside discharge), cost_<currency>,
/// standby_loss_W, board_area_mm2, current_margin_A, tightest_check, tightest_headroom; with several supplies
/// tightest_supply, standby_supply, margin_supply.
std::string candidates_csv(const Result& result);

/// bom.csv: the parts to buy for the first design of each ranked set.
/// set, number, slot, part, value, quantity, unit_price_<currency>, price_<currency>, length_mm, width_mm,
/// height_mm, source. Prices at the problem's volume, placement not included.
std::string bom_csv(const Result& result);

}  // namespace dropfront::report
