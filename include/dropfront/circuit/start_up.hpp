#pragma once
#include <optional>
#include <string>
#include <vector>

#include "dropfront/circuit/rail_run.hpp"

namespace dropfront::circuit {

/// A supply switched on with all capacitors empty, until its rail stays at the required voltage.
class StartUp {
 public:
  /// Without `running` the load of `rising` hangs on the rail from the beginning. With it the stage turns on
  /// where the rail first reaches `turn_on_V`, the network is `running` from then on, and a rail that falls
  /// below `cut_out_V` (0: never) afterwards turns it off again, for good: it would do the same for ever.
  StartUp(Network rising, std::optional<Network> running, double turn_on_V, double cut_out_V,
          double required_V);

  enum class Outcome { reached, stays_low, cuts_out, not_yet };
  struct Start {
    bool usable = false;
    std::string reason;
    Outcome outcome = Outcome::not_yet;
    double time_s = 0;  ///< reached: to the last moment below the required voltage; else how long it was run
    double phase_deg = 0;
    /// Never reaching is longer than any time; no answer is worse than both.
    bool longer_than(const Start& other) const;
  };

  /// Switched on at one mains phase. Reached: the rail's minimum a period stands at the required voltage and
  /// three periods in a row is no lower than before, or the rail repeats itself, or sixteen periods have gone
  /// by above it. Given up after `give_up_s`.
  Start at(double phase_deg, double give_up_s);

  /// Switched on at the phase with the longest start. A start of some periods is ranked, every 20 degrees and
  /// 10 to both sides of the last, by the time already passed and the charge still missing at one common
  /// moment two periods on; the last two are run in full. Shorter starts are all run, every 20 degrees.
  Start worst(double give_up_s);

  int runs() const { return runs_; }

 private:
  double reservoir_V(const RunPoint& at) const;
  double charged_V(double phase_deg);
  double gain_V();
  std::vector<double> candidates_deg();

  RailRun rising_;
  std::optional<RailRun> running_;
  double turn_on_V_, cut_out_V_, required_V_;
  int runs_ = 0;
};

}  // namespace dropfront::circuit
