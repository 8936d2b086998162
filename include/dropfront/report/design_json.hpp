#pragma once
#include "dropfront/report/json_writer.hpp"
#include "dropfront/scoring/score.hpp"

namespace dropfront::report {

/// A complete design file, every number inline: reading it back gives the same design, bit for bit.
void write_design(JsonWriter& json, const scoring::Design& design);

/// The four objectives: cost (currency), standby_loss_W, board_area_mm2, current_margin_A; null where
/// unknown.
void write_objectives(JsonWriter& json, const scoring::Objectives& objectives);

}  // namespace dropfront::report
