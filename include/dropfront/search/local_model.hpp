#pragma once
#include <cstdint>
#include <map>
#include <vector>

namespace dropfront::search {

/// One quantity near one place, as a polynomial of the positions on the axes.
class LocalFit {
 public:
  bool usable() const { return !coefficients_.empty(); }
  /// Value at `position`. Positions far outside the samples are read as the border of their neighbourhood.
  double value(const std::vector<double>& position) const;
  double spread() const { return spread_; }  ///< r.m.s. error of the fit over its samples

 private:
  friend class LocalModel;
  void features(const double* position, std::vector<double>& out) const;

  bool quadratic_ = false;
  double width_ = 1;
  double spread_ = 0;
  std::vector<double> centre_;
  std::vector<double> coefficients_;
};

/// Learns what only an evaluation tells (objectives, headrooms of checks) from the evaluations made so far,
/// to decide which designs to evaluate next. It orders work; it never decides what is on a front.
class LocalModel {
 public:
  LocalModel(int axes, int quantities) : axes_(axes), quantities_(quantities) {}

  /// One sample; quantities that are not finite are unknown. Call from one thread, in a fixed order.
  void add(std::int64_t region, const std::vector<double>& position, const std::vector<double>& quantities);

  /// Fits for the `wanted` quantities about `centre`, in that order: weighted least squares (Gaussian
  /// weights; the width grows from 0.15 of the axes until enough samples count; at most the nearest 500),
  /// slopes damped. Not usable with fewer than three samples.
  std::vector<LocalFit> fit(std::int64_t region, const std::vector<double>& centre,
                            const std::vector<int>& wanted) const;

 private:
  struct Samples {
    std::vector<double> positions;   ///< axes_ a sample
    std::vector<double> quantities;  ///< quantities_ a sample
  };
  struct Near {
    double square;  ///< squared distance
    std::size_t sample;
  };
  LocalFit fit_one(const Samples& samples, const std::vector<Near>& near, const std::vector<double>& centre,
                   int quantity) const;

  int axes_;
  int quantities_;
  std::map<std::int64_t, Samples> regions_;
};

}  // namespace dropfront::search
