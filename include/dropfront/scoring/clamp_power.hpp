#pragma once
#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/circuit/element_values.hpp"
#include "dropfront/circuit/steady_state.hpp"

namespace dropfront::scoring {

/// Greatest mean rail current the clamp can see, by charge balance: half-wave f·C·(rises - Vo - 2·Vf), bridge
/// 2·f·C·(rises - 2·Vo - 4·Vf); never below 0. `rail_V` is Vo.
double charge_balance_A(const circuit::Arrangement& arrangement, const circuit::ElementValues& values,
                        double rail_V);

/// Mean power in one clamp part, its forward direction included.
double clamp_power_W(const circuit::Arrangement& arrangement, const circuit::ElementValues& values,
                     const circuit::SteadyState& state);

}  // namespace dropfront::scoring
