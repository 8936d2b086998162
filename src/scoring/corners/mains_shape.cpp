#include "dropfront/scoring/corners/mains_shape.hpp"

#include <cmath>
#include <numbers>
#include <utility>
#include <vector>

namespace dropfront::scoring {

namespace {

using Harmonics = std::vector<circuit::Harmonic>;
constexpr double kDefaultThirdShare = 0.03;

/// The set of half-turns of `given` with the least (or greatest) crest. All sets up to 2^8, the rest one by
/// one after that; ties keep the earlier set, so the given phases win.
Harmonics extreme_crest(double voltage_Vrms, double frequency_Hz, const Harmonics& given, bool least) {
  const int tried = static_cast<int>(given.size()) < 8 ? static_cast<int>(given.size()) : 8;
  const auto crest_of = [&](const Harmonics& set) {
    return circuit::Waveform(voltage_Vrms, frequency_Hz, set).crest_V();
  };
  Harmonics best = given;
  double best_V = crest_of(given);
  const auto consider = [&](const Harmonics& set) {
    const double crest_V = crest_of(set);
    if (least ? crest_V < best_V : crest_V > best_V) {
      best_V = crest_V;
      best = set;
    }
  };
  for (unsigned turned = 1; turned < (1U << tried); ++turned) {
    Harmonics set = given;
    for (int i = 0; i < tried; ++i) {
      if ((turned >> i & 1U) != 0) set[i].phase_rad += std::numbers::pi;
    }
    consider(set);
  }
  for (std::size_t i = tried; i < given.size(); ++i) {
    Harmonics set = best;
    set[i].phase_rad += std::numbers::pi;
    consider(set);
  }
  return best;
}

}  // namespace

double current_factor(const std::vector<circuit::Harmonic>& harmonics) {
  double current = 1, voltage = 1;
  for (const auto& harmonic : harmonics) {
    voltage += harmonic.share * harmonic.share;
    current += harmonic.order * harmonic.share * harmonic.order * harmonic.share;
  }
  return std::sqrt(current / voltage);
}

MainsShapes mains_shapes(const Supply& supply) {
  const auto& V = supply.voltage_Vrms;
  const auto& f = supply.frequency_Hz;
  Harmonics lean{{3, kDefaultThirdShare, 0}};
  Harmonics rich{{3, kDefaultThirdShare, std::numbers::pi}};
  Harmonics nominal;
  if (supply.harmonics_given && supply.phases_as_given) {
    lean = rich = nominal = supply.harmonics;
  } else if (supply.harmonics_given) {
    lean = extreme_crest(V.low, f.low, supply.harmonics, true);
    rich = extreme_crest(V.high, f.high, supply.harmonics, false);
  }
  return {circuit::Waveform(V.low, f.low, std::move(lean)),
          circuit::Waveform(V.high, f.high, std::move(rich)),
          circuit::Waveform(V.nominal, f.nominal, std::move(nominal))};
}

}  // namespace dropfront::scoring
