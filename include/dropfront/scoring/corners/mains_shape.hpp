#pragma once
#include <vector>

#include "dropfront/circuit/waveform.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// The three shapes of one supply. Made once a problem: a crest search is not free.
struct MainsShapes {
  circuit::Waveform lean;     ///< low voltage and frequency, least crest
  circuit::Waveform rich;     ///< high voltage and frequency, greatest crest
  circuit::Waveform nominal;  ///< pure sine (as given where the phases are)
};

/// R.m.s. current through a capacitor on this waveform against that on a sine of the same total r.m.s.:
///   sqrt((1 + sum (k·p_k)²)/(1 + sum p_k²))
/// since I = C·dv/dt. Losses of the current go with its square. A square wave has no finite value: p_k = 1/k
/// adds 1 a harmonic. The most EN 50160 allows at once (its table scaled to a distortion of 8 %) gives 1.25.
double current_factor(const std::vector<circuit::Harmonic>& harmonics);

/// Lean and rich shape: without harmonics given, 3 % third harmonic at 0 degrees (flat-topped) and at 180
/// (peaked), total r.m.s. kept. Harmonics given: each at its phase or half a turn on, whichever set lowers
/// (lean) or raises (rich) the crest, unless the phases are as given.
MainsShapes mains_shapes(const Supply& supply);

}  // namespace dropfront::scoring
