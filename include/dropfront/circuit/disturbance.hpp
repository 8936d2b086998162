#pragma once
#include <string>
#include <vector>

#include "dropfront/circuit/rail_run.hpp"
#include "dropfront/circuit/steady_state.hpp"

namespace dropfront::circuit {

/// A supply on its periodic orbit that becomes another network for a time (a load burst, a mains dip) and
/// then is itself again: how low the rail falls, and at which mains phase it falls lowest.
class Disturbance {
 public:
  /// `start`: steady state of `normal`. The networks must have the same capacitors and mains frequency.
  /// `floor_V`: a rail that keeps falling is followed no further than some periods below this.
  Disturbance(Network normal, Network disturbed, double duration_s, const SteadyState& start, double floor_V);

  struct Least {
    bool usable = false;
    std::string reason;
    double rail_V = 0;  ///< least rail from the beginning until it is back, its steady minimum included
    /// Of the mains where the disturbance begins, from the rising zero of the fundamental; above 360 in the
    /// second turn of a supply that alternates.
    double phase_deg = 0;
    bool recovers = true;  ///< false: the rail was still falling when the run was given up
  };

  /// Begun at one phase. The run ends when the rail's minimum a period has turned, or is no lower than the
  /// steady one.
  Least at(double phase_deg);

  /// Begun at the worst place of a grid of 10 degrees (over half a turn where the network has half-wave
  /// symmetry, over two where it alternates from cycle to cycle): every second place, then those beside the
  /// three lowest, each run until a period after the end (half a period with the symmetry); the lowest is run
  /// to the end, the next two as well unless that took the rail no lower. A disturbance of more than two
  /// periods under mains is ranked by one as many whole periods shorter as leave one to two: it begins and
  /// ends at the same phases, and what differs between phases is the dropper's charge, which the first crest
  /// settles.
  Least worst_of_grid();
  /// Begun at the worst phase within a step of the grid of this one, by golden section.
  Least worst_around(double phase_deg);

  /// Begun at one phase again and again, every `every_s` (>= the duration): the least rail until the
  /// reservoir is back on its orbit before the next, or the minima repeat themselves. Intervals of two mains
  /// cycles and more are shortened to whole cycles: each then hits the same phase with the least time to
  /// recover.
  Least repeated(double phase_deg, double every_s);

  int runs() const { return runs_; }  ///< disturbances run so far

 private:
  double span_s() const;
  double span_deg() const { return 180.0 * turns_of_two_; }
  double time_of(double phase_deg) const;
  bool still() const;
  bool whole() const;
  bool on_orbit(double phase_deg, RunPoint& at);
  bool back(const RunPoint& at, const RunPoint& before) const;
  bool sample_grid();
  Least begun(double phase_deg, double duration_s, bool to_the_end);
  Least ranked(double phase_deg);
  bool disturb(double duration_s, RunPoint& at, Extremes& rail);
  bool recover(RunPoint& at, bool to_the_end, Extremes& rail, Least& least);
  Least failed(double phase_deg) const;

  RailRun normal_, disturbed_;
  double duration_s_;
  double floor_V_;
  double steady_min_V_;
  int turns_of_two_ = 2;  ///< span of the phases in half periods
  RunPoint start_;
  std::vector<RunPoint> grid_;
  int runs_ = 0;
};

}  // namespace dropfront::circuit
