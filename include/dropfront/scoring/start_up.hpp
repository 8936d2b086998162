#pragma once
#include <string>

#include "dropfront/circuit/start_up.hpp"
#include "dropfront/scoring/lean_runs.hpp"

namespace dropfront::scoring {

/// How long the rail takes, at worst, from switching on with all capacitors empty.
struct StartUpAnswer {
  bool usable = false;
  std::string reason;
  circuit::StartUp::Start start;
  double ambient_degC = 25;
  std::string ends;
  circuit::ElementValues values;
  double local_degC = 25;
  double clamp_junction_degC = 25;
};

/// Starts in the lean corner with the reservoir at its greatest (the start lengthens with it), at the ends
/// that decide the available current; the other ambient at the worst phase of the deciding one. At the low
/// ambient nothing is warm yet, at the high one everything is as warm as the heaviest load leaves it. Linear
/// and direct stages draw the start load, their current in dropout, leakage and rail loads as the rail allows
/// (in proportion below half of V_required); a step-down stage draws its start power from input_on on, and is
/// off again below input_off. `beside_A`: all but the start load. Given up after `give_up_s`.
StartUpAnswer try_start(const LeanRuns& runs, double beside_A, double give_up_s);

}  // namespace dropfront::scoring
