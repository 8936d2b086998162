#include "dropfront/scoring/tolerance_box.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <numbers>

#include "dropfront/scoring/box_values.hpp"
#include "dropfront/scoring/corners/mains_shape.hpp"
#include "dropfront/scoring/load_profile.hpp"
#include "dropfront/scoring/recipes.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring {

namespace {

constexpr std::size_t kMostTurned = 4;  // harmonics whose phase is an axis of its own
constexpr std::array<std::string_view, kMostTurned> kTurnNames{
    "first_harmonic_half_turns", "second_harmonic_half_turns", "third_harmonic_half_turns",
    "fourth_harmonic_half_turns"};
constexpr double kUnstatedThird = 0.03;  // the default third harmonic of the lean and rich shapes

/// Half turns of each harmonic that lead from its given phase to a shape's.
std::vector<double> turns_to(const circuit::Waveform& shape, const std::vector<circuit::Harmonic>& given) {
  std::vector<double> turns;
  for (std::size_t i = 0; i < given.size(); ++i) {
    double turn = 0;
    for (const auto& tone : shape.tones())
      if (tone.order == given[i].order) turn = (tone.phase_rad - given[i].phase_rad) / std::numbers::pi;
    turns.push_back(std::abs(std::remainder(turn, 2)) > 0.5 ? 1 : 0);
  }
  return turns;
}

/// The end the corner takes of a part, 0 or 1.
double corner_end(BoxQuantity quantity, BuildAxis axis) {
  const bool lean = quantity == BoxQuantity::margin;
  switch (axis) {
    case BuildAxis::dropper:
    case BuildAxis::clamp_voltage:
      return lean ? 0 : 1;
    case BuildAxis::discharge:
    case BuildAxis::reservoir:
    case BuildAxis::ceramic:
      return 0;
    case BuildAxis::clamp_slope:
      // Low curve: V0 from the greatest slope. High curve: the least.
      return lean ? 1 : 0;
    case BuildAxis::series_resistor:
    case BuildAxis::esr:
    case BuildAxis::stage_output:
    case BuildAxis::gate_resistor:
      return 1;
  }
  return 1;
}

}  // namespace

ToleranceBox::ToleranceBox(const Design& design, const Requirement& requirement, const Supply& supply,
                           BoxQuantity quantity)
    : design_(design), requirement_(&requirement), supply_(&supply), quantity_(quantity) {
  for (const BuildAxis part : build_axes(design_))
    axes_.push_back({build_axis_name(part), part, 0, 1, corner_end(quantity, part)});
  parts_ = axes_.size();
  harmonics_ =
      supply.harmonics_given ? supply.harmonics : std::vector<circuit::Harmonic>{{3, kUnstatedThird, 0}};
  add_conditions();
}

void ToleranceBox::add_conditions() {
  const MainsShapes shapes = mains_shapes(*supply_);
  const auto& ambient = requirement_->surroundings.ambient_degC;
  const bool lean = quantity_ == BoxQuantity::margin;
  if (quantity_ == BoxQuantity::standby) {
    corner_ = {supply_->voltage_Vrms.nominal, supply_->frequency_Hz.nominal, {}, kStandby_degC, 0, 0};
    corner_mains_ = shapes.nominal;
    return;
  }
  const auto add = [&](std::string_view name, double low, double high, double at) {
    if (low < high) axes_.push_back({name, {}, low, high, at});
  };
  const auto& V = supply_->voltage_Vrms;
  const auto& f = supply_->frequency_Hz;
  corner_ = {lean ? V.low : V.high,
             lean ? f.low : f.high,
             turns_to(lean ? shapes.lean : shapes.rich, harmonics_),
             ambient.high,
             0,
             lean ? 1.0 : 0.0};
  corner_mains_ = lean ? shapes.lean : shapes.rich;
  add("line_voltage_Vrms", V.low, V.high, lean ? 0 : 1);
  add("line_frequency_Hz", f.low, f.high, lean ? 0 : 1);
  if (!(supply_->harmonics_given && supply_->phases_as_given))
    for (std::size_t i = 0; i < std::min(harmonics_.size(), kMostTurned); ++i)
      add(kTurnNames[i], 0, 1, corner_.turns[i]);
  add("ambient_degC", ambient.low, ambient.high, 1);
  if (!lean) add("load_share", 0, 1, 0);
  add("age_lives", 0, 1, lean ? 1 : 0);
}

std::vector<double> ToleranceBox::corner() const {
  std::vector<double> position;
  for (const Axis& axis : axes_) position.push_back(axis.corner);
  return position;
}

void ToleranceBox::set(const std::vector<double>& position, Build& build, Conditions& conditions) const {
  conditions = corner_;
  std::size_t turned = 0;
  for (std::size_t k = 0; k < axes_.size() && k < position.size(); ++k) {
    const Axis& axis = axes_[k];
    const double u = position[k] > 0 ? std::min(position[k], 1.0) : 0.0;
    if (axis.part) {
      build.set(*axis.part, u);
      continue;
    }
    const double value = u < 1 ? axis.low + (axis.high - axis.low) * u : axis.high;
    if (axis.name == "line_voltage_Vrms") conditions.voltage_Vrms = value;
    if (axis.name == "line_frequency_Hz") conditions.frequency_Hz = value;
    if (axis.name == "ambient_degC") conditions.ambient_degC = value;
    if (axis.name == "load_share") conditions.load_share = value;
    if (axis.name == "age_lives") conditions.age = value;
    if (axis.name.ends_with("half_turns")) conditions.turns[turned++] = value;
  }
}

