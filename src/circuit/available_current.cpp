#include "dropfront/circuit/available_current.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/load_newton.hpp"
#include "dropfront/circuit/settle.hpp"

namespace dropfront::circuit {

namespace {

constexpr double kLightest = 1e-4;  // of the charge ceiling: stands for an unloaded rail
constexpr double kLighter = 0.6;    // of the root: the lighter load tried on bridges
// Shunts fire at another moment with every load, so several lighter ones are tried.
constexpr double kLighterShunt[] = {0.97, 0.9, 0.8, 0.65, 0.5, 0.3};
constexpr double kOnTarget_V = 1e-6;  // Newton's root against the independent steady state

/// Steady states of one network at different loads, on one set of conduction modes.
class LoadScan {
 public:
  LoadScan(const Network& network, double required_V) : map_(network), required_V_(required_V) {
    for (std::size_t k = 0; k < network.capacitors.size(); ++k) cold_[k] = network.capacitors[k].start_V;
  }

  struct Probe {
    bool usable = false;
    std::string reason;
    double headroom_V = 0;  ///< rail minimum above what is required
    StateVector state{};
  };

  Probe at(double current_A, const StateVector& guess) {
    map_.set_load(current_A);
    ++solved;
    Probe probe;
    SteadyOptions options;
    options.multipliers = false;
    // Where a thyristor's cycles end up may depend on the start: always from cold, as any other solver would.
    const bool remembers = !map_.walker().network().thyristors.empty();
    const Settled settled = settle(map_, remembers ? cold_ : guess, options);
    probe.usable = settled.found;
    probe.reason = settled.reason;
    if (!settled.found) return probe;
    probe.state = settled.start;
    probe.headroom_V = rail_extremes(map_.walker(), settled.segments).low - required_V_;
    return probe;
  }

  const StateVector& cold() const { return cold_; }
  PeriodMap& map() { return map_; }
  int solved = 0;

