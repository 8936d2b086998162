#pragma once

namespace dropfront::values {

/// A quantity with its two ends. Any unit; the field's name carries it. Valid: low <= nominal <= high.
struct Spread {
  double low = 0;
  double nominal = 0;
  double high = 0;
};

/// nominal·(1 ∓ share): the spread a symmetric tolerance gives. `share` is a fraction (5 % is 0.05).
constexpr Spread within(double nominal, double share) {
  return {nominal * (1 - share), nominal, nominal * (1 + share)};
}

}  // namespace dropfront::values
