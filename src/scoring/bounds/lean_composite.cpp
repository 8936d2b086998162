#include "dropfront/scoring/bounds/lean_composite.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/scoring/clamp_power.hpp"
#include "dropfront/scoring/point_solver.hpp"

namespace dropfront::scoring {

namespace {

/// Rises are known from closed forms; they are taken so much greater.
constexpr double kRiseShare = 1.25;
/// Charge balance leaves out what a flat-topped line's tones do behind the chain.
constexpr double kCharge = 1.02;

template <class Part>
bool any_missing(const std::vector<const Part*>& list) {
  return list.empty() || std::find(list.begin(), list.end(), nullptr) != list.end();
}

double chain_ohm(const Chain& chain, End end) {
  if (chain.element == nullptr || chain.count <= 0) return INFINITY;
  return chain.count * resistor_ohm(*chain.element, end);
}

}  // namespace

bool LeanComposite::possible(const DesignBox& box) {
  return !any_missing(box.output_stages) && !any_missing(box.droppers) &&
         !any_missing(box.series_resistors) && !any_missing(box.clamps) && !any_missing(box.reservoirs) &&
         !any_missing(box.rectifiers) && !box.discharges.empty();
}

LeanComposite::LeanComposite(const DesignBox& box, const Requirement& requirement, const MainsShapes& shapes,
                             double required_V, bool stepping)
    : box_(&box), requirement_(&requirement), shapes_(&shapes), required_V_(required_V) {
  for (const auto* part : box.series_resistors) {
    const auto same = [&](const auto* other) {
      return other->resistance_ohm == part->resistance_ohm && other->tolerance == part->tolerance;
    };
    if (std::none_of(series_resistors_.begin(), series_resistors_.end(), same))
      series_resistors_.push_back(part);
  }
  const auto& ambient = requirement.surroundings.ambient_degC;
  if (esr_ohm(End::high, false, ambient.low) != esr_ohm(End::high, true, ambient.low) ||
      esr_ohm(End::low, false, ambient.low) != esr_ohm(End::low, true, ambient.low))
    esr_ends_.push_back(true);
  least_chain_ = greatest_chain_ = box.discharges.front();
  for (const auto& chain : box.discharges) {
    if (chain_ohm(chain, End::low) < chain_ohm(least_chain_, End::low)) least_chain_ = chain;
    if (chain_ohm(chain, End::low) > chain_ohm(greatest_chain_, End::low)) greatest_chain_ = chain;
  }
  if (chain_ohm(least_chain_, End::low) != chain_ohm(greatest_chain_, End::low)) chain_ends_.push_back(true);
  // Where the clamp leaves little room over the required rail the cold decides, else the heat.
  bool roomy = !stepping;
  const parts::Dropper* dropper = nullptr;
  const double most_F = greatest_F({ambient.low, ambient.low}, dropper);
  double least_F = INFINITY;
  for (const auto* can : box.reservoirs) least_F = std::min(least_F, can->capacitance_F);
  const double swing_V = shapes.lean.sum_of_rises_V();
  const double ripple_V = most_F * swing_V / least_F;
  if (greatest_curve({ambient.low, ambient.low}).main.threshold_V - required_V < 1.5 + 1.2 * ripple_V)
    roomy = false;
  ambients_ = {roomy};
  if (ambient.low != ambient.high) ambients_.push_back(!roomy);
}

double LeanComposite::greatest_F(const Span& air, const parts::Dropper*& which) const {
  double most_F = 0;
  for (const auto* part : box_->droppers) {
    const double here_F = std::max(dropper_F(*part, End::low, true, air.cool_degC),
                                   dropper_F(*part, End::low, true, air.warm_degC));
    if (which != nullptr && !(here_F > most_F)) continue;
    most_F = here_F;
    which = part;
  }
  return most_F;
}

/// One clamp's curve, or a curve above those of several: without a knee branch, which only takes current.
circuit::ClampCurve LeanComposite::greatest_curve(const Span& junction) const {
  circuit::ClampCurve best;
  best.main = {0, 0};
  for (const auto* part : box_->clamps) {
    const auto cool = zener_curve(*part, ZenerCurve::low, junction.cool_degC);
    const auto warm = zener_curve(*part, ZenerCurve::low, junction.warm_degC);
    const auto& higher = warm.main.threshold_V > cool.main.threshold_V ? warm : cool;
    if (box_->clamps.size() == 1) return higher;
    best.main.threshold_V = std::max(best.main.threshold_V, higher.main.threshold_V);
    best.main.slope_ohm = std::max(best.main.slope_ohm, higher.main.slope_ohm);
  }
  return best;
}

double LeanComposite::esr_ohm(End end, bool greatest, double air_degC) const {
  double least_ohm = INFINITY, most_ohm = 0;
  for (const auto* can : box_->reservoirs) {
    const double here_ohm = end == End::low ? reservoir_least_esr_ohm(*can, air_degC)
                                            : reservoir_greatest_esr_ohm(*can, true, air_degC);
    least_ohm = std::min(least_ohm, here_ohm);
    most_ohm = std::max(most_ohm, here_ohm);
  }
  return greatest ? most_ohm : least_ohm;
}

LeanComposite::Lean LeanComposite::lean(const Case& at, double load_A, const Rises& most) const {
  const auto& ambient = requirement_->surroundings.ambient_degC;
  const double ambient_degC = at.hot ? ambient.high : ambient.low;
  Lean answer;
  auto& values = answer.values;
  values.mains = shapes_->lean;
  values.series_resistor_ohm = resistor_ohm(*at.series_resistor, at.ends.series_resistor);
  values.discharge_ohm = chain_ohm(at.high_chain ? greatest_chain_ : least_chain_, at.ends.discharge);
  values.load_cutoff_V = 0.5 * required_V_;
  const parts::Dropper* dropper = nullptr;
  values.dropper_F = greatest_F({ambient_degC, ambient_degC}, dropper);
  values.rectifier = {INFINITY, INFINITY};
  for (const auto* part : box_->rectifiers) {
    values.rectifier.threshold_V = std::min(values.rectifier.threshold_V, part->threshold_voltage_V);
    values.rectifier.slope_ohm = std::min(values.rectifier.slope_ohm, part->slope_resistance_ohm);
  }
  values.clamp = greatest_curve({ambient_degC, ambient_degC});

  // How warm air and junction can get, by all the charge there is: with the rail at V_required or above.
  const double chain_A =
      (box_->arrangement->full_wave ? 1 : 0.5) * values.mains.crest_V() / values.discharge_ohm;
  const double all_A = kCharge * (charge_balance_A(*box_->arrangement, values, required_V_) + chain_A);
  const double line_A = values.mains.omega() * values.dropper_F * values.mains.voltage_Vrms();
  const double clamp_V = values.clamp.main.threshold_V + values.clamp.main.slope_ohm * 2 * line_A;
  const double line_V = values.mains.voltage_Vrms();
  const double input_W = (clamp_V + 2 * values.rectifier.threshold_V) * all_A +
                         line_A * line_A * values.series_resistor_ohm +
                         line_V * line_V / values.discharge_ohm;
  const double warmed_K =
      std::min(most.local_K, kRiseShare * requirement_->surroundings.enclosure_K_per_W * input_W);
  const Span air{ambient_degC, ambient_degC + warmed_K};
  answer.spare_A = std::max(0.0, all_A - load_A);
  double rise_K = 0;
  for (const auto* part : box_->clamps) {
    const double heat_W = (clamp_V * answer.spare_A + values.rectifier.threshold_V * all_A) /
                          std::max(1, box_->arrangement->clamp_count);
    rise_K = std::max(rise_K, kRiseShare * part->thermal_resistance_K_per_W * heat_W);
  }
  rise_K = std::min(rise_K, most.junction_K);
  values.dropper_F = greatest_F(air, dropper);
  values.dropper_esr_ohm = dropper_esr_ohm(*dropper, values.dropper_F, values.mains.frequency_Hz());
  values.clamp = greatest_curve({ambient_degC, std::min(1000.0, air.warm_degC + rise_K)});
  values.rectifier.threshold_V = INFINITY;
  for (const auto* part : box_->rectifiers)
    values.rectifier.threshold_V = std::min(
        values.rectifier.threshold_V, rectifier_curve(*part, Drops::greatest, air.warm_degC).threshold_V);
  values.reservoir_F = 0;
  for (const auto* can : box_->reservoirs)
    values.reservoir_F = std::max({values.reservoir_F, reservoir_least_F(*can, true, air.cool_degC),
                                   reservoir_least_F(*can, true, air.warm_degC)});
  // Between the ends of every member: the one that hurts is then beyond it.
  values.reservoir_esr_ohm =
      esr_ohm(at.ends.esr, at.high_esr, at.ends.esr == End::low ? air.cool_degC : air.warm_degC);
  return answer;
}

Rises LeanComposite::rises(const circuit::ElementValues& values, const circuit::SteadyState& state) const {
  constexpr double kSettled_K = 0.2;  // twice what the lean search leaves
  double resistance_K_per_W = 0;
  for (const auto* part : box_->clamps)
    resistance_K_per_W = std::max(resistance_K_per_W, part->thermal_resistance_K_per_W);
  const double clamp_W = clamp_power_W(*box_->arrangement, values, state);
  return {requirement_->surroundings.enclosure_K_per_W * std::max(0.0, state.input_power_W) + kSettled_K,
          resistance_K_per_W * clamp_W + kSettled_K};
}

double rail_ceiling_V(const circuit::ElementValues& values) {
  const double crest_V = values.mains.crest_V();
  const double line_A =
      1.2 * values.mains.omega() * values.dropper_F * crest_V + crest_V / values.discharge_ohm;
  return values.clamp.main.threshold_V + values.clamp.main.slope_ohm * line_A + values.rectifier.threshold_V +
         values.rectifier.slope_ohm * line_A;
}

}  // namespace dropfront::scoring
