#include "dropfront/search/local_model.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

namespace dropfront::search {
namespace {

constexpr double widths[] = {0.15, 0.3, 0.6, 1.2};
constexpr double farthest_square = 13.8;  // in widths: a weight of 1e-3
constexpr std::size_t most_samples = 1500;
constexpr double farthest = 3;  // in widths

// Solves A x = b for every right-hand side by Cholesky; A symmetric (row-major n x n), overwritten.
bool solve(std::vector<double>& a, std::size_t n, std::vector<std::vector<double>>& sides) {
  for (std::size_t j = 0; j < n; ++j) {
    for (std::size_t k = 0; k < j; ++k)
      for (std::size_t i = j; i < n; ++i) a[i * n + j] -= a[i * n + k] * a[j * n + k];
    if (!(a[j * n + j] > 1e-12)) return false;
    const double root = std::sqrt(a[j * n + j]);
    for (std::size_t i = j; i < n; ++i) a[i * n + j] /= root;
  }
  for (auto& b : sides) {
    for (std::size_t i = 0; i < n; ++i) {
      for (std::size_t k = 0; k < i; ++k) b[i] -= a[i * n + k] * b[k];
      b[i] /= a[i * n + i];
    }
    for (std::size_t i = n; i-- > 0;) {
      for (std::size_t k = i + 1; k < n; ++k) b[i] -= a[k * n + i] * b[k];
      b[i] /= a[i * n + i];
    }
  }
  return true;
}

}  // namespace

std::vector<double> LocalFit::features(const std::vector<double>& position) const {
  std::vector<double> f{1.0};
  for (std::size_t s = 0; s < centre_.size(); ++s)
    f.push_back(std::clamp((position[s] - centre_[s]) / width_, -farthest, farthest));
  if (quadratic_)
    for (std::size_t s = 0; s < centre_.size(); ++s) f.push_back(f[1 + s] * f[1 + s]);
  return f;
}

double LocalFit::value(int k, const std::vector<double>& position, double* spread) const {
  const std::vector<double> f = features(position);
  double sum = 0;
  for (std::size_t i = 0; i < f.size(); ++i) sum += f[i] * coefficients_[k][i];
  if (spread) *spread = spread_[k];
  return sum;
}

void LocalModel::add(std::int64_t region, const std::vector<double>& position,
                     const std::vector<double>& objectives) {
  for (double x : objectives)
    if (!std::isfinite(x)) return;
  Samples& samples = regions_[region];
  samples.positions.insert(samples.positions.end(), position.begin(), position.end());
  samples.objectives.insert(samples.objectives.end(), objectives.begin(), objectives.end());
}

bool LocalModel::fit_width(const Samples& samples, LocalFit& fit) const {
  const std::size_t count = samples.objectives.size() / objectives_;
  std::vector<std::pair<double, std::size_t>> near;  // squared distance in widths, sample
  for (std::size_t i = 0; i < count; ++i) {
    const double* at = &samples.positions[i * axes_];
    double square = 0;
    for (int s = 0; s < axes_; ++s) {
      const double z = (at[s] - fit.centre_[s]) / fit.width_;
      square += z * z;
    }
    if (square < farthest_square) near.emplace_back(square, i);
  }
  const std::size_t linear = static_cast<std::size_t>(axes_) + 1;
  if (near.size() < 2 * linear) return false;
  if (near.size() > most_samples) {
    std::nth_element(near.begin(), near.begin() + most_samples, near.end());
    near.resize(most_samples);
    std::sort(near.begin(), near.end());
  }
  fit.quadratic_ = near.size() >= 6 * linear;
  const std::size_t n = fit.quadratic_ ? 2 * linear - 1 : linear;
  std::vector<double> normal(n * n, 0.0);
  fit.coefficients_.assign(objectives_, std::vector<double>(n, 0.0));
  double total = 0;
  std::vector<std::vector<double>> rows;
  std::vector<double> place(axes_);
  for (const auto& sample : near) {
    const double weight = std::exp(-0.5 * sample.first);
    std::copy_n(samples.positions.begin() + static_cast<std::ptrdiff_t>(sample.second * axes_), axes_,
                place.begin());
    rows.push_back(fit.features(place));
    const auto& f = rows.back();
    total += weight;
    for (std::size_t i = 0; i < n; ++i)
      for (std::size_t j = 0; j <= i; ++j) normal[i * n + j] += weight * f[i] * f[j];
    for (int k = 0; k < objectives_; ++k) {
      const double y = weight * samples.objectives[sample.second * objectives_ + k];
      for (std::size_t i = 0; i < n; ++i) fit.coefficients_[k][i] += y * f[i];
    }
  }
  // Damping keeps axes along which the samples do not differ from spoiling the rest.
  for (std::size_t i = 1; i < n; ++i) normal[i * n + i] += 1e-3 * total;
  if (!solve(normal, n, fit.coefficients_)) return false;
  fit.spread_.assign(objectives_, 0.0);
  for (std::size_t u = 0; u < near.size(); ++u)
    for (int k = 0; k < objectives_; ++k) {
      double r = samples.objectives[near[u].second * objectives_ + k];
      for (std::size_t i = 0; i < n; ++i) r -= rows[u][i] * fit.coefficients_[k][i];
      fit.spread_[k] += std::exp(-0.5 * near[u].first) / total * r * r;
    }
  for (double& s : fit.spread_) s = std::sqrt(s);
  return true;
}

LocalFit LocalModel::fit(std::int64_t region, const std::vector<double>& centre) const {
  LocalFit fit;
  fit.centre_ = centre;
  const auto found = regions_.find(region);
  if (found == regions_.end()) return fit;
  for (double width : widths) {
    fit.width_ = width;
    fit.usable_ = fit_width(found->second, fit);
    if (fit.usable_) break;
  }
  return fit;
}

}  // namespace dropfront::search