 private:
  PeriodMap map_;
  double required_V_;
  StateVector cold_{};
};

/// Everything that crosses the dropper in a period, were it all to reach the rail; without a dropper half the
/// crest through the resistor.
double charge_ceiling_A(const ElementValues& values) {
  if (!(values.dropper_F > 0)) return 0.5 * values.mains.crest_V() / values.series_resistor_ohm;
  return 2 * values.mains.frequency_Hz() * values.dropper_F * values.mains.sum_of_rises_V() +
         2 * values.mains.crest_V() / values.discharge_ohm;
}

/// Root of the rail minimum between a passing and a failing load: secant steps with halved memory, every
/// third one a bisection, so that the bend at the knee cannot hold it up.
LoadScan::Probe close_bracket(LoadScan& scan, double& low_A, LoadScan::Probe low, double high_A,
                              double high_V) {
  double low_weight = low.headroom_V;
  double high_weight = high_V;
  int kept_low = 0;
  int kept_high = 0;
  for (int k = 0; k < 100 && high_A - low_A > std::max(1e-10, 1e-8 * high_A) && low.headroom_V > 1e-8; ++k) {
    const double width = high_A - low_A;
    double trial_A = low_A + width * low_weight / (low_weight - high_weight);
    if (k % 3 == 2) trial_A = low_A + 0.5 * width;
    trial_A = std::clamp(trial_A, low_A + 1e-3 * width, high_A - 1e-3 * width);
    const auto probe = scan.at(trial_A, low.state);
    if (!probe.usable) return probe;
    if (probe.headroom_V >= 0) {
      low_A = trial_A;
      low = probe;
      low_weight = probe.headroom_V;
      if (++kept_low > 1) high_weight /= 2;
      kept_high = 0;
    } else {
      high_A = trial_A;
      high_weight = probe.headroom_V;
      if (++kept_high > 1) low_weight /= 2;
      kept_low = 0;
    }
  }
  return low;
}

}  // namespace

AvailableCurrent find_available_current(Network (*build)(const ElementValues&), ElementValues values,
                                        double required_V, const AvailableCurrent* near) {
  AvailableCurrent answer;
  if (!(values.load_cutoff_V > 0)) values.load_cutoff_V = 0.5 * required_V;
  const double most_A = charge_ceiling_A(values);
  values.rail_current_A = 0.4 * most_A;  // a load has to stand in the network; its size is set below
  const Network network = build(values);
  LoadScan scan(network, required_V);
  if (!scan.map().fault().empty()) {
    answer.reason = scan.map().fault();
    return answer;
  }

  const auto finish = [&](const LoadScan::Probe& probe, double current_A) {
    answer.usable = probe.usable;
    answer.reason = probe.reason;
    answer.current_A = probe.usable ? current_A : 0;
    answer.rail_min_V = probe.headroom_V + required_V;
    answer.state = probe.state;
    answer.steady_states = scan.solved;
    return answer;
  };

  if (near != nullptr && near->usable && near->current_A > 0) {
    const LoadRoot close = newton_load(scan.map(), near->state, near->current_A, required_V);
    if (close.found && close.current_A < most_A) {
      const auto probe = scan.at(close.current_A, scan.cold());
      if (probe.usable && std::abs(probe.headroom_V) <= kOnTarget_V) return finish(probe, close.current_A);
    }
  }

  // Not quite without load: an unloaded rail has no isolated periodic state.
  const double lightest_A = kLightest * most_A;
  const auto empty = scan.at(lightest_A, scan.cold());
  if (!empty.usable) return finish(empty, 0);
  if (!(empty.headroom_V >= 0)) {
    finish(empty, 0);
    answer.reason = "the unloaded rail stays below what is required";
    return answer;
  }

  // One Newton in the capacitor voltages and the load together, then a steady state from cold at its answer:
  // only that one is believed. Bridges need not be monotone in the load, so a lighter one is tried as well
  // (on 10,000 random bridges it never decided).
  double low_A = lightest_A;
  LoadScan::Probe low = empty;
  double high_A = most_A;
  double high_V = -required_V;
  const bool shunted = !network.thyristors.empty();
  const LoadRoot root = newton_load(scan.map(), empty.state, surplus_A(scan.map()), required_V);
  if (root.found && root.current_A < high_A) {
    const auto probe = scan.at(root.current_A, scan.cold());
    if (probe.usable && std::abs(probe.headroom_V) <= kOnTarget_V) {
      if (shunted) {  // tried at several lighter loads below
        low_A = root.current_A;
        low = probe;
      } else {
        const double lighter_A = kLighter * root.current_A;
        const auto lighter = scan.map().halved() ? scan.at(lighter_A, probe.state) : probe;
        if (lighter.usable && lighter.headroom_V >= -kOnTarget_V) return finish(probe, root.current_A);
        high_A = lighter_A;
        high_V = lighter.usable ? lighter.headroom_V : -required_V;
      }
    } else if (probe.usable && probe.headroom_V > 0) {
      low_A = root.current_A;
      low = probe;
    } else if (probe.usable) {
      high_A = root.current_A;
      high_V = probe.headroom_V;
    }
  }
  auto closed = close_bracket(scan, low_A, low, high_A, high_V);
  if (!shunted || !closed.usable) return finish(closed, closed.usable ? low_A : 0);
  for (const double share : kLighterShunt) {
    const double lighter_A = share * low_A;
    if (lighter_A <= lightest_A) break;
    const auto lighter = scan.at(lighter_A, scan.cold());
    if (lighter.usable && lighter.headroom_V >= -kOnTarget_V) continue;
    low_A = lightest_A;
    closed = close_bracket(scan, low_A, empty, lighter_A, lighter.usable ? lighter.headroom_V : -required_V);
    break;
  }
  return finish(closed, closed.usable ? low_A : 0);
}

}  // namespace dropfront::circuit
