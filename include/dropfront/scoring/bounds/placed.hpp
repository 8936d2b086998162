#pragma once
#include <algorithm>
#include <cstdint>

#include "dropfront/scoring/bounds/box_question.hpp"

namespace dropfront::scoring::bounds {

/// What one entry of a list places on the board, the arrangement's count left out.
struct Placed {
  const parts::PartInfo* info = nullptr;
  int count = 0;
};

template <class Part>
Placed placed_of(const Part* part) {
  return part == nullptr ? Placed{} : Placed{&part->info, 1};
}
inline Placed placed_of(const parts::OutputStage* stage) {
  if (stage == nullptr || stage->kind == parts::StageKind::direct) return {};
  return {&stage->info, 1};
}
inline Placed placed_of(const Chain& chain) {
  if (chain.element == nullptr || chain.count <= 0) return {};
  return {&chain.element->info, chain.count};
}

/// Visits every list with the arrangement's part count and whether the slot is on the mains side, as
/// scoring::placed_parts counts them.
template <class Visit>
void for_each_slot(const BoxQuestion& question, Visit visit) {
  const auto& box = question.box;
  visit(box.output_stages, 1, false);
  visit(box.droppers, 1, true);
  visit(box.series_resistors, 1, true);
  visit(box.clamps, box.arrangement->clamp_count, false);
  visit(box.reservoirs, 1, false);
  visit(box.discharges, 1, true);
  visit(box.rectifiers, box.arrangement->rectifier_count, false);
  visit(box.varistors, 1, true);
  visit(box.fuses, 1, true);
  visit(box.ceramics, 1, false);
  visit(box.thyristors, 1, false);
  visit(box.gate_resistors, 1, false);
}

/// Sum over the slots of the least count·each(info, mains side) an entry of the list places. Whole numbers
/// below 2^53: exact in a double.
template <class Each>
double least_placed(const BoxQuestion& question, Each each) {
  double sum = 0;
  for_each_slot(question, [&](const auto& list, int count, bool mains_side) {
    if (list.empty()) return;
    sum += count * question.least_over(list, [&](const auto& entry) {
      const auto placed = placed_of(entry);
      if (placed.count == 0) return 0.0;
      return static_cast<double>(placed.count * each(*placed.info, mains_side));
    });
  });
  return sum;
}

}  // namespace dropfront::scoring::bounds
