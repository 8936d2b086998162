#pragma once
#include "dropfront/circuit/arrangement.hpp"
#include "dropfront/parts/catalogue.hpp"

namespace dropfront::scoring {

/// One candidate: an arrangement and one part a slot. Pointers into a catalogue that outlives it; null where
/// the slot is empty (allowed for discharge, varistor, fuse, ceramic, thyristor, gate_resistor only).
struct Design {
  const circuit::Arrangement* arrangement = nullptr;
  const parts::Dropper* dropper = nullptr;
  int dropper_count = 1;  ///< equal parts in parallel, >= 1
  const parts::Resistor* series_resistor = nullptr;
  int series_resistor_count = 1;  ///< equal parts in series, >= 1
  const parts::Clamp* clamp = nullptr;
  const parts::Reservoir* reservoir = nullptr;
  const parts::Rectifier* rectifier = nullptr;
  const parts::OutputStage* output_stage = nullptr;
  const parts::Resistor* discharge = nullptr;  ///< one element of the chain
  int discharge_count = 0;                     ///< elements in series
  const parts::Varistor* varistor = nullptr;
  bool varistor_before = true;  ///< on the line side of the series resistor, else behind it
  const parts::Fuse* fuse = nullptr;
  const parts::Ceramic* ceramic = nullptr;
  const parts::Thyristor* thyristor = nullptr;
  const parts::Resistor* gate_resistor = nullptr;
};

}  // namespace dropfront::scoring
