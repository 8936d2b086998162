#include "dropfront/scoring/load_bursts.hpp"

#include <algorithm>

namespace dropfront::scoring {

namespace {

double mean_A(const Load& burst) {
  if (!burst.period_s || !(*burst.period_s > 0)) return 0;
  return std::clamp(*burst.duration_s / *burst.period_s, 0.0, 1.0) * burst.current_A;
}

BurstAnswer try_burst(const LeanRuns& runs, const LoadProfile& loads, const Load& burst) {
  const auto& stage = runs.stage();
  const double at_rail_A = burst.at_rail ? 1 : 0, at_output_A = 1 - at_rail_A;
  const double leakage_A = runs.points->design().reservoir->leakage_A;
  const double others_A = loads.heaviest_output_A() - at_output_A * mean_A(burst);
  const double beside_A = leakage_A + loads.heaviest_rail_A() - at_rail_A * mean_A(burst);
  const RailLoad during = rail_load(stage, others_A + at_output_A * burst.current_A,
                                    beside_A + at_rail_A * burst.current_A, Quiescent::data);
  LeanEvent event;
  event.before = rail_load(stage, others_A, beside_A, Quiescent::data);
  event.disturb = [&](circuit::ElementValues& values) { hang(during, stage, runs.required_V(), values); };
  event.duration_s = *burst.duration_s;
  event.every_s = burst.period_s;
  BurstAnswer answer;
  answer.name = burst.name;
  answer.burst_A = burst.current_A;
  answer.duration_s = *burst.duration_s;
  answer.required_V = runs.required_V();
  if (burst.at_rail) answer.required_V = std::max(answer.required_V, burst.min_voltage_V.value_or(0));
  answer.worst = worst_event(runs, {event});
  return answer;
}

}  // namespace

std::vector<BurstAnswer> try_bursts(const LeanRuns& runs, const LoadProfile& loads) {
  std::vector<BurstAnswer> answers;
  for (const Load& load : runs.points->requirement().output.loads) {
    if (load.duration_s) answers.push_back(try_burst(runs, loads, load));
  }
  return answers;
}

}  // namespace dropfront::scoring
