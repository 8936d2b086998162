#include "dropfront/scoring/bounds/rich_composite.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/parts/defaults.hpp"
#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring {

namespace {

constexpr double kGreatestShare = 0.4;
constexpr double kFilmReference_degC = 20;
constexpr double kClampReference_degC = 25;

bool alike(const parts::Rectifier& a, const parts::Rectifier& b) {
  return a.threshold_voltage_V == b.threshold_voltage_V && a.slope_resistance_ohm == b.slope_resistance_ohm;
}

/// `f` is worth the same for every entry of a list.
template <class Entry, class Function>
bool one_value(const std::vector<Entry>& list, Function f) {
  const double first = f(list.front());
  return std::all_of(list.begin(), list.end(), [&](const auto& entry) { return f(entry) == first; });
}

/// The better of two ratings, more being better; given by one only: not given.
std::optional<double> better(const std::optional<double>& a, const std::optional<double>& b) {
  return a && b ? std::optional(std::max(*a, *b)) : std::nullopt;
}

double chain_ohm(const Chain& chain) {
  return chain.element == nullptr || chain.count <= 0 ? INFINITY
                                                      : chain.count * resistor_ohm(*chain.element, End::low);
}

/// Value at the reference of a line with temperature coefficient `tempco` that no `line(degC)` undercuts
/// between the coldest ambient and the hottest part. The quotient of two straight lines is least at an end.
template <class Line>
double line_below(const BoxQuestion& question, double tempco, double reference_degC, Line line) {
  double least = INFINITY;
  for (const double degC : {question.context.ambient_low_degC(), kHottest_degC}) {
    least = std::min(least, line(degC) / (1 + tempco * (degC - reference_degC)));
  }
  return least;
}

/// Series resistor, loss and chain, which heat the air beside what the clamp takes, are the same in every
/// member.
bool one_heater(const DesignBox& box) {
  return one_value(box.series_resistors, [](const auto* part) { return resistor_ohm(*part, End::low); }) &&
         one_value(box.series_resistors, [](const auto* part) { return resistor_ohm(*part, End::high); }) &&
         one_value(box.droppers, [](const auto* part) { return part->loss_tangent; }) &&
         one_value(box.discharges, chain_ohm);
}

}  // namespace

bool RichComposite::possible(const BoxQuestion& question) {
  if (!question.ends.known_circuit() || !one_heater(question.box)) return false;
  const auto& rectifiers = question.box.rectifiers;
  const auto same = [&](const auto* part) { return alike(*part, *rectifiers.front()); };
  const auto rises = [](const auto* part) { return part->temperature_coefficient_per_K >= 0; };
  const auto& box = question.box;
  const bool one = box.droppers.size() == 1 && box.clamps.size() == 1 && box.reservoirs.size() == 1;
  if (!one && !std::all_of(box.clamps.begin(), box.clamps.end(), rises)) return false;
  return std::all_of(rectifiers.begin(), rectifiers.end(), same) &&
         question.charge(BoxCorner::rich).node_most_V <= kGreatestShare * question.supply.rich.crest_V;
}

RichComposite* BoxQuestion::rich() const {
  if (!rich_ && RichComposite::possible(*this)) rich_ = std::make_shared<RichComposite>(*this);
  return rich_.get();
}

RichComposite::RichComposite(const BoxQuestion& question) {
  const auto& box = question.box;
  design_.arrangement = box.arrangement;
  design_.rectifier = box.rectifiers.front();
  take_dropper(question);
  design_.series_resistor = box.series_resistors.front();
  design_.discharge = box.discharges.front().element;
  design_.discharge_count = box.discharges.front().count;
  take_clamp(question);
  take_reservoir(question);
  take_stage(question);
  evidence_ = std::make_unique<Evidence>(design_, *question.context.requirement, *question.supply.supply,
                                         question.supply.shapes);
}

