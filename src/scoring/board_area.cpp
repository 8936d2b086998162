#include "dropfront/scoring/board_area.hpp"

#include <algorithm>

#include "dropfront/scoring/creepage.hpp"
#include "dropfront/scoring/part_counts.hpp"

namespace dropfront::scoring {

std::int64_t mains_margin_um(const Requirement& requirement) {
  double highest_Vrms = 0;
  for (const auto& supply : requirement.supplies) {
    highest_Vrms = std::max(highest_Vrms, supply.voltage_Vrms.high);
  }
  const auto& around = requirement.surroundings;
  const auto creepage = creepage_um(highest_Vrms, around.pollution_degree, around.material_group);
  return std::max(kBoardMargin_um, (creepage + 1) / 2);
}

std::optional<std::int64_t> board_area_um2(const Design& design, const Requirement& requirement) {
  const auto mains_um = mains_margin_um(requirement);
  std::int64_t sum = 0;
  for (const auto& part : placed_parts(design)) {
    if (!part.info->length_um || !part.info->width_um) return std::nullopt;
    const auto around_um = 2 * (part.mains_side ? mains_um : kBoardMargin_um);
    sum += part.count * (*part.info->length_um + around_um) * (*part.info->width_um + around_um);
  }
  return sum;
}

}  // namespace dropfront::scoring
