#include "dropfront/scoring/lean_runs.hpp"

#include <cmath>
#include <utility>

#include "dropfront/circuit/disturbance.hpp"

namespace dropfront::scoring {

namespace {

constexpr circuit::SteadyOptions kRailOnly{.powers = false, .multipliers = false};
constexpr double kLower_V = 1e-6;

End flipped(End end) { return end == End::low ? End::high : End::low; }

/// One ambient and one choice of ends, ready to be disturbed.
struct Trial {
  const OperatingPoint* settled = nullptr;
  LeanEnds ends;
  circuit::ElementValues values;
  circuit::SteadyState start;
};

Trial set_up(const LeanRuns& runs, const LeanEvent& event, const OperatingPoint& settled,
             const LeanEnds& ends) {
  Trial trial{&settled, ends, runs.values(settled, ends, event.before), {}};
  trial.start = runs.steady(trial.values, settled);
  return trial;
}

EventAnswer answer_of(const LeanRuns& runs, const Trial& trial, const circuit::Disturbance::Least& least) {
  EventAnswer answer;
  answer.usable = trial.start.usable() && least.usable;
  answer.reason = trial.start.usable() ? least.reason : trial.start.reason;
  answer.rail_min_V = least.rail_V;
  answer.steady_min_V = trial.start.rail_min_V;
  answer.phase_deg = least.phase_deg;
  answer.recovers = least.recovers;
  answer.ambient_degC = trial.settled->ambient_degC;
  const auto& design = runs.points->design();
  answer.ends = ends_text(trial.ends, design.discharge != nullptr && design.discharge_count > 0);
  answer.values = trial.values;
  answer.local_degC = trial.settled->local_degC;
  answer.clamp_junction_degC = trial.settled->clamp_junction_degC;
  return answer;
}

enum class Search { at_phase, whole_grid, around_phase };

/// One trial: at one phase, over all, or refined around one and then repeated if the event is.
EventAnswer run(const LeanRuns& runs, const LeanEvent& event, const Trial& trial, Search search,
                double phase_deg) {
  if (!trial.start.usable()) return answer_of(runs, trial, {});
  auto during = trial.values;
  event.disturb(during);
  circuit::Disturbance disturbed(runs.network(trial.values), runs.network(during), event.duration_s,
                                 trial.start, runs.required_V());
  auto least = search == Search::at_phase     ? disturbed.at(phase_deg)
               : search == Search::whole_grid ? disturbed.worst_of_grid()
                                              : disturbed.worst_around(phase_deg);
  if (search == Search::around_phase && least.usable && event.every_s) {
    const auto repeated = disturbed.repeated(least.phase_deg, *event.every_s);
    if (!repeated.usable || repeated.rail_V < least.rail_V || !repeated.recovers) least = repeated;
  }
  *runs.transients += disturbed.runs();
  return answer_of(runs, trial, least);
}

/// The ends with each one turned that lowers the rail at this phase.
LeanEnds worse_ends(const LeanRuns& runs, const LeanEvent& event, const LeanEnds& ends, double rail_V,
                    double phase_deg) {
  const auto& design = runs.points->design();
  LeanEnds worse = ends;
  for (const auto member : {&LeanEnds::series_resistor, &LeanEnds::esr, &LeanEnds::discharge}) {
    if (member == &LeanEnds::discharge && (design.discharge == nullptr || design.discharge_count <= 0)) {
      continue;
    }
    LeanEnds turned = ends;
    turned.*member = flipped(turned.*member);
    const auto trial = set_up(runs, event, *runs.heaviest.front(), turned);
    const auto answer = run(runs, event, trial, Search::at_phase, phase_deg);
    if (answer.usable && answer.rail_min_V < rail_V - kLower_V) worse.*member = turned.*member;
  }
  return worse;
}

}  // namespace

std::string LeanRuns::fault() const {
  for (const auto* point : heaviest) {
    if (!point->state.usable()) return point->state.reason;
  }
  return heaviest.empty() && reason.empty() ? "the lean corner has no answer" : reason;
}

circuit::ElementValues LeanRuns::values(const OperatingPoint& settled, const LeanEnds& at,
                                        const RailLoad& load) const {
  const Rises rises{settled.local_degC - settled.ambient_degC,
                    settled.clamp_junction_degC - settled.local_degC};
  auto values = points->values(solver->recipe(at), rises, settled.ambient_degC);
  hang(load, stage(), required_V(), values);
  return values;
}

circuit::Network LeanRuns::network(const circuit::ElementValues& values) const {
  return points->design().arrangement->build(values);
}

circuit::SteadyState LeanRuns::steady(const circuit::ElementValues& values,
                                      const OperatingPoint& settled) const {
  auto state = points->steady(values, kRailOnly, &settled.state.start);
  if (state.usable() || !(values.rail_power_W > 0)) return state;
  auto flat = values;
  flat.rail_power_W = 0;
  flat.rail_current_A = settled.rail_current_A;
  return points->steady(flat, kRailOnly, &settled.state.start);
}

EventAnswer worst_event(const LeanRuns& runs, const std::vector<LeanEvent>& events) {
  EventAnswer worst;
  worst.reason = runs.fault();
  if (!worst.reason.empty()) return worst;
  LeanEnds ends = runs.ends;
  ends.esr = End::high;
  std::size_t which = 0;
  for (std::size_t i = 0; i < events.size(); ++i) {
    const auto trial = set_up(runs, events[i], *runs.heaviest.front(), ends);
    auto answer = run(runs, events[i], trial, Search::whole_grid, 0);
    if (!answer.usable) return answer;
    if (i > 0 && !(answer.rail_min_V < worst.rail_min_V)) continue;
    worst = std::move(answer);
    which = i;
  }
  const LeanEvent& event = events[which];
  const OperatingPoint* where = runs.heaviest.front();
  const auto lower = [&](const OperatingPoint& settled, const LeanEnds& at) {
    auto answer = run(runs, event, set_up(runs, event, settled, at), Search::at_phase, worst.phase_deg);
    if (answer.usable && !(answer.rail_min_V < worst.rail_min_V)) return false;
    worst = std::move(answer);
    return true;
  };
  const LeanEnds turned = worse_ends(runs, event, ends, worst.rail_min_V, worst.phase_deg);
  if (turned != ends && lower(*where, turned)) ends = turned;
  for (std::size_t i = 1; i < runs.heaviest.size() && worst.usable; ++i) {
    if (lower(*runs.heaviest[i], ends)) where = runs.heaviest[i];
  }
  if (!worst.usable) return worst;
  worst = run(runs, event, set_up(runs, event, *where, ends), Search::around_phase, worst.phase_deg);
  worst.event = which;
  worst.phase_deg = std::fmod(worst.phase_deg, 360);
  return worst;
}

}  // namespace dropfront::scoring
