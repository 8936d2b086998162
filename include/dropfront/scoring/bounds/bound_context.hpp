#pragma once
#include <cstdint>
#include <vector>

#include "dropfront/scoring/corners/mains_shape.hpp"
#include "dropfront/scoring/load_profile.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// What the bounds ask of one mains shape.
struct Line {
  explicit Line(const circuit::Waveform& waveform);
  double frequency_Hz = 0;
  double omega = 0;
  double voltage_Vrms = 0;
  double crest_V = 0;
  double rises_V = 0;        ///< sum of rises a period
  double fundamental_V = 0;  ///< amplitude
  double slope_V_per_s = 0;  ///< sum of k·w·A_k: no |dv/dt| is greater
  double bend_V_per_s2 = 0;  ///< sum of (k·w)²·A_k: no |d²v/dt²| is greater
  double chain_tones_V = 0;  ///< sum over the harmonics of 2k·A_k·(k + 1/k)
  double crest_area_Vs = 0;  ///< no |integral of v| from one crest to the next is greater
  bool symmetric = false;    ///< odd harmonics only: the crests are half a period apart
};

/// One supply's three shapes.
struct SupplyLines {
  SupplyLines(const Supply& of, const MainsShapes& shapes);
  const Supply* supply;
  MainsShapes shapes;
  Line lean, rich, standby;
};

/// What bounds need of a requirement, worked out once.
struct BoundContext {
  explicit BoundContext(const Requirement& of);
  const Requirement* requirement;
  LoadProfile loads;
  std::vector<SupplyLines> supplies;
  std::int64_t mains_margin_um = 0;

  double ambient_low_degC() const { return requirement->surroundings.ambient_degC.low; }
  double ambient_high_degC() const { return requirement->surroundings.ambient_degC.high; }
  double enclosure_K_per_W() const { return requirement->surroundings.enclosure_K_per_W; }
};

}  // namespace dropfront::scoring
