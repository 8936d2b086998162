#pragma once
#include <string_view>
#include <vector>

#include "dropfront/circuit/element_values.hpp"
#include "dropfront/circuit/network.hpp"

namespace dropfront::circuit {

/// How the discharge, clamp and rectifier parts are wired. One small file each in circuit/arrangements/.
struct Arrangement {
  std::string_view name;  ///< as in problem files
  bool full_wave = false;
  bool clamp_ahead = false;  ///< clamp ahead of the series diode (dropper side), else across the reservoir
  int clamp_count = 1;
  int rectifier_count = 1;
  Network (*build)(const ElementValues&) = nullptr;
  bool thyristor_shunt = false;  ///< needs thyristor and gate resistor; the clamp is the trigger zener
  bool dropper = true;           ///< false: the series resistor alone drops the line, no discharge chain
};

/// All arrangements in their fixed order; a design names one by its address.
const std::vector<Arrangement>& arrangements();

/// By name; null if there is none.
const Arrangement* find_arrangement(std::string_view name);

}  // namespace dropfront::circuit
