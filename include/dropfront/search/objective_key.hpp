#pragma once
#include <cmath>
#include <cstddef>
#include <limits>
#include <vector>

namespace dropfront::search {

/// The step an objective falls into: floor(value / resolution + 1/2), or the value itself for resolution 0.
/// NaN becomes +infinity: it sorts last and never dominates.
inline double objective_key(double value, double resolution) {
  if (std::isnan(value)) return std::numeric_limits<double>::infinity();
  if (!(resolution > 0)) return value;
  return std::floor(value / resolution + 0.5);
}

/// Keys of a whole vector; `objectives` and `resolution` have the same length.
inline std::vector<double> objective_keys(const std::vector<double>& objectives,
                                          const std::vector<double>& resolution) {
  std::vector<double> keys(objectives.size());
  for (std::size_t k = 0; k < keys.size(); ++k) keys[k] = objective_key(objectives[k], resolution[k]);
  return keys;
}

/// a <= b in every key and < in one (all minimised). Free of NaN by construction of the keys.
inline bool dominates(const std::vector<double>& a, const std::vector<double>& b) {
  bool better = false;
  for (std::size_t k = 0; k < a.size(); ++k) {
    if (!(a[k] <= b[k])) return false;
    better = better || a[k] < b[k];
  }
  return better;
}

}  // namespace dropfront::search
