// The runs of an Evidence from the lean corner's steady states.
#include "evidence_impl.hpp"

namespace dropfront::scoring {

/// Both ambients at the ends that decide the available current: what the runs do with the other ends, they do
/// from there.
const LeanRuns& Evidence::Impl::lean_runs() {
  auto& runs = events.runs;
  if (runs) return *runs;
  runs.emplace();
  runs->points = &points;
  runs->solver = &lean_search.solver();
  runs->transients = &transients;
  if (!required) {
    runs->reason = "the rail the output stage needs is not given (input_min)";
    return *runs;
  }
  const auto& found = lean_search.least();
  if (!found.usable) {
    runs->reason = found.reason;
    return *runs;
  }
  runs->ends = found.where.ends;
  const bool hot = found.where.ambient_degC == ambient_degC(true);
  events.heaviest.push_back(lean_point(hot));
  if (!one_ambient() && events.heaviest.front().state.usable()) {
    auto other = points.solve(hot ? "lean_cold" : "lean_hot", runs->solver->recipe(runs->ends),
                              heaviest(true, End::high), ambient_degC(!hot), &events.heaviest.front());
    other.ends = ends_text(runs->ends, bled());
    events.heaviest.push_back(std::move(other));
  }
  for (const auto& point : events.heaviest) runs->heaviest.push_back(&point);
  return *runs;
}

const std::vector<BurstAnswer>& Evidence::load_bursts() {
  auto& answers = impl_->events.bursts;
  if (!answers) answers = try_bursts(impl_->lean_runs(), impl_->loads);
  return *answers;
}

const DipAnswer& Evidence::dip() {
  auto& answer = impl_->events.dip;
  if (!answer) answer = try_dips(impl_->lean_runs(), impl_->loads);
  return *answer;
}

const StartUpAnswer& Evidence::start_up() {
  constexpr double kGiveUp = 2;  // limits
  auto& answer = impl_->events.start_up;
  if (!answer) {
    const double limit_s = impl_->requirement->limits.start_time_s.value_or(0);
    answer = try_start(impl_->lean_runs(), overhead_A(true), kGiveUp * limit_s);
  }
  return *answer;
}

const StabilityAnswer& Evidence::stability() {
  auto& answer = impl_->events.stability;
  if (!answer) answer = try_stability(impl_->lean_runs(), impl_->loads);
  return *answer;
}

}  // namespace dropfront::scoring
