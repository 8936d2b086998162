#pragma once
#include <string>
#include <vector>

#include "dropfront/circuit/network.hpp"

namespace dropfront::report {

/// How a piecewise-linear branch is written.
enum class BranchForm {
  smooth,  ///< near-ideal junction (IS 1 nA, N 0.02, CJO 20 pF) with RS = slope, in series with the threshold
  piecewise  ///< the exact curve, as a behavioural current source
};

struct DeckOptions {
  BranchForm branches = BranchForm::smooth;
  std::vector<double> initial_V;  ///< one a capacitor of the network; missing ones start at 0 V
  double start_time_s = 0;        ///< mains time at which the run begins (0: rising zero of the fundamental)
  double run_periods = 100;       ///< length of the run
  double measured_periods = 2;    ///< the .measure lines look at the last of them; at most run_periods
  double max_step_periods = 1e-3;
  double relative_tolerance = 1e-4;
  bool measure_energies = false;   ///< adds energy_r<n> of each resistor and energy_d<n> of each branch
  std::vector<std::string> notes;  ///< comment lines after the caution
};

/// A deck in SPICE3 syntax, complete with run and .measure lines: `ngspice -b FILE` prints rail_min,
/// rail_mean, rail_max (V), input_power (W), input_current (A r.m.s.) over the last periods, and
/// rail_min_before, the rail minimum over as many periods just ahead of them: equal when the run has settled
/// (absent in runs too short). Pure: same arguments, same bytes. Elements are numbered from 1 in the
/// network's order: R, C, D (smooth) or B (piecewise); node k of the network is n<k>, the neutral 0.
///
/// Smooth junction: v = threshold + slope·i + n·Vt·ln(i / 1 mA), n·Vt = 0.52 mV at 27 °C; its 7 mV at 1 mA
/// are taken off the threshold, so it lies within 4 mV of the piecewise-linear curve between 1 uA and 1 A.
/// Valid: slopes > 0, resistances > 0 (an infinite one is left out). The load's cut-off needs cutoff_V > 0,
/// else the current is constant at any voltage.
std::string make_deck(const circuit::Network& network, const std::string& title,
                      const DeckOptions& options = {});

}  // namespace dropfront::report
