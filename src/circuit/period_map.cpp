#include "dropfront/circuit/period_map.hpp"

#include <Eigen/Dense>
#include <algorithm>
#include <cmath>
#include <utility>

namespace dropfront::circuit {

namespace {
using Dynamic = Eigen::Matrix<double, Eigen::Dynamic, Eigen::Dynamic, 0, kMaxStates, kMaxStates>;

Dynamic to_eigen(int n, const SmallMatrix& m) {
  Dynamic matrix(n, n);
  for (int i = 0; i < n; ++i) {
    for (int k = 0; k < n; ++k) matrix(i, k) = m[i][k];
  }
  return matrix;
}
}  // namespace

PeriodMap::PeriodMap(Network network)
    : walker_(std::move(network)),
      halved_(!walker_.network().half_period_signs.empty()),
      span_s_(walker_.network().source.waveform.period_s() * (halved_ ? 0.5 : 1.0)) {}

bool PeriodMap::apply(const StateVector& x, StateVector& mapped, SmallMatrix* jacobian) {
  mapped = x;
  if (!walker_.walk(0, span_s_, mapped, segments_)) return false;
  raw_end_ = mapped;
  if (jacobian) *jacobian = walker_.sensitivity(segments_);
  if (!halved_) return true;
  const auto& signs = walker_.network().half_period_signs;
  for (int i = 0; i < states(); ++i) {
    mapped[i] *= signs[i];
    if (!jacobian) continue;
    for (int k = 0; k < states(); ++k) (*jacobian)[i][k] *= signs[i];
  }
  return true;
}

bool PeriodMap::newton_step(const StateVector& x, const StateVector& mapped, const SmallMatrix& jacobian,
                            StateVector& step) const {
  const int n = states();
  Dynamic m = Dynamic::Identity(n, n) - to_eigen(n, jacobian);
  Eigen::Matrix<double, Eigen::Dynamic, 1, 0, kMaxStates, 1> rhs(n);
  for (int i = 0; i < n; ++i) rhs(i) = mapped[i] - x[i];
  const auto solution = m.fullPivLu().solve(rhs).eval();
  for (int i = 0; i < n; ++i) {
    // No capacitor of a mains circuit is ever a hundred kilovolts away: such a step is a singular matrix.
    if (!(std::abs(solution(i)) < 1e5)) return false;
    step[i] = solution(i);
  }
  return true;
}

double PeriodMap::distance(const StateVector& x, const StateVector& mapped) const {
  const auto& capacitors = walker_.network().capacitors;
  double energy = 0;
  double greatest_F = 0;
  for (int i = 0; i < states(); ++i) {
    energy += capacitors[i].capacitance_F * (mapped[i] - x[i]) * (mapped[i] - x[i]);
    greatest_F = std::max(greatest_F, capacitors[i].capacitance_F);
  }
  return std::sqrt(energy / greatest_F);
}

double PeriodMap::greatest_multiplier(const SmallMatrix& jacobian) const {
  const int n = states();
  double greatest = 0;
  if (n == 2) {
    const double half_trace = 0.5 * (jacobian[0][0] + jacobian[1][1]);
    const double determinant = jacobian[0][0] * jacobian[1][1] - jacobian[0][1] * jacobian[1][0];
    const double square = half_trace * half_trace - determinant;
    greatest = square >= 0 ? std::abs(half_trace) + std::sqrt(square) : std::sqrt(std::abs(determinant));
  } else {
    const auto values = to_eigen(n, jacobian).eigenvalues().eval();
    for (int i = 0; i < n; ++i) greatest = std::max(greatest, std::abs(values(i)));
  }
  return halved_ ? greatest * greatest : greatest;
}

}  // namespace dropfront::circuit
