#include <fmt/format.h>

#include <string>

#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/lean_event.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/start_up.hpp"

namespace dropfront::scoring {

namespace {

using Outcome = circuit::StartUp::Outcome;

std::string why_not(Outcome outcome, double given_up_s) {
  switch (outcome) {
    case Outcome::reached:
      return {};
    case Outcome::stays_low:
      return "; it never does: the rail comes to rest below, the value is where the run was given up";
    case Outcome::cuts_out:
      return "; it never does: the stage pulls the rail below its turn-off threshold each time it starts";
    case Outcome::not_yet:
      break;
  }
  return fmt::format("; not within {:g} s, where the run was given up", given_up_s);
}

}  // namespace

std::optional<Check> supply_start_time(Evidence& evidence) {
  const auto limit_s = evidence.requirement().limits.start_time_s;
  if (!limit_s) return std::nullopt;
  const parts::OutputStage& stage = *evidence.design().output_stage;
  if (stage.kind == parts::StageKind::step_down && !stage.input_on_V) {
    return at_most("supply.start_time", std::nullopt, std::nullopt, "s", at_corner("lean"),
                   "start not shown: input_on is not given");
  }
  const StartUpAnswer& answer = evidence.start_up();
  const double given_up_s = 2 * *limit_s;
  const bool reached = answer.start.outcome == Outcome::reached;
  Check check =
      at_most("supply.start_time", reached ? answer.start.time_s : given_up_s, limit_s, "s",
              at_run(evidence, answer.ambient_degC, answer.ends, answer.start.phase_deg, answer.values,
                     answer.local_degC, answer.clamp_junction_degC, "start load"),
              "from switching on at the worst mains phase, all capacitors empty, to the last moment "
              "below V_required; lean corner with the greatest reservoir" +
                  why_not(answer.start.outcome, given_up_s));
  check.figures = {{"required_rail_V", evidence.required_rail_V()},
                   {"start_load_A", evidence.requirement().output.start_load_A},
                   {"overhead_current_A", evidence.overhead_A(true)}};
  add_figure(check, "turn_on_V", stage.input_on_V);
  return answer.usable ? check : unsolved(check, answer.reason);
}

}  // namespace dropfront::scoring
