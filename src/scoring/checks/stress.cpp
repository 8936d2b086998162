#include "dropfront/scoring/checks/stress.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/derating.hpp"
#include "dropfront/circuit/pulse.hpp"

namespace dropfront::scoring {
namespace {

double loss_W(const circuit::SteadyState& state, circuit::Owner owner) {
  return state.loss_W[static_cast<std::size_t>(owner)];
}

}  // namespace

double stage_loss_W(const parts::OutputStage& stage, double rail_mean_V, double output_current_A) {
  const double quiescent = rail_mean_V * stage.quiescent_current_A;
  switch (stage.kind) {
    case parts::StageKind::direct:
      return 0;
    case parts::StageKind::linear: {
      const double drop = rail_mean_V - stage.output_voltage_V * (1 - stage.tolerance);
      return std::max(drop, 0.0) * output_current_A + quiescent;
    }
    case parts::StageKind::step_down: {
      const double output = stage.output_voltage_V * (1 + stage.tolerance) * output_current_A;
      return output * std::max(1 / stage.efficiency.value_or(1) - 1, 0.0) + quiescent;
    }
  }
  return 0;
}

std::optional<double> pulse_limit_J(const parts::Resistor& part, double pulse_s) {
  constexpr double kFilmRating_s = 1e-3;
  if (!part.pulse_energy_J || part.construction == parts::Construction::wirewound) return part.pulse_energy_J;
  return circuit::film_pulse_energy_J(*part.pulse_energy_J, kFilmRating_s, pulse_s);
}

std::optional<double> pulse_energy_limit_J(const parts::Resistor& part, double resistance_ohm,
                                           double capacitance_F) {
  return pulse_limit_J(part, circuit::exponential_pulse_s(resistance_ohm, capacitance_F));
}

double reservoir_current_Arms(const Evidence& evidence, const OperatingPoint& point) {
  const auto network = evidence.design().arrangement->build(point.values);
  const std::size_t count = std::min(network.capacitors.size(), point.state.capacitor_current_Arms.size());
  for (std::size_t i = 0; i < count; ++i)
    if (network.capacitors[i].owner == circuit::Owner::reservoir)
      return point.state.capacitor_current_Arms[i];
  return 0;
}

std::optional<double> carried_ripple_rating_Arms(const Evidence& evidence, const OperatingPoint& point) {
  const parts::Reservoir& part = *evidence.design().reservoir;
  if (!part.ripple_current_Arms) return std::nullopt;
  const double line_Hz = point.values.mains.frequency_Hz();
  const double running_Hz = evidence.design().arrangement->full_wave ? 2 * line_Hz : line_Hz;
  return *part.ripple_current_Arms * circuit::ripple_rating_factor(part.ripple_frequency_Hz, running_Hz);
}

bool has_input_rating(const parts::OutputStage& stage) {
  return stage.kind != parts::StageKind::direct || stage.input_max_V.has_value();
}

double discharge_chain_Vrms(const OperatingPoint& point) {
  if (!std::isfinite(point.values.discharge_ohm)) return 0;
  const double power = loss_W(point.state, circuit::Owner::discharge);
  return std::sqrt(std::max(power, 0.0) * point.values.discharge_ohm);
}

std::vector<const OperatingPoint*> loaded_points(Evidence& evidence) {
  std::vector<const OperatingPoint*> points;
  for (const OperatingPoint& point : evidence.rich_loads()) points.push_back(&point);
  return points;
}

std::vector<const OperatingPoint*> rich_points(Evidence& evidence) {
  std::vector<const OperatingPoint*> points{&evidence.rich_empty_hot(), &evidence.rich_empty_cold()};
  for (const OperatingPoint* point : loaded_points(evidence)) points.push_back(point);
  return points;
}

}  // namespace dropfront::scoring
