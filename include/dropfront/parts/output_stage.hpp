#pragma once
#include "dropfront/parts/part_info.hpp"

namespace dropfront::parts {

enum class StageKind { direct, linear, step_down };

/// What stands between rail and output.
struct OutputStage {
  PartInfo info;
  StageKind kind = StageKind::direct;
  double output_voltage_V = 0;
  double tolerance = 0;
  double dropout_V = 0;                    ///< default: linear 2 V, else 0
  double quiescent_current_A = 0;          ///< default: linear 6 mA, step-down 1 mA, direct 0
  double quiescent_current_dropout_A = 0;  ///< default: quiescent_current_A
  Rating input_max_V;
  Rating input_min_V;  ///< step-down: required
  Rating input_on_V;   ///< turn-on threshold
  Rating input_off_V;
  Rating efficiency;  ///< step-down: required; fraction
  Rating thermal_resistance_K_per_W;
  Rating max_junction_degC;  ///< default 150 degC
};

}  // namespace dropfront::parts
