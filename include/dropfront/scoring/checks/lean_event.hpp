#pragma once
#include <string>

#include "dropfront/scoring/check.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/lean_runs.hpp"

namespace dropfront::scoring {

/// Where an event or a start in the lean corner was at its worst: ambient, phase and the values it began
/// with.
At at_run(Evidence& evidence, double ambient_degC, const std::string& ends, double phase_deg,
          const circuit::ElementValues& values, double local_degC, double clamp_junction_degC,
          const std::string& load);

/// The same of an event.
At at_event(Evidence& evidence, const EventAnswer& worst, const std::string& load);

}  // namespace dropfront::scoring
