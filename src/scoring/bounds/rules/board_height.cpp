#include "dropfront/scoring/bounds/placed.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// The tallest part of a member is at least as tall as the least tall entry of any one list. A height not
/// given counts nothing. Theorem.
double board_height(const BoxQuestion& question) {
  constexpr double kMicrometresPerMillimetre = 1000;
  const auto& allowed_mm = question.context.requirement->surroundings.max_height_mm;
  if (!allowed_mm) return 0;
  std::int64_t tallest_um = 0;
  for_each_slot(question, [&](const auto& list, int, bool) {
    const double least_um = question.least_over(list, [](const auto& entry) {
      const auto placed = placed_of(entry);
      return placed.count > 0 ? static_cast<double>(placed.info->height_um.value_or(0)) : 0.0;
    });
    tallest_um = std::max(tallest_um, static_cast<std::int64_t>(least_um));
  });
  return static_cast<double>(tallest_um) / kMicrometresPerMillimetre / *allowed_mm;
}

}  // namespace dropfront::scoring::bounds
