#include "dropfront/circuit/greatest_power.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/load_newton.hpp"
#include "dropfront/circuit/settle.hpp"

namespace dropfront::circuit {

namespace {

constexpr double kTolerance = 2e-4;    // of the rail voltage
constexpr double kAgreement_V = 1e-5;  // of Newton's root with the independent steady state

struct Trial {
  double rail_V = 0;
  double power = 0;
  double turn = 0;  // derivative of the power by the rail voltage
  LoadRoot root;
};

class Search {
 public:
  Search(const Network& network, double overhead_A) : map_(network), overhead_A_(overhead_A) {
    for (std::size_t k = 0; k < network.capacitors.size(); ++k) cold_[k] = network.capacitors[k].start_V;
  }

  bool orbit_at(double load_A, StateVector& state, double& rail_V) {
    map_.set_load(load_A);
    SteadyOptions options;
    options.multipliers = false;
    const Settled settled = settle(map_, cold_, options);
    if (settled.found) {
      state = settled.start;
      rail_V = rail_extremes(map_.walker(), settled.segments).low;
    }
    return settled.found;
  }

  /// Scan of the load, then golden sections about its best: for rails that jump (thyristors).
  bool scan(double floor_V, double most_A, GreatestPower& answer) {
    constexpr int kLoads = 120;
    constexpr int kSections = 24;
    constexpr double kGolden = 0.6180339887498949;
    double best = -1;
    const auto consider = [&](double load_A) {
      StateVector state{};
      double rail_V = 0;
      ++answer.steady_states;
      if (!orbit_at(load_A, state, rail_V) || !(rail_V >= floor_V)) return -1.0;
      const double power = (load_A - overhead_A_) * rail_V;
      if (power > best) {
        best = power;
        answer.current_A = load_A;
        answer.rail_V = rail_V;
      }
      return power;
    };
    for (int k = 1; k <= kLoads; ++k) consider(overhead_A_ + (most_A - overhead_A_) * k / kLoads);
    if (best < 0) return false;
    const double width = (most_A - overhead_A_) / kLoads;
    double low = answer.current_A - width, high = std::min(most_A, answer.current_A + width);
    for (int k = 0; k < kSections; ++k) {
      const double left = high - kGolden * (high - low), right = low + kGolden * (high - low);
      if (consider(left) > consider(right)) {
        high = right;
      } else {
        low = left;
      }
    }
    answer.usable = true;
    return true;
  }

  bool try_at(double rail_V, const StateVector& from, double near_A, Trial& trial) {
    trial.rail_V = rail_V;
    trial.root = newton_load(map_, from, near_A, rail_V);
    if (!trial.root.found) return false;
    trial.power = (trial.root.current_A - overhead_A_) * rail_V;
    trial.turn = (trial.root.current_A - overhead_A_) + rail_V * trial.root.current_per_V;
    return true;
  }

 private:
  PeriodMap map_;
  double overhead_A_;
  StateVector cold_{};
};

}  // namespace

GreatestPower find_greatest_power(const Network& network, double floor_V, double floor_load_A,
                                  double overhead_A) {
  GreatestPower answer;
  Search search(network, overhead_A);
  const auto give_up = [&](const char* reason) {
    answer.reason = reason;
    return answer;
  };
  StateVector light{};
  StateVector at_floor{};
  double light_V = 0;
  double floor_rail_V = 0;
  const double lightest_A = std::max(overhead_A, 1e-3 * floor_load_A);
  answer.steady_states = 3;
  if (!search.orbit_at(lightest_A, light, light_V) ||
      !search.orbit_at(floor_load_A, at_floor, floor_rail_V)) {
    return give_up("no periodic steady state found");
  }
  if (!network.thyristors.empty()) {
    if (!search.scan(floor_V, floor_load_A, answer)) return give_up("no load holds the lowest rail");
    return answer;
  }
  Trial low, best;
  if (!search.try_at(floor_V, at_floor, floor_load_A, low)) return give_up("no load holds the lowest rail");
  best = low;
  double high_V = light_V;
  double high_turn = -low.root.current_A;  // beyond the overhead's own rail nothing is left
  double high_memory = high_turn;
  for (int k = 0; low.turn > 0 && high_V - low.rail_V > kTolerance * high_V && k < 40; ++k) {
    const double width = high_V - low.rail_V;
    double trial_V = low.rail_V + width * low.turn / (low.turn - high_memory);
    if (k % 2 == 1) trial_V = low.rail_V + 0.5 * width;
    trial_V = std::clamp(trial_V, low.rail_V + 0.02 * width, high_V - 0.02 * width);
    Trial trial;
    if (!search.try_at(trial_V, low.root.state, low.root.current_A, trial))
      return give_up("a load was not found");
    if (trial.power > best.power) best = trial;
    if (trial.turn > 0) {
      low = trial;
    } else {
      high_V = trial_V;
      high_memory = trial.turn;
    }
  }
  StateVector confirmed{};
  double rail_V = 0;
  if (!search.orbit_at(best.root.current_A, confirmed, rail_V))
    return give_up("no periodic steady state found");
  if (!(std::abs(rail_V - best.rail_V) <= kAgreement_V)) return give_up("the steady state disagrees");
  answer.usable = true;
  answer.current_A = best.root.current_A;
  answer.rail_V = rail_V;
  return answer;
}

}  // namespace dropfront::circuit
