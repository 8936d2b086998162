#pragma once

namespace dropfront::circuit {

/// Open-circuit voltage of the combination wave, 1.2/50 us, as a double exponential:
/// v(t) = 1.037·V·(1 - e^(-t/0.4074 us))·e^(-t/68.22 us).
/// Source: IEEE C62.41.2's form for the wave of IEC 61000-4-5 (from memory; front, tail and peak are
/// checked).
struct SurgeWave {
  static constexpr double kScale = 1.037;
  static constexpr double kFront_s = 0.4074e-6;
  static constexpr double kTail_s = 68.22e-6;
};

}  // namespace dropfront::circuit
