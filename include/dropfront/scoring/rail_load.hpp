#pragma once
#include "dropfront/circuit/element_values.hpp"
#include "dropfront/parts/output_stage.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring {

/// What hangs on the rail in a run: it follows the rail by the stage's own law, where a steady state takes
/// the current at its trough.
struct RailLoad {
  double current_A = 0;  ///< constant: the whole load, or of a step-down stage all but its power
  double power_W = 0;    ///< constant power, of a step-down stage only: V_out·(1 + tol)·I_out/eta
};

/// Load of `output_A` at the output with `beside_A` (leakage, rail loads) and the stage's quiescent current.
RailLoad rail_load(const parts::OutputStage& stage, double output_A, double beside_A, Quiescent quiescent);

/// Puts the load into values. A constant-power load falls off in proportion to the rail below input_off,
/// where the stage has cut out, or below half of `required_V` where that is not given.
void hang(const RailLoad& load, const parts::OutputStage& stage, double required_V,
          circuit::ElementValues& values);

}  // namespace dropfront::scoring
