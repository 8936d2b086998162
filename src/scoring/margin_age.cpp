#include "dropfront/scoring/margin_age.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::scoring {

namespace {

constexpr double kTolerance_years = 0.01;
constexpr int kMostSteps = 24;

/// An age in lives and the margin there.
struct Aged {
  double age = 0;
  double margin_A = 0;
};

}  // namespace

MarginAge margin_zero_age(Evidence& evidence) {
  const double life_years = evidence.requirement().surroundings.life_years;
  const auto at = [&](double age) -> std::optional<Aged> {
    const auto margin = evidence.margin_at_A(age);
    if (!margin || !std::isfinite(*margin)) return std::nullopt;
    return Aged{age, *margin};
  };
  auto young = at(0);
  if (!young) return {};
  if (!(young->margin_A > 0)) return {true, 0.0};
  auto old = at(1);
  if (old && old->margin_A > 0) {
    young = old;
    old = at(kHorizonLives);
  }
  if (!old) return {};
  if (old->margin_A > 0) return {true, std::nullopt};
  // Illinois rule: an end that stays twice running counts half, so that both close in.
  double young_weight = young->margin_A, old_weight = old->margin_A;
  int side = 0;
  for (int step = 0; step < kMostSteps && (old->age - young->age) * life_years > kTolerance_years; ++step) {
    const double width = old->age - young->age;
    const double secant = young->age + width * young_weight / (young_weight - old_weight);
    // Not at the ends themselves: a step of a third of the tolerance closes the bracket from both sides.
    const double least = std::min(kTolerance_years / (3 * life_years), width / 3);
    const auto tried = at(std::clamp(secant, young->age + least, old->age - least));
    if (!tried) return {};
    if (tried->margin_A > 0) {
      young = tried;
      young_weight = tried->margin_A;
      if (side > 0) old_weight *= 0.5;
      side = 1;
    } else {
      old = tried;
      old_weight = tried->margin_A;
      if (side < 0) young_weight *= 0.5;
      side = -1;
    }
  }
  return {true, 0.5 * (young->age + old->age) * life_years};
}

}  // namespace dropfront::scoring
