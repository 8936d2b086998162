#include "dropfront/search/local_model.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

namespace dropfront::search {
namespace {

constexpr double widths[] = {0.15, 0.3, 0.6, 1.2};
constexpr double farthest_square = 13.8;  // in widths: a weight of 1e-3
constexpr std::size_t most_samples = 500;
constexpr double farthest = 3;  // in widths

// Solves A x = b by Cholesky; A symmetric (row-major n x n, lower half read), both overwritten.
bool solve(std::vector<double>& a, std::vector<double>& b) {
  const std::size_t n = b.size();
  for (std::size_t j = 0; j < n; ++j) {
    for (std::size_t k = 0; k < j; ++k)
      for (std::size_t i = j; i < n; ++i) a[i * n + j] -= a[i * n + k] * a[j * n + k];
    if (!(a[j * n + j] > 1e-12)) return false;
    const double root = std::sqrt(a[j * n + j]);
    for (std::size_t i = j; i < n; ++i) a[i * n + j] /= root;
  }
  for (std::size_t i = 0; i < n; ++i) {
    for (std::size_t k = 0; k < i; ++k) b[i] -= a[i * n + k] * b[k];
    b[i] /= a[i * n + i];
  }
  for (std::size_t i = n; i-- > 0;) {
    for (std::size_t k = i + 1; k < n; ++k) b[i] -= a[k * n + i] * b[k];
    b[i] /= a[i * n + i];
  }
  return true;
}

}  // namespace

void LocalFit::features(const double* position, std::vector<double>& out) const {
  const std::size_t axes = centre_.size();
  out.resize(quadratic_ ? 2 * axes + 1 : axes + 1);
  out[0] = 1;
  for (std::size_t s = 0; s < axes; ++s) {
    out[1 + s] = std::clamp((position[s] - centre_[s]) / width_, -farthest, farthest);
    if (quadratic_) out[1 + axes + s] = out[1 + s] * out[1 + s];
  }
}

double LocalFit::value(const std::vector<double>& position) const {
  std::vector<double> f;
  features(position.data(), f);
  double sum = 0;
  for (std::size_t i = 0; i < f.size(); ++i) sum += f[i] * coefficients_[i];
  return sum;
}

void LocalModel::add(std::int64_t region, const std::vector<double>& position,
                     const std::vector<double>& quantities) {
  Samples& samples = regions_[region];
  samples.positions.insert(samples.positions.end(), position.begin(), position.end());
  samples.quantities.insert(samples.quantities.end(), quantities.begin(), quantities.end());
}

LocalFit LocalModel::fit_one(const Samples& samples, const std::vector<Near>& near,
                             const std::vector<double>& centre, int quantity) const {
  const auto known = [&](const Near& n) { return samples.quantities[n.sample * quantities_ + quantity]; };
  const std::size_t linear = static_cast<std::size_t>(axes_) + 1;
  LocalFit fit;
  fit.centre_ = centre;
  std::size_t count = 0;
  for (double width : widths) {
    fit.width_ = width;
    count = 0;
    for (const Near& n : near)
      if (n.square < farthest_square * width * width && std::isfinite(known(n))) ++count;
    if (count >= 2 * linear) break;
  }
  if (count < 3) return fit;
  fit.quadratic_ = count >= 6 * linear;
  const std::size_t size = fit.quadratic_ ? 2 * linear - 1 : linear;
  std::vector<double> normal(size * size, 0.0), side(size, 0.0), f;
  double total = 0;
  const auto each_sample = [&](const auto& body) {
    for (const Near& n : near) {
      if (!(n.square < farthest_square * fit.width_ * fit.width_) || !std::isfinite(known(n))) continue;
      fit.features(&samples.positions[n.sample * axes_], f);
      body(std::exp(-0.5 * n.square / (fit.width_ * fit.width_)), known(n));
    }
  };
  each_sample([&](double weight, double value) {
    total += weight;
    for (std::size_t i = 0; i < size; ++i) {
      for (std::size_t j = 0; j <= i; ++j) normal[i * size + j] += weight * f[i] * f[j];
      side[i] += weight * value * f[i];
    }
  });
  // Damping: slopes need evidence, and axes along which the samples do not differ must not spoil the rest.
  for (std::size_t i = 1; i < size; ++i) normal[i * size + i] += 1e-3 * total + 0.1;
  if (!solve(normal, side)) return fit;
  double squares = 0;
  each_sample([&](double weight, double value) {
    for (std::size_t i = 0; i < size; ++i) value -= f[i] * side[i];
    squares += weight * value * value;
  });
  // Few samples fit well by themselves: the error counts for more.
  fit.spread_ = std::sqrt(squares / total * (1 + static_cast<double>(size) / static_cast<double>(count)));
  fit.coefficients_ = std::move(side);
  return fit;
}

std::vector<LocalFit> LocalModel::fit(std::int64_t region, const std::vector<double>& centre,
                                      const std::vector<int>& wanted) const {
  std::vector<LocalFit> fits(wanted.size());
  const auto found = regions_.find(region);
  if (found == regions_.end()) return fits;
  const Samples& samples = found->second;
  std::vector<Near> near;
  const double reach = farthest_square * widths[3] * widths[3];
  for (std::size_t i = 0; i * quantities_ < samples.quantities.size(); ++i) {
    double square = 0;
    for (int s = 0; s < axes_; ++s) {
      const double d = samples.positions[i * axes_ + s] - centre[s];
      square += d * d;
    }
    if (square < reach) near.push_back(Near{square, i});
  }
  const auto closer = [](const Near& a, const Near& b) {
    return a.square != b.square ? a.square < b.square : a.sample < b.sample;
  };
  if (near.size() > most_samples) {
    std::nth_element(near.begin(), near.begin() + most_samples, near.end(), closer);
    near.resize(most_samples);
  }
  std::sort(near.begin(), near.end(), closer);
  for (std::size_t w = 0; w < wanted.size(); ++w) fits[w] = fit_one(samples, near, centre, wanted[w]);
  return fits;
}

}  // namespace dropfront::search
