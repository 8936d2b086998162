#pragma once
#include <optional>

namespace dropfront::scoring {

/// Finds the rise x at which the power solved for implies x again. Plain substitution is tried first and is
/// enough while the implied rise hardly moves; where it runs away from side to side (a clamp in its knee
/// warms as the load it leaves falls) the two sides bracket the answer and a safeguarded secant closes in.
class SettledRise {
 public:
  explicit SettledRise(double tolerance_K) : tolerance_K_(tolerance_K) {}

  /// Takes one pair (used, implied) and returns what to use next.
  double next(double used_K, double implied_K);
  /// Whether the last pair agreed within the tolerance.
  bool done() const { return done_; }

 private:
  struct Side {
    double used_K, excess_K;  ///< excess: implied less used
  };
  double tolerance_K_;
  bool done_ = false;
  std::optional<Side> below_, above_;  ///< implied above used; implied below used
  int same_side_ = 0;
};

}  // namespace dropfront::scoring