circuit::Waveform ToleranceBox::mains(const Conditions& conditions) const {
  if (conditions.voltage_Vrms == corner_.voltage_Vrms && conditions.frequency_Hz == corner_.frequency_Hz &&
      conditions.turns == corner_.turns)
    return corner_mains_;
  auto harmonics = harmonics_;
  for (std::size_t i = 0; i < harmonics.size() && i < conditions.turns.size(); ++i)
    harmonics[i].phase_rad += std::numbers::pi * conditions.turns[i];
  return circuit::Waveform(conditions.voltage_Vrms, conditions.frequency_Hz, std::move(harmonics));
}

std::optional<double> ToleranceBox::margin_A(const Build& build, const Conditions& conditions,
                                             const LeanSolution* near, LeanSolution* whole) const {
  const Design& design = build.design();
  const LoadProfile loads = load_profile(requirement_->output);
  const auto required_V = required_rail_V(*design.output_stage, requirement_->output, loads);
  if (!required_V) return std::nullopt;
  const double overhead_A = quiescent_A(*design.output_stage, Quiescent::data) + design.reservoir->leakage_A +
                            loads.heaviest_rail_A();
  PointSolver points(design, *requirement_, *required_V);
  const auto wave = mains(conditions);
  LeanCaseSolver solver(points, wave, overhead_A, conditions.age);
  const auto found = solver.solve({conditions.ambient_degC, {}}, near);
  if (whole != nullptr) *whole = found;
  if (!found.usable) return std::nullopt;
  return solver.capability_A(found) - loads.heaviest_output_A();
}

OperatingPoint ToleranceBox::steady(const Build& build, const Conditions& conditions) const {
  const Design& design = build.design();
  const LoadProfile loads = load_profile(requirement_->output);
  const double required_V = required_rail_V(*design.output_stage, requirement_->output, loads).value_or(0);
  PointSolver points(design, *requirement_, required_V);
  const auto wave = mains(conditions);
  static const MainsShapes kNone{};
  const double leakage_A = design.reservoir->leakage_A;
  if (quantity_ == BoxQuantity::standby) {
    Recipe recipe = production_recipe(kNone, End::high);
    recipe.mains = &wave;
    const LoadCase load{loads.standby_name, loads.standby_A, leakage_A + loads.rail_A, Quiescent::data,
                        false};
    return points.solve("standby", recipe, load, kStandby_degC);
  }
  Recipe recipe = rich_recipe(kNone);
  recipe.mains = &wave;
  // The builds have no tolerance: their low end is the one that ages.
  recipe.dropper = End::low;
  recipe.aged = conditions.age;
  const double share = conditions.load_share;
  const LoadCase load{"", share * loads.heaviest_output_A(),
                      std::max(1e-7, 0.1 * leakage_A) + loads.rail_A + share * loads.burst_mean_rail_A,
                      Quiescent::least, false};
  return points.solve("rich", recipe, load, conditions.ambient_degC);
}

std::optional<double> ToleranceBox::at(const std::vector<double>& position, const LeanSolution* near) const {
  Build build(design_);
  Conditions conditions;
  set(position, build, conditions);
  std::optional<double> value;
  if (quantity_ == BoxQuantity::margin)
    value = margin_A(build, conditions, near, nullptr);
  else
    value = box_value(quantity_, build.design(), *supply_, steady(build, conditions));
  if (value && !std::isfinite(*value)) value.reset();
  return value;
}

OperatingPoint ToleranceBox::point_at(const std::vector<double>& position) const {
  if (quantity_ == BoxQuantity::margin) return {};
  Build build(design_);
  Conditions conditions;
  set(position, build, conditions);
  return steady(build, conditions);
}

LeanSolution ToleranceBox::lean_at(const std::vector<double>& position) const {
  LeanSolution whole;
  if (quantity_ != BoxQuantity::margin) return whole;
  Build build(design_);
  Conditions conditions;
  set(position, build, conditions);
  margin_A(build, conditions, nullptr, &whole);
  return whole;
}

std::vector<Term> ToleranceBox::where(const std::vector<double>& position) const {
  Build build(design_);
  Conditions conditions;
  set(position, build, conditions);
  std::vector<Term> values;
  for (std::size_t k = 0; k < axes_.size() && k < position.size(); ++k) {
    const Axis& axis = axes_[k];
    const double u = std::clamp(position[k], 0.0, 1.0);
    values.push_back(
        {axis.name, axis.part ? build.value(*axis.part) : axis.low + (axis.high - axis.low) * u});
  }
  return values;
}

}  // namespace dropfront::scoring
