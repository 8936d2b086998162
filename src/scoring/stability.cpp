#include "dropfront/scoring/stability.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/rail_run.hpp"

namespace dropfront::scoring {

namespace {

constexpr int kMarched = 64;
constexpr int kCounted = 32;
constexpr double kKick = 0.01;
constexpr double kPeriodic_V = 1e-7;

void march(const circuit::Network& network, circuit::StateVector x, StabilityAnswer& answer) {
  for (double& v : x) v *= 1 - kKick;
  circuit::RailRun run(network);
  circuit::RunPoint at{network.period_start_s, x, 0};
  circuit::Extremes rail;
  bool periodic = false;
  for (int k = 0; k < kMarched && !periodic; ++k) {
    const circuit::StateVector before = at.x;
    circuit::Extremes period;
    if (!run.advance(run.period_s(), at, &period)) {
      answer.usable = false;
      answer.reason = run.fault();
      return;
    }
    double moved_V = 0;
    for (std::size_t i = 0; i < before.size(); ++i) {
      moved_V = std::max(moved_V, std::abs(at.x[i] - before[i]));
    }
    periodic = moved_V < kPeriodic_V;
    if (periodic || k >= kMarched - kCounted) rail.include(period.low, period.low_at_s);
  }
  answer.rail_min_V = rail.low;
}

StabilityAnswer try_ambient(const LeanRuns& runs, const OperatingPoint& settled, const RailLoad& load) {
  StabilityAnswer answer;
  answer.at = settled;
  answer.usable = settled.state.usable();
  answer.reason = settled.state.reason;
  answer.rail_min_V = settled.state.rail_min_V;
  const bool latches = runs.points->design().arrangement->thyristor_shunt;
  if (!answer.usable || (!latches && !(load.power_W > 0))) return answer;
  const auto values = runs.values(settled, runs.ends, load);
  const auto state = load.power_W > 0 ? runs.steady(values, settled) : settled.state;
  if (!state.usable()) {
    answer.usable = false;
    answer.reason = state.reason;
    return answer;
  }
  answer.rail_min_V = state.rail_min_V;
  answer.shown = StabilityShown::alternating;
  if (state.status == circuit::SteadyStatus::alternating) return answer;
  answer.shown = StabilityShown::marched;
  ++*runs.transients;
  march(runs.network(values), state.start, answer);
  return answer;
}

}  // namespace

StabilityAnswer try_stability(const LeanRuns& runs, const LoadProfile& loads) {
  const RailLoad load =
      rail_load(runs.stage(), loads.heaviest_output_A(),
                runs.points->design().reservoir->leakage_A + loads.heaviest_rail_A(), Quiescent::data);
  StabilityAnswer worst;
  worst.reason = runs.fault();
  if (!worst.reason.empty()) return worst;
  for (const OperatingPoint* settled : runs.heaviest) {
    auto answer = try_ambient(runs, *settled, load);
    if (!answer.usable) return answer;
    if (!worst.usable || answer.rail_min_V < worst.rail_min_V) worst = std::move(answer);
  }
  return worst;
}

}  // namespace dropfront::scoring
