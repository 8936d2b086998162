#include "dropfront/scoring/build.hpp"

#include <algorithm>
#include <array>

namespace dropfront::scoring {

namespace {

constexpr double kLeastEsrShare = 0.1;  // of the data maximum, as in the corners

struct Range {
  double low = 0, high = 0;
};

Range within(double value, double tolerance) { return {value * (1 - tolerance), value * (1 + tolerance)}; }

bool regulates(const parts::OutputStage& stage) { return stage.kind != parts::StageKind::direct; }

/// Ends of one figure of a design; both 0 where it has no such part.
Range range_of(const Design& design, BuildAxis axis) {
  const auto resistor = [](const parts::Resistor* part) {
    return part == nullptr ? Range{} : within(part->resistance_ohm, part->tolerance);
  };
  switch (axis) {
    case BuildAxis::dropper:
      if (design.dropper == nullptr) return {};
      return within(design.dropper->capacitance_F, design.dropper->tolerance);
    case BuildAxis::series_resistor:
      return resistor(design.series_resistor);
    case BuildAxis::clamp_voltage:
      return {design.clamp->voltage_min_V, design.clamp->voltage_max_V};
    case BuildAxis::clamp_slope:
      return {std::min(design.clamp->slope_min_ohm, design.clamp->slope_resistance_ohm),
              design.clamp->slope_resistance_ohm};
    case BuildAxis::reservoir:
      return within(design.reservoir->capacitance_F, design.reservoir->tolerance);
    case BuildAxis::esr:
      return {kLeastEsrShare * design.reservoir->esr_ohm, design.reservoir->esr_ohm};
    case BuildAxis::discharge:
      return design.discharge_count > 0 ? resistor(design.discharge) : Range{};
    case BuildAxis::stage_output:
      if (!regulates(*design.output_stage)) return {};
      return within(design.output_stage->output_voltage_V, design.output_stage->tolerance);
    case BuildAxis::ceramic:
      if (design.ceramic == nullptr) return {};
      return within(design.ceramic->capacitance_F, design.ceramic->tolerance);
    case BuildAxis::gate_resistor:
      return resistor(design.gate_resistor);
  }
  return {};
}

constexpr std::array<BuildAxis, 10> kAll{BuildAxis::dropper,       BuildAxis::series_resistor,
                                         BuildAxis::clamp_voltage, BuildAxis::clamp_slope,
                                         BuildAxis::reservoir,     BuildAxis::esr,
                                         BuildAxis::discharge,     BuildAxis::stage_output,
                                         BuildAxis::ceramic,       BuildAxis::gate_resistor};

template <class Part>
void own(const Part*& pointer, Part& copy) {
  if (pointer == nullptr) return;
  copy = *pointer;
  pointer = &copy;
}

}  // namespace

std::string_view build_axis_name(BuildAxis axis) {
  switch (axis) {
    case BuildAxis::dropper:
      return "dropper_F";
    case BuildAxis::series_resistor:
      return "series_resistor_ohm";
    case BuildAxis::clamp_voltage:
      return "clamp_V";
    case BuildAxis::clamp_slope:
      return "clamp_slope_ohm";
    case BuildAxis::reservoir:
      return "reservoir_F";
    case BuildAxis::esr:
      return "reservoir_esr_ohm";
    case BuildAxis::discharge:
      return "discharge_element_ohm";
    case BuildAxis::stage_output:
      return "stage_output_V";
    case BuildAxis::ceramic:
      return "ceramic_F";
    case BuildAxis::gate_resistor:
      return "gate_resistor_ohm";
  }
  return "";
}

std::vector<BuildAxis> build_axes(const Design& design) {
  std::vector<BuildAxis> axes;
  for (const BuildAxis axis : kAll) {
    const Range range = range_of(design, axis);
    if (range.low < range.high) axes.push_back(axis);
  }
  return axes;
}

Build::Build(const Design& design) : nominal_(design), built_(design) {
  own(built_.dropper, dropper_);
  own(built_.series_resistor, series_resistor_);
  own(built_.discharge, discharge_);
  own(built_.gate_resistor, gate_resistor_);
  own(built_.clamp, clamp_);
  own(built_.reservoir, reservoir_);
  own(built_.output_stage, stage_);
  own(built_.ceramic, ceramic_);
  dropper_.tolerance = series_resistor_.tolerance = discharge_.tolerance = gate_resistor_.tolerance = 0;
  reservoir_.tolerance = ceramic_.tolerance = clamp_.tolerance = 0;
  if (regulates(stage_)) stage_.tolerance = 0;
  clamp_.voltage_min_V = clamp_.voltage_max_V = clamp_.voltage_V;
  clamp_.slope_min_ohm = clamp_.slope_resistance_ohm;
}

void Build::set(BuildAxis axis, double position) {
  const Range range = range_of(nominal_, axis);
  const double share = position > 0 ? std::min(position, 1.0) : 0.0;
  const double value = share < 1 ? range.low + (range.high - range.low) * share : range.high;
  switch (axis) {
    case BuildAxis::dropper:
      dropper_.capacitance_F = value;
      return;
    case BuildAxis::series_resistor:
      series_resistor_.resistance_ohm = value;
      return;
    case BuildAxis::clamp_voltage:
      clamp_.voltage_V = clamp_.voltage_min_V = clamp_.voltage_max_V = value;
      return;
    case BuildAxis::clamp_slope:
      clamp_.slope_min_ohm = clamp_.slope_resistance_ohm = value;
      return;
    case BuildAxis::reservoir:
      reservoir_.capacitance_F = value;
      return;
    case BuildAxis::esr:
      // The cold value is a multiple of the part's own.
      if (reservoir_.esr_ohm > 0) reservoir_.esr_cold_ohm *= value / reservoir_.esr_ohm;
      reservoir_.esr_ohm = value;
      return;
    case BuildAxis::discharge:
      discharge_.resistance_ohm = value;
      return;
    case BuildAxis::stage_output:
      stage_.output_voltage_V = value;
      return;
    case BuildAxis::ceramic:
      ceramic_.capacitance_F = value;
      return;
    case BuildAxis::gate_resistor:
      gate_resistor_.resistance_ohm = value;
      return;
  }
}

double Build::value(BuildAxis axis) const {
  switch (axis) {
    case BuildAxis::dropper:
      return dropper_.capacitance_F;
    case BuildAxis::series_resistor:
      return series_resistor_.resistance_ohm;
    case BuildAxis::clamp_voltage:
      return clamp_.voltage_V;
    case BuildAxis::clamp_slope:
      return clamp_.slope_resistance_ohm;
    case BuildAxis::reservoir:
      return reservoir_.capacitance_F;
    case BuildAxis::esr:
      return reservoir_.esr_ohm;
    case BuildAxis::discharge:
      return discharge_.resistance_ohm;
    case BuildAxis::stage_output:
      return stage_.output_voltage_V;
    case BuildAxis::ceramic:
      return ceramic_.capacitance_F;
    case BuildAxis::gate_resistor:
      return gate_resistor_.resistance_ohm;
  }
  return 0;
}

}  // namespace dropfront::scoring
