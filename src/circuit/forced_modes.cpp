#include "dropfront/circuit/forced_modes.hpp"

#include <cmath>

namespace dropfront::circuit {

void force_modes(const Waveform& mains, ConductionMode& mode) {
  const auto& tones = mains.tones();
  const auto count = tones.size();
  mode.forced_cosine.assign(mode.states * count, 0);
  mode.forced_sine.assign(mode.states * count, 0);
  for (int i = 0; i < mode.states; ++i) {
    for (std::size_t h = 0; h < count; ++h) {
      const double w = tones[h].order * mains.omega();
      const double scale = mode.source[i] * tones[h].amplitude_V / (mode.lambda[i] * mode.lambda[i] + w * w);
      const double in_phase = -mode.lambda[i] * scale;  // with sin(kwt + phi)
      const double quadrature = -w * scale;             // with cos(kwt + phi)
      const double c = std::cos(tones[h].phase_rad);
      const double s = std::sin(tones[h].phase_rad);
      mode.forced_cosine[i * count + h] = in_phase * s + quadrature * c;
      mode.forced_sine[i * count + h] = in_phase * c - quadrature * s;
    }
  }
}

/// An exponential y' = -rate·y of the source is one more mode. It drives z' = lambda·z + b·V·y, whose answer
/// is z = gain·y with gain = b·V/(-rate - lambda): the circuit mode proper is what is left of z.
void append_exponentials(const Waveform& mains, ConductionMode& mode) {
  mode.modes = mode.states;
  mode.pulse_start_s = mains.pulse_start_s();
  for (const auto& e : mains.exponentials()) {
    const int j = mode.modes - mode.states;
    const int k = mode.modes++;
    mode.lambda[k] = -e.rate_per_s;
    mode.pulse_V[j] = e.amplitude_V;
    for (int i = 0; i < mode.states; ++i) {
      double apart = -e.rate_per_s - mode.lambda[i];
      // Equal rates would need a term s·e^(-rate·s); a billionth apart is the same to seven places.
      if (std::abs(apart) < 1e-9 * e.rate_per_s) apart = 1e-9 * e.rate_per_s;
      mode.pulse_gain[i][j] = mode.source[i] * e.amplitude_V / apart;
      for (int x = 0; x < mode.states; ++x)
        mode.to_state[x][k] += mode.to_state[x][i] * mode.pulse_gain[i][j];
    }
  }
}

}  // namespace dropfront::circuit
