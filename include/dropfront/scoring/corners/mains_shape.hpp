#pragma once
#include "dropfront/circuit/waveform.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// The three shapes of one supply. Made once a problem: a crest search is not free.
struct MainsShapes {
  circuit::Waveform lean;     ///< low voltage and frequency, least crest
  circuit::Waveform rich;     ///< high voltage and frequency, greatest crest
  circuit::Waveform nominal;  ///< pure sine (as given where the phases are)
};

/// Lean and rich shape: without harmonics given, 3 % third harmonic at 0 degrees (flat-topped) and at 180
/// (peaked), total r.m.s. kept. Harmonics given: each at its phase or half a turn on, whichever set lowers
/// (lean) or raises (rich) the crest, unless the phases are as given.
MainsShapes mains_shapes(const Supply& supply);

}  // namespace dropfront::scoring
