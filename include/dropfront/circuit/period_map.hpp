#pragma once
#include <string>
#include <vector>

#include "dropfront/circuit/walker.hpp"

namespace dropfront::circuit {

/// The map from the capacitor voltages at the network's period_start_s to those one period later; with the
/// network's half-period symmetry, to those half a period later with the signs turned back.
class PeriodMap {
 public:
  explicit PeriodMap(Network network);

  const std::string& fault() const { return walker_.fault(); }
  const Walker& walker() const { return walker_; }
  void forget_fault() { walker_.fail({}); }
  void set_load(double current_A) { walker_.set_load(current_A); }
  int states() const { return walker_.topology().states; }
  bool halved() const { return halved_; }
  const std::vector<Segment>& segments() const { return segments_; }  ///< of the last apply()
  const StateVector& raw_end() const { return raw_end_; }             ///< its end, signs not turned back

  /// mapped = map(x); `jacobian`, if wanted, is its derivative. False: see fault().
  bool apply(const StateVector& x, StateVector& mapped, SmallMatrix* jacobian);
  /// One whole period on from `x`, thyristors latched or not as the last one left them; segments() follow.
  bool advance(StateVector& x);
  /// step with (1 - J)·step = mapped - x; false where 1 - J is singular.
  bool newton_step(const StateVector& x, const StateVector& mapped, const SmallMatrix& jacobian,
                   StateVector& step) const;
  /// |mapped - x| in the energy norm, as volts on the largest capacitor. In this norm the map of a passive
  /// network never expands, so it is the right measure of progress.
  double distance(const StateVector& x, const StateVector& mapped) const;
  /// Greatest |eigenvalue| of the full-period Jacobian.
  double greatest_multiplier(const SmallMatrix& jacobian) const;

 private:
  Walker walker_;
  bool halved_ = false;
  double span_s_ = 0;
  std::vector<Segment> segments_;
  StateVector raw_end_{};
};

}  // namespace dropfront::circuit
