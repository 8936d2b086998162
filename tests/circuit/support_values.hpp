#pragma once
#include <cmath>
#include <limits>
#include <numbers>
#include <vector>

#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/circuit/element_values.hpp"

namespace dropfront::circuit {

/// All arrangements but the resistive yardstick, whose values lie elsewhere.
inline const std::vector<Arrangement>& dropping() {
  static const std::vector<Arrangement> all = [] {
    std::vector<Arrangement> kept;
    for (const auto& arrangement : arrangements()) {
      if (arrangement.dropper) kept.push_back(arrangement);
    }
    return kept;
  }();
  return all;
}

/// A plain, ordinary supply: 230 V, 50 Hz, 0.68 uF, 47 ohm, 12 V clamp, 220 uF.
inline ElementValues ordinary_values() {
  ElementValues v;
  v.mains = Waveform(230, 50);
  v.series_resistor_ohm = 47;
  v.dropper_F = 0.68e-6;
  v.dropper_esr_ohm = 0.001 / (2 * std::numbers::pi * 50 * v.dropper_F);
  v.discharge_ohm = 1e6;
  v.rectifier = {0.67, 0.67};
  v.clamp.main = {12 - 9 * 0.021, 9};
  v.reservoir_F = 220e-6;
  v.reservoir_esr_ohm = 0.8;
  v.thyristor = {0.9, 0.1};
  v.thyristor_holding_A = 5e-3;
  v.thyristor_trigger_A = 0.2e-3;
  v.gate_resistor_ohm = 1000;
  v.rail_current_A = 5e-3;
  v.load_cutoff_V = 4;
  return v;
}

inline const Arrangement& resistive() { return *find_arrangement("resistive"); }

/// 230 V behind 33 kohm: some 3 mA for a 12 V rail.
inline ElementValues yardstick_values() {
  ElementValues v = ordinary_values();
  v.series_resistor_ohm = 33e3;
  v.dropper_F = 0;
  v.dropper_esr_ohm = 0;
  v.discharge_ohm = std::numeric_limits<double>::infinity();
  v.rail_current_A = 1e-3;
  return v;
}

}  // namespace dropfront::circuit
