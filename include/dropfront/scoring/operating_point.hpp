#pragma once
#include <string>

#include "dropfront/circuit/element_values.hpp"
#include "dropfront/circuit/steady_state.hpp"

namespace dropfront::scoring {

/// One solved operating point and what it was solved with. Check `state.usable()` first.
struct OperatingPoint {
  std::string corner;
  double ambient_degC = 25;  ///< outside the enclosure
  double local_degC = 25;    ///< ambient + enclosure x input power
  std::string ends;
  std::string load;           ///< name for people
  double load_current_A = 0;  ///< at the output
  double rail_current_A = 0;  ///< adds Iq, leakage and rail loads
  circuit::ElementValues values;
  circuit::SteadyState state;
  double clamp_junction_degC = 25;  ///< of one clamp part
  /// Rail maximum with no drop in the diodes between a clamp ahead and the rail: what rail.max compares.
  double rail_greatest_V = 0;
};

}  // namespace dropfront::scoring
