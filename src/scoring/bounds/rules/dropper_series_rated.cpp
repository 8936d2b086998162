#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Broken (2) where it is asked and no dropper of the list is. Theorem.
double dropper_series_rated(const BoxQuestion& question) {
  if (!question.context.requirement->limits.series_rated) return 0;
  return question.least_share(question.box.droppers, [&](const parts::Dropper* part) {
    return part != nullptr && !part->series_rated ? 2.0 : 0.0;
  });
}

}  // namespace dropfront::scoring::bounds
