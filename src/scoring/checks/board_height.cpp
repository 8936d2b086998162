#include <algorithm>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/part_counts.hpp"

namespace dropfront::scoring {
namespace {

constexpr double kMicrometresPerMillimetre = 1000;

}  // namespace

std::optional<Check> board_height(Evidence& evidence) {
  const auto& allowed = evidence.requirement().surroundings.max_height_mm;
  if (!allowed) return std::nullopt;
  double tallest_mm = 0;
  std::string missing, tallest;
  for (const PlacedPart& placed : placed_parts(evidence.design())) {
    const parts::PartInfo* part = placed.info;
    if (!part->height_um) {
      missing = part->name;
    } else if (const double height = static_cast<double>(*part->height_um) / kMicrometresPerMillimetre;
               height > tallest_mm) {
      tallest_mm = height;
      tallest = part->name;
    }
  }
  std::vector<std::optional<double>> limits{*allowed};
  if (!missing.empty()) limits.push_back(std::nullopt);
  return with(
      at_most_each("board.height", tallest_mm, limits, "mm", at_corner(""),
                   missing.empty() ? "tallest part: " + tallest : "height_mm is not given: " + missing),
      {{"max_height_mm", *allowed}});
}

}  // namespace dropfront::scoring
