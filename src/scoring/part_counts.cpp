#include "dropfront/scoring/part_counts.hpp"

namespace dropfront::scoring {

namespace {

template <typename Part>
void add(std::vector<PlacedPart>& placed, const Part* part, int count, bool mains_side) {
  if (part != nullptr && count > 0) placed.push_back({&part->info, count, mains_side});
}

}  // namespace

std::vector<PlacedPart> placed_parts(const Design& design) {
  std::vector<PlacedPart> placed;
  placed.reserve(11);
  const bool placed_stage =
      design.output_stage != nullptr && design.output_stage->kind != parts::StageKind::direct;
  const auto* wiring = design.arrangement;
  add(placed, placed_stage ? design.output_stage : nullptr, 1, false);
  add(placed, design.dropper, design.dropper_count, true);
  add(placed, design.series_resistor, design.series_resistor_count, true);
  add(placed, design.clamp, wiring != nullptr ? wiring->clamp_count : 1, false);
  add(placed, design.reservoir, 1, false);
  add(placed, design.discharge, design.discharge_count, true);
  add(placed, design.rectifier, wiring != nullptr ? wiring->rectifier_count : 1, false);
  add(placed, design.varistor, 1, true);
  add(placed, design.fuse, 1, true);
  add(placed, design.ceramic, 1, false);
  add(placed, design.thyristor, 1, false);
  add(placed, design.gate_resistor, 1, false);
  return placed;
}

}  // namespace dropfront::scoring
