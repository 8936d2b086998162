#pragma once
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::problem {

/// Closed-form stresses at the supply's high ends, good enough to choose between parts of one value for a
/// relaxed design (the engine scores every real one). All supplies: the greatest.
/// Source: physics of a reactance-limited current, I = V·2·pi·f·C for omega·R·C well below 1.
class Stress {
 public:
  explicit Stress(const scoring::Requirement& requirement);

  double line_Vrms() const { return line_Vrms_; }
  double line_peak_V() const;
  /// Dropper current of `capacitance_F`, A r.m.s.
  double current_Arms(double capacitance_F) const;
  /// Power in the series resistor, W.
  double resistor_W(double capacitance_F, double resistance_ohm) const;
  /// Power in an unloaded clamp, W: V·f·C·2·Vpk half-wave, V·4·f·C·(Vpk - V) full-wave.
  double clamp_W(double capacitance_F, double clamp_V, bool full_wave) const;

 private:
  double line_Vrms_ = 0;
  double volts_times_hertz_ = 0;  ///< greatest V·f over the supplies
};

}  // namespace dropfront::problem
