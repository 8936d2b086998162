#pragma once
#include <vector>

namespace dropfront::circuit {

inline constexpr int kMostTones = 24;  ///< fundamental included

/// One harmonic relative to the fundamental: v adds share·V1·sqrt2·sin(order·wt + phase).
struct Harmonic {
  int order = 3;
  double share = 0;  ///< fraction of the fundamental, >= 0
  double phase_rad = 0;
};

/// The mains: v(t) = sqrt2·V1·[sin wt + sum p_k sin(k wt + phi_k)]. The total r.m.s. is given, V1 follows:
/// V1 = V / sqrt(1 + sum p_k^2). Valid: voltage > 0, frequency > 0, distinct orders >= 2.
class Waveform {
 public:
  Waveform() = default;
  Waveform(double total_voltage_Vrms, double frequency_Hz, std::vector<Harmonic> harmonics = {});

  struct Tone {
    int order;
    double amplitude_V;
    double phase_rad;
  };
  const std::vector<Tone>& tones() const { return tones_; }  ///< fundamental first
  double frequency_Hz() const { return frequency_Hz_; }
  double omega() const;
  double period_s() const { return 1 / frequency_Hz_; }
  double voltage_Vrms() const { return voltage_Vrms_; }
  double value_V(double time_s) const;
  double slope_V_per_s(double time_s) const;
  double crest_V() const { return crest_V_; }                ///< greatest |v|
  double crest_time_s() const { return crest_time_s_; }      ///< of the positive crest
  double sum_of_rises_V() const { return sum_of_rises_V_; }  ///< per period; crest to crest for a plain sine
  /// The same mains with a double-exponential pulse on top from `start_s` on:
  /// amplitude_V·(1 - e^(-t/front_s))·e^(-t/tail_s). Runs only, never a steady state.
  Waveform with_pulse(double start_s, double amplitude_V, double front_s, double tail_s) const;
  /// The same shape at `share` (>= 0) of its voltage; 0 is a shorted source. Without the pulse.
  Waveform scaled(double share) const;
  /// The pulse as a sum of decaying exponentials amplitude·e^(-rate·(t - pulse_start_s())).
  struct Exponential {
    double amplitude_V;
    double rate_per_s;
  };
  const std::vector<Exponential>& exponentials() const { return exponentials_; }
  double pulse_start_s() const { return pulse_start_s_; }
  bool odd_only() const;  ///< half-wave symmetry: v(t + T/2) = -v(t)

 private:
  double voltage_Vrms_ = 0;
  double frequency_Hz_ = 50;
  std::vector<Tone> tones_;
  double crest_V_ = 0;
  double crest_time_s_ = 0;
  double sum_of_rises_V_ = 0;
  std::vector<Exponential> exponentials_;
  double pulse_start_s_ = 0;
};

}  // namespace dropfront::circuit
