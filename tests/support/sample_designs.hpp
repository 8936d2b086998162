#pragma once
#include <string>
#include <vector>

#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/circuit/element_values.hpp"

namespace dropfront::support {

/// A supply to compare engine and simulator on, and what it is in the sample for.
struct SampleDesign {
  std::string purpose;
  const circuit::Arrangement* arrangement = nullptr;
  circuit::ElementValues values;
  double run_periods = 24;  ///< long enough that a rail off its steady state by 0.2 V would be seen to move
};

/// The deterministic sample for one arrangement: the corners of practice by hand (light load with a big
/// reservoir, low headroom, a rail pulled below its clamp, a 5.1 V clamp with its knee, harmonics, 120 V / 60
/// Hz and 230 V / 50 Hz, 22 to 470 ohm). Values are inventions of ours.
std::vector<SampleDesign> sample_designs(const circuit::Arrangement& arrangement);

}  // namespace dropfront::support