/// Only its high end is looked at.
void RichComposite::take_dropper(const BoxQuestion& question) {
  const auto& list = question.box.droppers;
  design_.dropper = list.front();
  if (list.size() == 1) return;
  dropper_ = *list.front();
  dropper_.tolerance = 0;
  dropper_.temperature_coefficient_per_K =
      question.least_over(list, [](const auto* part) { return part->temperature_coefficient_per_K; });
  dropper_.capacitance_F = question.least_over(list, [&](const auto* part) {
    return line_below(question, dropper_.temperature_coefficient_per_K, kFilmReference_degC,
                      [&](double degC) { return dropper_F(*part, End::high, 0, degC); });
  });
  design_.dropper = &dropper_;
}

void RichComposite::take_clamp(const BoxQuestion& question) {
  const auto& list = question.box.clamps;
  design_.clamp = list.front();
  if (list.size() == 1) return;
  clamp_ = *list.front();
  clamp_.test_current_A = 0;
  clamp_.slope_min_ohm =
      question.least_over(list, [](const auto* part) { return std::max(1e-3, part->slope_min_ohm); });
  clamp_.slope_resistance_ohm = question.least_over(list, [](const auto* part) {
    return zener_curve(*part, ZenerCurve::high, kClampReference_degC).main.slope_ohm;
  });
  clamp_.thermal_resistance_K_per_W =
      question.least_over(list, [](const auto* part) { return part->thermal_resistance_K_per_W; });
  clamp_.max_junction_degC =
      question.greatest_over(list, [](const auto* part) { return part->max_junction_degC; });
  clamp_.temperature_coefficient_per_K =
      question.least_over(list, [](const auto* part) { return part->temperature_coefficient_per_K; });
  clamp_.voltage_max_V = question.least_over(list, [&](const auto* part) {
    return line_below(question, clamp_.temperature_coefficient_per_K, kClampReference_degC, [&](double degC) {
      return zener_curve(*part, ZenerCurve::high, degC).main.threshold_V;
    });
  });
  clamp_.voltage_V = clamp_.voltage_min_V = clamp_.voltage_max_V;
  design_.clamp = &clamp_;
}

void RichComposite::take_reservoir(const BoxQuestion& question) {
  const auto& list = question.box.reservoirs;
  design_.reservoir = list.front();
  if (list.size() == 1) return;
  reservoir_ = *list.front();
  reservoir_.tolerance = reservoir_.end_of_life_loss = 0;
  reservoir_.end_of_life_esr = 1;
  reservoir_.capacitance_F = question.greatest_over(
      list, [](const auto* part) { return reservoir_least_F(*part, 1, kFilmReference_degC); });
  reservoir_.esr_ohm = question.least_over(
      list, [](const auto* part) { return reservoir_greatest_esr_ohm(*part, 1, kFilmReference_degC); });
  const double cold_ratio = question.least_over(list, [](const auto* part) {
    return part->esr_cold_ohm > 0 && part->esr_ohm > 0
               ? part->esr_cold_ohm / part->esr_ohm
               : parts::electrolytic_cold_factor(part->rated_voltage_V);
  });
  reservoir_.esr_cold_ohm = cold_ratio * reservoir_.esr_ohm;
  reservoir_.leakage_A = question.greatest_over(list, [](const auto* part) { return part->leakage_A; });
  reservoir_.rated_voltage_V =
      question.greatest_over(list, [](const auto* part) { return part->rated_voltage_V; });
  for (const auto* part : list)
    reservoir_.surge_voltage_V = better(reservoir_.surge_voltage_V, part->surge_voltage_V);
  design_.reservoir = &reservoir_;
}

/// An empty rail feeds no stage: only its rating counts.
void RichComposite::take_stage(const BoxQuestion& question) {
  const auto& list = question.box.output_stages;
  design_.output_stage = list.front();
  if (list.size() == 1) return;
  // The load of a rail that starves lets go below half of V_required.
  const auto required_V = [&](const auto* part) {
    return required_rail_V(*part, question.context.requirement->output, question.context.loads).value_or(0);
  };
  stage_ = **std::min_element(list.begin(), list.end(),
                              [&](const auto* a, const auto* b) { return required_V(a) < required_V(b); });
  for (const auto* part : list) stage_.input_max_V = better(stage_.input_max_V, part->input_max_V);
  design_.output_stage = &stage_;
}

}  // namespace dropfront::scoring
