#pragma once
#include <cstdint>
#include <map>
#include <vector>

namespace dropfront::search {

/// Objectives near one place of one region, as polynomials of the positions on the axes.
class LocalFit {
 public:
  bool usable() const { return usable_; }
  /// Value of objective k at `position`; `spread` receives the fit's r.m.s. error (may be null). Positions
  /// far outside the samples are read as the border of their neighbourhood.
  double value(int k, const std::vector<double>& position, double* spread = nullptr) const;

 private:
  friend class LocalModel;
  std::vector<double> features(const std::vector<double>& position) const;

  bool usable_ = false;
  bool quadratic_ = false;
  std::vector<double> centre_;
  double width_ = 1;
  std::vector<std::vector<double>> coefficients_;  ///< one vector an objective
  std::vector<double> spread_;
};

/// Learns objectives that only an evaluation tells from the evaluations made so far, to decide which designs
/// to evaluate next. It orders work; it never decides what is on a front.
class LocalModel {
 public:
  LocalModel(int axes, int objectives) : axes_(axes), objectives_(objectives) {}

  /// One sample; ignored unless all objectives are finite. Call from one thread, in a fixed order.
  void add(std::int64_t region, const std::vector<double>& position, const std::vector<double>& objectives);

  /// Weighted least squares about `centre` (Gaussian weights; the width grows from 0.15 of the axes until
  /// enough samples count; of those the nearest 1,500), slopes slightly damped. Not usable with fewer samples
  /// than coefficients.
  LocalFit fit(std::int64_t region, const std::vector<double>& centre) const;

 private:
  struct Samples {
    std::vector<double> positions;   ///< axes_ a sample
    std::vector<double> objectives;  ///< objectives_ a sample
  };
  bool fit_width(const Samples& samples, LocalFit& fit) const;

  int axes_;
  int objectives_;
  std::map<std::int64_t, Samples> regions_;
};

}  // namespace dropfront::search
