#pragma once
#include <vector>

#include "dropfront/circuit/element_values.hpp"
#include "dropfront/circuit/network.hpp"
#include "dropfront/circuit/pulse.hpp"
#include "dropfront/circuit/transient.hpp"

namespace dropfront::scoring {

/// Gathers the power in one clamp part along a run, as stretches of constant power: an observer's helper.
/// Neighbouring samples are joined while they last no longer than a small share of the run's length before
/// them, so that the trace stays short and its front fine.
class ClampTrace {
 public:
  /// `forward`: set where two zeners stand back to back, whose branches hold both.
  ClampTrace(const circuit::Network& network, const circuit::Curve* forward);
  void add(const circuit::Moment& moment);
  /// The trace so far; the last stretch closed.
  std::vector<circuit::PowerStep> take();

 private:
  const circuit::Network* network_;
  const circuit::Curve* forward_;
  std::vector<circuit::PowerStep> steps_;
  circuit::PowerStep open_;
  double energy_J_ = 0;
  double elapsed_s_ = 0;
};

}  // namespace dropfront::scoring
