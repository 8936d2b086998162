#pragma once
#include <string>

#include "dropfront/circuit/element_values.hpp"

namespace dropfront::scoring {

/// The lean corner's answer: the least over both ambients and both ends of series resistor, ESR and discharge
/// chain. Currents are rail currents unless they say 'at the output'.
struct LeanAnswer {
  bool usable = false;
  std::string reason;
  bool hot_decides = false;
  double ambient_degC = 0;        ///< that decides
  std::string ends;               ///< that decide
  circuit::ElementValues values;  ///< there, at the load of the greatest output
  double local_degC = 25;
  double clamp_junction_degC = 25;
  double available_A = 0;  ///< largest constant rail load with rail minimum >= V_required, Iq included
  /// Greatest sustained output current. Step-down: by the power law; else available less Iq, leakage, rail
  /// loads.
  double capability_A = 0;
  double margin_A = 0;  ///< at the output: capability less the heaviest sustained load and the mean of bursts
};

}  // namespace dropfront::scoring
