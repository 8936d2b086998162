#include "dropfront/scoring/cost.hpp"

#include "dropfront/scoring/part_counts.hpp"

namespace dropfront::scoring {

std::optional<std::int64_t> cost_micro(const Design& design, const Requirement& requirement) {
  std::int64_t sum = 0;
  for (const auto& part : placed_parts(design)) {
    const auto price = parts::price_micro_at(*part.info, requirement.volume);
    if (!price) return std::nullopt;
    sum += part.count * (*price + requirement.placement_cost_micro);
  }
  return sum;
}

}  // namespace dropfront::scoring
