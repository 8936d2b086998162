#include "dropfront/values/sobol.hpp"

#include <algorithm>

namespace dropfront::values {

namespace {

/// One row of the table: degree and inner coefficients of the primitive polynomial, first direction numbers.
struct Row {
  int degree;
  std::uint32_t coefficients;
  std::array<std::uint32_t, 5> first;
};

/// Dimensions 2 to 12.
constexpr std::array<Row, Sobol::kMostDimensions - 1> kRows{{{1, 0, {1}},
                                                             {2, 1, {1, 3}},
                                                             {3, 1, {1, 3, 1}},
                                                             {3, 2, {1, 1, 1}},
                                                             {4, 1, {1, 1, 3, 3}},
                                                             {4, 4, {1, 3, 5, 13}},
                                                             {5, 2, {1, 1, 5, 5, 17}},
                                                             {5, 4, {1, 1, 5, 5, 5}},
                                                             {5, 7, {1, 1, 7, 11, 19}},
                                                             {5, 11, {1, 1, 5, 1, 1}},
                                                             {5, 13, {1, 1, 1, 3, 11}}}};

}  // namespace

Sobol::Sobol(int dimensions) : dimensions_(std::clamp(dimensions, 1, kMostDimensions)) {
  for (int k = 0; k < 32; ++k) directions_[0][k] = 1U << (31 - k);
  for (int d = 1; d < dimensions_; ++d) {
    const Row& row = kRows[d - 1];
    auto& v = directions_[d];
    for (int k = 0; k < row.degree; ++k) v[k] = row.first[k] << (31 - k);
    // v_k = v_(k-s) ^ (v_(k-s) >> s) ^ sum over the polynomial's inner terms.
    for (int k = row.degree; k < 32; ++k) {
      v[k] = v[k - row.degree] ^ (v[k - row.degree] >> row.degree);
      for (int i = 1; i < row.degree; ++i)
        if ((row.coefficients >> (row.degree - 1 - i) & 1U) != 0) v[k] ^= v[k - i];
    }
  }
}

std::array<std::uint32_t, Sobol::kMostDimensions> Sobol::bits(std::uint32_t index) const {
  std::array<std::uint32_t, kMostDimensions> point{};
  for (int k = 0; index >> k != 0; ++k) {
    if ((index >> k & 1U) == 0) continue;
    for (int d = 0; d < dimensions_; ++d) point[d] ^= directions_[d][k];
    if (k == 31) break;
  }
  return point;
}

ShiftedSobol::ShiftedSobol(const Sobol& sobol, RandomStream stream) : sobol_(&sobol) {
  for (auto& word : shift_) word = stream.next();
}

std::vector<double> ShiftedSobol::point(std::uint32_t index) const {
  const auto bits = sobol_->bits(index);
  std::vector<double> point(sobol_->dimensions());
  for (std::size_t d = 0; d < point.size(); ++d) {
    // 32 bits of the net, 20 random ones below, half a step from the ends.
    const std::uint64_t word = (std::uint64_t{bits[d]} << 32) ^ shift_[d];
    point[d] = (static_cast<double>(word >> 12) + 0.5) * 0x1p-52;
  }
  return point;
}

}  // namespace dropfront::values
