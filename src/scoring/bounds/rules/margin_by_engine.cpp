#include <algorithm>
#include <cmath>

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring::bounds {

namespace {

/// The sign with which these act is not fixed (in the knee a larger Rs or ESR raises the available current):
/// each must be one value in the whole box.
bool one_of_each(const DesignBox& box) {
  const auto& R = *box.series_resistors.front();
  const auto& D = *box.rectifiers.front();
  const auto& E = *box.reservoirs.front();
  const auto& Rb = box.discharges.front();
  const double film = box.droppers.front()->loss_tangent;
  return std::all_of(box.droppers.begin(), box.droppers.end(),
                     [&](const auto* p) { return p->loss_tangent == film; }) &&
         std::all_of(box.series_resistors.begin(), box.series_resistors.end(),
                     [&](const auto* p) {
                       return p->resistance_ohm == R.resistance_ohm && p->tolerance == R.tolerance;
                     }) &&
         std::all_of(box.rectifiers.begin(), box.rectifiers.end(),
                     [&](const auto* p) {
                       return p->threshold_voltage_V == D.threshold_voltage_V &&
                              p->slope_resistance_ohm == D.slope_resistance_ohm;
                     }) &&
         std::all_of(box.reservoirs.begin(), box.reservoirs.end(),
                     [&](const auto* p) {
                       return p->esr_ohm == E.esr_ohm && p->esr_cold_ohm == E.esr_cold_ohm &&
                              p->end_of_life_esr == E.end_of_life_esr;
                     }) &&
         std::all_of(box.discharges.begin(), box.discharges.end(), [&](const Chain& p) {
           return p.count == Rb.count &&
                  (p.element == Rb.element || (p.element != nullptr && Rb.element != nullptr &&
                                               p.element->resistance_ohm == Rb.element->resistance_ohm &&
                                               p.element->tolerance == Rb.element->tolerance));
         });
}

/// The clamp's low curve with everything as high as any member can have it: each end of each of its lines,
/// the junction warmed by all the current the line delivers.
circuit::ClampCurve highest_low_curve(const BoxQuestion& question, double ambient_degC, double air_degC,
                                      double all_A) {
  const auto& ends = question.ends;
  circuit::ClampCurve highest;
  bool kneed = true;
  for (const auto* part : question.box.clamps) {
    const auto cold = zener_curve(*part, ZenerCurve::low, 25);
    ClampHeat heat;
    heat.coolest_degC = ambient_degC;
    heat.peak_A = ends.peak_A();
    heat.forward_V = ends.greatest(Figure::drop_V) + 0.2 + ends.greatest(Figure::drop_ohm) * heat.peak_A;
    heat.mean_A = all_A;
    heat.air_degC = air_degC;
    const double most_ohm = std::max(cold.main.slope_ohm, part->slope_resistance_ohm);
    const double V0 = clamp_span(*part, part->voltage_min_V, most_ohm, cold.main.slope_ohm, heat).greatest_V;
    highest.main.threshold_V = std::max(highest.main.threshold_V, V0);
    highest.main.slope_ohm =
        std::max(question.box.clamps.front() == part ? 0 : highest.main.slope_ohm, cold.main.slope_ohm);
    kneed = kneed && cold.knee.has_value();
    if (!kneed) continue;
    // The knee branch rises with the main one.
    const double knee_V = cold.knee->threshold_V + std::max(0.0, V0 - cold.main.threshold_V);
    if (!highest.knee) highest.knee = circuit::Curve{knee_V, cold.knee->slope_ohm};
    highest.knee->threshold_V = std::max(highest.knee->threshold_V, knee_V);
    highest.knee->slope_ohm = std::max(highest.knee->slope_ohm, cold.knee->slope_ohm);
  }
  if (!kneed || !(highest.knee->threshold_V < highest.main.threshold_V)) highest.knee.reset();
  return highest;
}

}  // namespace

/// Available current with the greatest C, clamp and reservoir and the least V_required of the box, less the
/// least overhead, at one ambient and one choice of ends: the margin is the least over all of them. Only
/// where series resistor, chain, rectifier and ESR are single. Monotone by test; no answer shows nothing.
std::optional<double> margin_by_engine(const BoxQuestion& question) {
  const auto& ends = question.ends;
  const auto& box = question.box;
  if (!ends.known_circuit() || !one_of_each(box)) return std::nullopt;
  double overhead_A = 1;
  for (const auto* stage : box.output_stages) {
    if (stage->kind == parts::StageKind::step_down) return std::nullopt;
    overhead_A = std::min(overhead_A, quiescent_A(*stage, Quiescent::data));
  }
  const auto& loads = question.context.loads;
  overhead_A += ends.least(Figure::leakage_A) + loads.heaviest_rail_A();
  const double required_V = ends.least(Figure::required_V);
  const double cold_degC = question.context.ambient_low_degC();
  const double hot_degC = question.context.ambient_high_degC();
  const double warmed_K = ends.hottest_air_degC() - hot_degC;

  const auto available_A = [&](bool knee, double ambient_degC, double esr_degC) -> std::optional<double> {
    const double air_degC = ambient_degC + warmed_K;
    circuit::ElementValues values;
    values.mains = question.supply.shapes.lean;
    values.series_resistor_ohm = resistor_ohm(*box.series_resistors.front(), knee ? End::low : End::high);
    values.dropper_F = question.greatest_over(box.droppers, [&](const auto* part) {
      return std::max(dropper_F(*part, End::low, true, ambient_degC),
                      dropper_F(*part, End::low, true, air_degC));
    });
    values.dropper_esr_ohm = ends.least(Figure::loss_tangent) / (values.mains.omega() * values.dropper_F);
    values.discharge_ohm = ends.least(Figure::chain_low_ohm);
    values.rectifier = rectifier_curve(*box.rectifiers.front(), Drops::greatest, air_degC);
    values.clamp =
        highest_low_curve(question, ambient_degC, air_degC, charge_ceiling_A(question, required_V));
    values.reservoir_F = question.greatest_over(
        box.reservoirs, [&](const auto* part) { return reservoir_least_F(*part, true, air_degC); });
    const auto& can = *box.reservoirs.front();
    values.reservoir_esr_ohm =
        knee ? reservoir_greatest_esr_ohm(can, true, esr_degC) : reservoir_least_esr_ohm(can, esr_degC);
    values.load_cutoff_V = 0.5 * required_V;
    const auto answer = circuit::find_available_current(box.arrangement->build, values, required_V);
    return answer.usable ? std::optional(answer.current_A) : std::nullopt;
  };
  // Saturated the heat decides, in the knee the cold: the margin is no more than either.
  const auto hot_A = available_A(false, hot_degC, hot_degC);
  auto cold_A = available_A(true, cold_degC, cold_degC);
  if (cold_A && warmed_K > 0) {
    // How warm the box gets is known only to a span: the ESR is tried at both ends of it.
    const auto other_A = available_A(true, cold_degC, cold_degC + warmed_K);
    cold_A = other_A ? std::optional(std::max(*cold_A, *other_A)) : std::nullopt;
  }
  const auto most_A = hot_A && cold_A ? std::min(hot_A, cold_A) : std::nullopt;
  if (!most_A) return std::nullopt;
  return *most_A * (1 + 3e-6) + 1e-7 - overhead_A - loads.heaviest_output_A();
}

}  // namespace dropfront::scoring::bounds
