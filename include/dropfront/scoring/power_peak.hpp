#pragma once
#include <functional>

namespace dropfront::scoring {

/// Where a function of one variable is greatest.
struct Peak {
  double x = 0;
  double value = 0;
};

/// Greatest of a unimodal f on [low, high] by golden section with parabolic steps; stops when the bracket is
/// shorter than `tolerance` or after `most_calls` calls. The value is one f returned, so it
/// never exceeds the true maximum. The ends are tried too.
Peak find_peak(const std::function<double(double)>& f, double low, double high, double tolerance,
               int most_calls);

}  // namespace dropfront::scoring
