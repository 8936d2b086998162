#include "dropfront/scoring/check.hpp"

namespace dropfront::scoring {

std::optional<double> Check::headroom() const {
  if (!value || !limit || *limit == 0) return std::nullopt;
  const double share = *value / *limit;
  return at_most ? 1 - share : share - 1;
}

}  // namespace dropfront::scoring
