#include "dropfront/scoring/fast_burst.hpp"

#include <fmt/format.h>

#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

FastBurst fast_burst(double level_V, double series_ohm) {
  constexpr double kGenerator_ohm = 50, kPulse_s = 50e-9, kPulses = 75, kEvery_s = 0.3;
  const double current_A = level_V / (kGenerator_ohm + series_ohm);
  FastBurst burst;
  burst.pulse_J = current_A * current_A * series_ohm * kPulse_s;
  burst.burst_J = kPulses * burst.pulse_J;
  burst.mean_W = burst.burst_J / kEvery_s;
  return burst;
}

std::string fast_burst_caution(double level_V, const Design& design) {
  const FastBurst burst = fast_burst(level_V, series_resistor_ohm(design, End::nominal));
  return fmt::format(
      "fast bursts of {:.0f} V (IEC 61000-4-4): about {:.2g} mJ a burst and {:.2g} mW on average in the "
      "series "
      "resistor; an energy estimate, not a check",
      level_V, 1e3 * burst.burst_J, 1e3 * burst.mean_W);
}

}  // namespace dropfront::scoring
