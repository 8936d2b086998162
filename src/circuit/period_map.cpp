#include "dropfront/circuit/period_map.hpp"

#include <Eigen/Dense>
#include <algorithm>
#include <cmath>
#include <utility>

#include "dropfront/circuit/small_solve.hpp"

namespace dropfront::circuit {

PeriodMap::PeriodMap(Network network)
    : walker_(std::move(network)),
      halved_(!walker_.network().half_period_signs.empty()),
      span_s_(walker_.network().source.waveform.period_s() * (halved_ ? 0.5 : 1.0)) {}

bool PeriodMap::apply(const StateVector& x, StateVector& mapped, SmallMatrix* jacobian) {
  mapped = x;
  const double from_s = walker_.network().period_start_s;
  walker_.set_latched(0);
  if (!walker_.walk(from_s, from_s + span_s_, mapped, segments_)) return false;
  if (walker_.latched() != 0) {
    walker_.fail("a thyristor does not drop out");
    return false;
  }
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

bool PeriodMap::advance(StateVector& x) {
  const double from_s = walker_.network().period_start_s;
  if (!walker_.walk(from_s, from_s + walker_.network().source.waveform.period_s(), x, segments_))
    return false;
  raw_end_ = x;
  return true;
}

bool PeriodMap::newton_step(const StateVector& x, const StateVector& mapped, const SmallMatrix& jacobian,
                            StateVector& step) const {
  const int n = states();
  SmallMatrix m{};
  for (int i = 0; i < n; ++i) {
    for (int k = 0; k < n; ++k) m[i][k] = (i == k ? 1 : 0) - jacobian[i][k];
    step[i] = mapped[i] - x[i];
  }
  if (!solve_small<kMaxStates>(n, m, step)) return false;
  // No capacitor of a mains circuit is ever a hundred kilovolts away: such a step is a singular matrix.
  return std::all_of(step.begin(), step.begin() + n, [](double v) { return std::abs(v) < 1e5; });
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
    Eigen::MatrixXd m(n, n);
    for (int i = 0; i < n; ++i) {
      for (int k = 0; k < n; ++k) m(i, k) = jacobian[i][k];
    }
    const Eigen::VectorXcd values = m.eigenvalues();
    for (int i = 0; i < n; ++i) greatest = std::max(greatest, std::abs(values(i)));
  }
  return halved_ ? greatest * greatest : greatest;
}

}  // namespace dropfront::circuit
