#pragma once
#include "dropfront/circuit/conduction_mode.hpp"

namespace dropfront::circuit {

/// Fills forced_cosine and forced_sine of a diagonalised mode.
/// Steady answer of z' = lambda·z + b·a·sin(k·w·t + phi): z = cosine·cos(kwt) + sine·sin(kwt).
void force_modes(const Waveform& mains, ConductionMode& mode);

/// Appends one mode for each exponential of the source.
void append_exponentials(const Waveform& mains, ConductionMode& mode);

}  // namespace dropfront::circuit
