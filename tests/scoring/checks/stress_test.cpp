#include "dropfront/scoring/checks/stress.hpp"

#include <cmath>

#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
constexpr double kRounding = 1e-12;

parts::OutputStage linear_5V() {
  parts::OutputStage stage;
  stage.kind = parts::StageKind::linear;
  stage.output_voltage_V = 5;
  stage.quiescent_current_A = 3e-3;
  return stage;
}

TEST_CASE("a linear stage's loss and its output power make up what the rail gives") {
  const double rail = 11.5, load = 20e-3;
  const double rail_W = rail * (load + 3e-3);
  CHECK_THAT(stage_loss_W(linear_5V(), rail, load) + 5 * load, WithinRel(rail_W, kRounding));
}

TEST_CASE("a step-down's loss and its output power make up what the rail gives") {
  parts::OutputStage stage;
  stage.kind = parts::StageKind::step_down;
  stage.output_voltage_V = 5;
  stage.quiescent_current_A = 60e-6;
  stage.efficiency = 0.84;
  const double rail = 27, load = 30e-3;
  const double rail_W = 5 * load / 0.84 + rail * 60e-6;
  CHECK_THAT(stage_loss_W(stage, rail, load) + 5 * load, WithinRel(rail_W, kRounding));
}

TEST_CASE("a stage's loss never falls with load nor with rail and is never negative") {
  const parts::OutputStage stage = linear_5V();
  for (double rail = 1; rail < 30; rail += 1)
    for (double load = 0; load < 0.1; load += 0.01) {
      const double loss = stage_loss_W(stage, rail, load);
      CHECK(loss >= 0);
      CHECK(stage_loss_W(stage, rail + 1, load) >= loss);
      CHECK(stage_loss_W(stage, rail, load + 0.01) >= loss);
    }
}

TEST_CASE("a direct output has no stage to lose power in") {
  CHECK(stage_loss_W(parts::OutputStage{}, 12, 0.02) == 0);
}

TEST_CASE("a wirewound part's joules do not depend on the pulse, a film part's go with the root of R·C") {
  parts::Resistor part;
  part.pulse_energy_J = 0.2;
  part.construction = parts::Construction::wirewound;
  CHECK(pulse_energy_limit_J(part, 47, 0.47e-6) == 0.2);
  CHECK(pulse_energy_limit_J(part, 470, 4.7e-6) == 0.2);
  part.construction = parts::Construction::film;
  // R·C/2 = 1 ms: the rated pulse itself.
  CHECK_THAT(*pulse_energy_limit_J(part, 1000, 2e-6), WithinRel(0.2, kRounding));
  CHECK_THAT(*pulse_energy_limit_J(part, 10, 2e-6), WithinRel(0.02, kRounding));
  // Same peak power times root of length: P·√t of the pulse at its limit is that of the rated one.
  const double length = 10 * 2e-6 / 2, energy = *pulse_energy_limit_J(part, 10, 2e-6);
  CHECK_THAT(energy / length * std::sqrt(length), WithinRel(0.2 / 1e-3 * std::sqrt(1e-3), kRounding));
  part.pulse_energy_J.reset();
  CHECK_FALSE(pulse_energy_limit_J(part, 47, 1e-6));
}

TEST_CASE("the chain's voltage follows from its loss, and a missing chain has none") {
  OperatingPoint point;
  point.values.discharge_ohm = 940e3;
  point.state.loss_W[static_cast<std::size_t>(circuit::Owner::discharge)] = 230.0 * 230.0 / 940e3;
  CHECK_THAT(discharge_chain_Vrms(point), WithinAbs(230.0, 1e-9));  // rounding only
  CHECK(discharge_chain_Vrms(OperatingPoint{}) == 0);
}

}  // namespace
}  // namespace dropfront::scoring
