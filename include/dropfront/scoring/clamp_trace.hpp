#pragma once
#include <vector>

#include "dropfront/circuit/element_values.hpp"
#include "dropfront/circuit/network.hpp"
#include "dropfront/circuit/pulse.hpp"
#include "dropfront/circuit/transient.hpp"

namespace dropfront::scoring {

/// Shorter spikes than this count as that long in a clamp: published surge curves of zeners follow t^(-1/2)
/// down to about 10 us and stop there (from memory).
inline constexpr double kShortestClampPulse_s = 10e-6;

/// Gathers the power in one clamp part along a run, as stretches of constant power: an observer's helper.
/// Neighbouring samples are joined while they last no longer than a small share of the run's length before
/// them, so that the trace stays short and its front fine.
class ClampTrace {
 public:
  /// Which of two zeners back to back: the one in breakdown as current flows `there` (the way of the
  /// network's first clamp branch) or `back`. `either` takes a pulse that goes one way only, whichever it is.
  enum class Way { either, there, back };
  /// `forward`: set where two zeners stand back to back, whose branches hold both.
  ClampTrace(const circuit::Network& network, const circuit::Curve* forward, Way way = Way::either);
  void add(const circuit::Moment& moment);
  /// The trace so far; the last stretch closed.
  std::vector<circuit::PowerStep> take();

 private:
  const circuit::Curve* forward_;
  std::vector<signed char>
      part_;  ///< per branch: 1 this part in breakdown, -1 in its forward direction, 0 none
  std::vector<circuit::PowerStep> steps_;
  circuit::PowerStep open_;
  double energy_J_ = 0;
  double elapsed_s_ = 0;
};

}  // namespace dropfront::scoring
