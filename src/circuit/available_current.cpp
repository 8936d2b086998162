#include "dropfront/circuit/available_current.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::circuit {

namespace {

struct Probe {
  bool usable = false;
  double headroom_V = 0;  ///< rail minimum above what is required
  SteadyState state;
};

class Bracket {
 public:
  Bracket(Network (*build)(const ElementValues&), ElementValues values, double required_V)
      : build_(build), values_(std::move(values)), required_V_(required_V) {}

  Probe probe(double current_A, const StateVector* guess) {
    values_.rail_current_A = current_A;
    SteadyOptions options;
    options.powers = false;
    Probe result;
    ++count;
    result.state = solve_steady_state(build_(values_), options, guess);
    result.usable = result.state.usable();
    result.headroom_V = result.state.rail_min_V - required_V_;
    return result;
  }

  int count = 0;

 private:
  Network (*build_)(const ElementValues&);
  ElementValues values_;
  double required_V_;
};

}  // namespace

AvailableCurrent find_available_current(Network (*build)(const ElementValues&), ElementValues values,
                                        double required_V, double ceiling_A) {
  AvailableCurrent answer;
  if (!(values.load_cutoff_V > 0)) values.load_cutoff_V = 0.5 * required_V;
  Bracket bracket(build, values, required_V);
  Probe low = bracket.probe(0, nullptr);
  answer.steady_states = 1;
  if (!low.usable) {
    answer.reason = low.state.reason;
    return answer;
  }
  answer.rail_min_V = low.state.rail_min_V;
  answer.state = low.state.start;
  answer.usable = true;
  if (low.headroom_V < 0) {
    answer.reason = "the unloaded rail stays below what is required";
    return answer;
  }
  double low_A = 0;
  // Everything that crosses the dropper in a period, were it all to reach the rail.
  double high_A = ceiling_A > 0
                      ? ceiling_A
                      : 2 * values.mains.frequency_Hz() * values.dropper_F * values.mains.sum_of_rises_V() +
                            2 * values.mains.crest_V() / values.discharge_ohm;
  Probe high;
  high.headroom_V = -required_V;
  int kept_low = 0;
  int kept_high = 0;
  double low_weight = low.headroom_V;
  double high_weight = high.headroom_V;
  while (high_A - low_A > std::max(1e-9, 1e-6 * high_A) && bracket.count < 80) {
    double trial_A = (low_A * -high_weight + high_A * low_weight) / (low_weight - high_weight);
    const double width = high_A - low_A;
    if (bracket.count % 3 == 2) trial_A = low_A + 0.5 * width;
    trial_A = std::clamp(trial_A, low_A + 1e-3 * width, high_A - 1e-3 * width);
    const Probe probe = bracket.probe(trial_A, &low.state.start);
    if (!probe.usable) {
      answer.usable = false;
      answer.reason = probe.state.reason;
      break;
    }
    if (probe.headroom_V >= 0) {
      low_A = trial_A;
      low = probe;
      low_weight = probe.headroom_V;
      if (++kept_low > 1) high_weight /= 2;
      kept_high = 0;
      if (probe.headroom_V < 1e-8) break;
    } else {
      high_A = trial_A;
      high_weight = probe.headroom_V;
      if (++kept_high > 1) low_weight /= 2;
      kept_low = 0;
    }
  }
  answer.steady_states = bracket.count;
  answer.current_A = low_A;
  answer.rail_min_V = low.state.rail_min_V;
  answer.state = low.state.start;
  return answer;
}

}  // namespace dropfront::circuit
