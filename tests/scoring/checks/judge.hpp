// One check on one example, from fresh evidence.
#pragma once
#include <optional>

#include "dropfront/scoring/checks/checks.hpp"
#include "scoring/support/example.hpp"

namespace dropfront::scoring::test {

inline std::optional<Check> judge(Example& example, CheckFunction* check) {
  Evidence evidence(example.design(), example.requirement, example.supply());
  return check(evidence);
}

inline double value_of(Example& example, CheckFunction* check) {
  return judge(example, check).value().value.value();
}

/// A step-down stage for a 12 V clamp.
inline void step_down(Example& example) {
  example.linear(5, 0.03, 0, 60e-6);
  example.stage.kind = parts::StageKind::step_down;
  example.stage.input_min_V = 8;
  example.stage.input_on_V = 10;
  example.stage.efficiency = 0.84;
  example.stage.thermal_resistance_K_per_W = 110;
  example.stage.max_junction_degC = 150;
}

}  // namespace dropfront::scoring::test
