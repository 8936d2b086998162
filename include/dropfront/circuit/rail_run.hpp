#pragma once
#include <optional>
#include <string>
#include <vector>

#include "dropfront/circuit/extremes.hpp"
#include "dropfront/circuit/walker.hpp"

namespace dropfront::circuit {

/// Where a run has got to: mains time, capacitor voltages in network order, thyristors latched. It can be
/// handed to another network of the same capacitors at any moment.
struct RunPoint {
  double time_s = 0;
  StateVector x{};
  ConductionMask latched = 0;
};

/// Many runs of one network that ask for the rail only: the conduction modes are derived once and kept, and
/// no energies are summed (run_transient does both anew each time). Never throws.
class RailRun {
 public:
  explicit RailRun(Network network);

  const Network& network() const { return walker_.network(); }
  double period_s() const { return network().source.waveform.period_s(); }
  /// Why an advance failed; empty: none did. Once set, every further advance fails.
  const std::string& fault() const { return walker_.fault(); }

  /// Carries `at` on by `duration_s`; nothing happens for 0 or less. The rail's extremes on the way, ESR
  /// included, are added to `rail` if there is one. False: no consistent conduction mode; see fault().
  bool advance(double duration_s, RunPoint& at, Extremes* rail = nullptr);

  /// Mains time of the last moment within the last advance at which the rail stood below `level_V`.
  std::optional<double> last_below_s(double level_V) const;
  /// Mains time of the first moment within the last advance at which the rail stood at `level_V` or above.
  std::optional<double> first_at_s(double level_V) const;

 private:
  Walker walker_;
  std::vector<Segment> segments_;
};

}  // namespace dropfront::circuit
