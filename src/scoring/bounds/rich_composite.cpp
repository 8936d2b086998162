#include "dropfront/scoring/bounds/rich_composite.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/parts/defaults.hpp"
#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/corners.hpp"

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

}  // namespace

bool RichComposite::possible(const BoxQuestion& question) {
  if (!question.ends.known_circuit()) return false;
  const auto& rectifiers = question.box.rectifiers;
  const auto same = [&](const auto* part) { return alike(*part, *rectifiers.front()); };
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
  take_resistors(question);
  take_clamp(question);
  take_reservoir(question);
  take_stage(question);
  const bool one_heater =
      one_value(box.series_resistors, [](const auto* part) { return resistor_ohm(*part, End::high); }) &&
      one_value(box.droppers, [](const auto* part) { return part->loss_tangent; });
  const auto& requirement = one_heater ? *question.context.requirement : question.context.without_enclosure;
  evidence_ =
      std::make_unique<Evidence>(design_, requirement, *question.supply.supply, question.supply.shapes);
}

/// Only its high end is looked at.
void RichComposite::take_dropper(const BoxQuestion& question) {
  const auto& list = question.box.droppers;
  design_.dropper = list.front();
  if (list.size() == 1) return;
  dropper_ = *list.front();
  dropper_.tolerance = 0;
  dropper_.loss_tangent = question.greatest_over(list, [](const auto* part) { return part->loss_tangent; });
  dropper_.temperature_coefficient_per_K =
      question.least_over(list, [](const auto* part) { return part->temperature_coefficient_per_K; });
  dropper_.capacitance_F = question.least_over(list, [&](const auto* part) {
    return line_below(question, dropper_.temperature_coefficient_per_K, kFilmReference_degC,
                      [&](double degC) { return dropper_F(*part, End::high, 0, degC); });
  });
  design_.dropper = &dropper_;
}

void RichComposite::take_resistors(const BoxQuestion& question) {
  const auto& list = question.box.series_resistors;
  design_.series_resistor = list.front();
  if (list.size() > 1) {
    series_resistor_ = *list.front();
    const double low_ohm =
        question.greatest_over(list, [](const auto* part) { return resistor_ohm(*part, End::low); });
    const double high_ohm =
        question.greatest_over(list, [](const auto* part) { return resistor_ohm(*part, End::high); });
    series_resistor_.resistance_ohm = 0.5 * (low_ohm + high_ohm);
    series_resistor_.tolerance = (high_ohm - low_ohm) / (high_ohm + low_ohm);
    design_.series_resistor = &series_resistor_;
  }
  const auto& chains = question.box.discharges;
  design_.discharge = chains.front().element;
  design_.discharge_count = chains.front().count;
  if (chains.size() == 1) return;
  const double most_ohm = question.greatest_over(chains, chain_ohm);
  chain_.resistance_ohm = most_ohm;
  chain_.tolerance = 0;
  design_.discharge = std::isfinite(most_ohm) ? &chain_ : nullptr;
  design_.discharge_count = std::isfinite(most_ohm) ? 1 : 0;
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
  stage_ = *list.front();
  for (const auto* part : list) stage_.input_max_V = better(stage_.input_max_V, part->input_max_V);
  design_.output_stage = &stage_;
}

}  // namespace dropfront::scoring
