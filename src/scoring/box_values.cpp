#include "dropfront/scoring/box_values.hpp"

#include <algorithm>

#include "dropfront/circuit/derating.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/clamp_power.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/load_profile.hpp"

namespace dropfront::scoring {

std::string_view box_quantity_name(BoxQuantity quantity) {
  switch (quantity) {
    case BoxQuantity::margin:
      return "supply.margin";
    case BoxQuantity::rail:
      return "rail.max";
    case BoxQuantity::standby:
      return "standby.power";
    case BoxQuantity::clamp_power:
      return "clamp.power";
    case BoxQuantity::resistor_power:
      return "resistor.power";
    case BoxQuantity::input_power:
      return "input.power";
  }
  return "";
}

std::string_view box_quantity_unit(BoxQuantity quantity) {
  if (quantity == BoxQuantity::margin) return "A";
  return quantity == BoxQuantity::rail ? "V" : "W";
}

std::optional<double> box_limit(BoxQuantity quantity, const Design& design, const Requirement& requirement) {
  const auto times = [](const parts::Rating& rating, double share) -> std::optional<double> {
    return rating ? std::optional(*rating * share) : std::nullopt;
  };
  switch (quantity) {
    case BoxQuantity::margin:
      return requirement.limits.current_margin * load_profile(requirement.output).heaviest_output_A();
    case BoxQuantity::rail: {
      const double can_V = design.reservoir->rated_voltage_V * requirement.derating.reservoir_voltage;
      if (!has_input_rating(*design.output_stage)) return can_V;
      if (!design.output_stage->input_max_V) return std::nullopt;
      return std::min(can_V, *design.output_stage->input_max_V);
    }
    case BoxQuantity::standby:
      return requirement.limits.standby_power_W;
    case BoxQuantity::clamp_power:
      return times(design.clamp->rated_power_W, requirement.derating.clamp_power);
    case BoxQuantity::resistor_power:
      return times(design.series_resistor->rated_power_W, requirement.derating.resistor_power);
    case BoxQuantity::input_power:
      break;
  }
  return std::nullopt;
}

std::optional<double> box_value(BoxQuantity quantity, const Design& design, const Supply& supply,
                                const OperatingPoint& point) {
  if (!point.state.usable()) return std::nullopt;
  switch (quantity) {
    case BoxQuantity::margin:
      return std::nullopt;
    case BoxQuantity::rail:
      return point.rail_greatest_V;
    case BoxQuantity::standby:
    case BoxQuantity::input_power:
      return point.state.input_power_W;
    case BoxQuantity::clamp_power:
      return clamp_power_W(*design.arrangement, point.values, point.state);
    case BoxQuantity::resistor_power: {
      constexpr double kLeastShare = 1e-3;  // keeps a hopeless design's figure finite
      const double loss_W = point.state.loss_W[static_cast<std::size_t>(circuit::Owner::series_resistor)];
      const double heating = supply.harmonics_given ? 1 : kUnstatedHarmonicsHeating;
      const double share = std::max(kLeastShare, circuit::resistor_power_share(point.local_degC));
      return loss_W * heating / design.series_resistor_count / share;
    }
  }
  return std::nullopt;
}

std::optional<double> corner_value(BoxQuantity quantity, const Design& design, const Requirement& requirement,
                                   const Supply& supply) {
  Evidence evidence(design, requirement, supply);
  if (quantity == BoxQuantity::margin) {
    const LeanAnswer& lean = evidence.lean();
    return lean.usable ? std::optional(lean.margin_A) : std::nullopt;
  }
  if (quantity == BoxQuantity::rail) return box_value(quantity, design, supply, evidence.rich_empty());
  if (quantity == BoxQuantity::standby) return box_value(quantity, design, supply, evidence.standby_worst());
  std::optional<double> worst;
  for (const OperatingPoint* point : rich_points(evidence)) {
    const auto value = box_value(quantity, design, supply, *point);
    if (!value) return std::nullopt;
    worst = worst ? std::max(*worst, *value) : *value;
  }
  return worst;
}

}  // namespace dropfront::scoring
