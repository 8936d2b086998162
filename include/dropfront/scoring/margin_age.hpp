#pragma once
#include <optional>

#include "dropfront/scoring/evidence.hpp"

namespace dropfront::scoring {

/// How far past the stated life the straight ageing law is followed: to twice the life, no further.
inline constexpr double kHorizonLives = 2;

/// Age at which the margin is gone.
struct MarginAge {
  bool known = false;          ///< the margin could be worked out at every age looked at
  std::optional<double> year;  ///< 0: gone when new; absent while known: not within the horizon
};

/// Finds the age at which the lean corner's margin at the output reaches zero, by a bracketed secant over
/// whole lean searches, to a hundredth of a year. Law: film and electrolytic capacitance lose, and the
/// electrolytic's ESR gains, in proportion to time, from new to the end-of-life values at the stated life,
/// and on to the horizon. The margin falls with age: every aged end only gets worse.
MarginAge margin_zero_age(Evidence& evidence);

}  // namespace dropfront::scoring
