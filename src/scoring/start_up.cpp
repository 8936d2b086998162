#include "dropfront/scoring/start_up.hpp"

#include <optional>

namespace dropfront::scoring {

namespace {

/// A first start at the low ambient finds nothing warmed yet, one at the high ambient comes after a break.
Rises start_rises(const LeanRuns& runs, const OperatingPoint& settled) {
  const auto& ambient = runs.points->requirement().surroundings.ambient_degC;
  if (settled.ambient_degC != ambient.high) return {};
  return {settled.local_degC - settled.ambient_degC, settled.clamp_junction_degC - settled.local_degC};
}

/// Values of the lean corner but for the reservoir, with the load as it is once the stage runs.
circuit::ElementValues start_values(const LeanRuns& runs, const OperatingPoint& settled,
                                    const RailLoad& load) {
  auto recipe = runs.solver->recipe(runs.ends);
  recipe.reservoir = End::high;
  auto values = runs.points->values(recipe, start_rises(runs, settled), settled.ambient_degC);
  hang(load, runs.stage(), runs.required_V(), values);
  return values;
}

circuit::StartUp start_up(const LeanRuns& runs, const circuit::ElementValues& values) {
  const auto& stage = runs.stage();
  if (!(values.rail_power_W > 0)) return {runs.network(values), std::nullopt, 0, 0, runs.required_V()};
  auto off = values;
  off.rail_power_W = 0;
  return {runs.network(off), runs.network(values), stage.input_on_V.value_or(runs.required_V()),
          stage.input_off_V.value_or(0), runs.required_V()};
}

}  // namespace

StartUpAnswer try_start(const LeanRuns& runs, double beside_A, double give_up_s) {
  StartUpAnswer answer;
  answer.reason = runs.fault();
  if (!answer.reason.empty()) return answer;
  const auto& design = runs.points->design();
  const RailLoad load =
      rail_load(runs.stage(), runs.points->requirement().output.start_load_A, beside_A, Quiescent::least);
  answer.ends = ends_text(runs.ends, design.discharge != nullptr && design.discharge_count > 0);
  for (const OperatingPoint* settled : runs.heaviest) {
    const bool first = settled == runs.heaviest.front();
    const auto values = start_values(runs, *settled, load);
    auto starter = start_up(runs, values);
    const auto start = first ? starter.worst(give_up_s) : starter.at(answer.start.phase_deg, give_up_s);
    *runs.transients += starter.runs();
    if (!first && !start.longer_than(answer.start)) continue;
    answer.start = start;
    answer.ambient_degC = settled->ambient_degC;
    answer.values = values;
    const auto warm = start_rises(runs, *settled).over(settled->ambient_degC);
    answer.local_degC = warm.local_degC;
    answer.clamp_junction_degC = warm.clamp_junction_degC;
    if (!start.usable || start.outcome != circuit::StartUp::Outcome::reached) break;
  }
  answer.usable = answer.start.usable;
  answer.reason = answer.start.reason;
  return answer;
}

}  // namespace dropfront::scoring
