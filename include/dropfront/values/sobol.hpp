#pragma once
#include <array>
#include <cstdint>
#include <vector>

#include "dropfront/values/random.hpp"

namespace dropfront::values {

/// Sobol's sequence in up to kMostDimensions dimensions, 32 bits a coordinate. Any aligned block of 2^m
/// points (0 .. 2^m - 1 among them) is a digital net in base 2: each coordinate alone takes one value in each
/// of 2^m equal cells. Direction numbers: S. Joe, F. Y. Kuo, "Constructing Sobol sequences with better
/// two-dimensional projections", SIAM J. Sci. Comput. 30 (2008) 2635, first rows of their table; dimension 1
/// is van der Corput's sequence.
class Sobol {
 public:
  static constexpr int kMostDimensions = 12;

  /// `dimensions` is taken into 1 .. kMostDimensions.
  explicit Sobol(int dimensions);
  int dimensions() const { return dimensions_; }
  /// Coordinates of point `index` as fractions of 2^32, in the plain order (not Gray-coded).
  std::array<std::uint32_t, kMostDimensions> bits(std::uint32_t index) const;

 private:
  int dimensions_;
  std::array<std::array<std::uint32_t, 32>, kMostDimensions> directions_{};
};

/// A randomly shifted copy of a Sobol set: every coordinate is combined by exclusive or with a random word of
/// its own (a digital shift). The net's evenness stays; each single point is uniform in the unit cube, so
/// that the mean over one copy has no bias and copies from independent streams tell its error.
class ShiftedSobol {
 public:
  ShiftedSobol(const Sobol& sobol, RandomStream stream);
  /// Point `index`, every coordinate inside (0, 1).
  std::vector<double> point(std::uint32_t index) const;

 private:
  const Sobol* sobol_;
  std::array<std::uint64_t, Sobol::kMostDimensions> shift_{};
};

}  // namespace dropfront::values
