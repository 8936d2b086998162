#include "dropfront/scoring/bounds/box_ends.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <string_view>

#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/recipes.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring {

namespace {

constexpr double kInfinity = std::numeric_limits<double>::infinity();

template <class Part>
bool all_there(const std::vector<const Part*>& list) {
  return std::find(list.begin(), list.end(), nullptr) == list.end();
}

bool all_required(const DesignBox& box, const BoundContext& context) {
  return std::all_of(box.output_stages.begin(), box.output_stages.end(), [&](const auto* stage) {
    return required_rail_V(*stage, context.requirement->output, context.loads).has_value();
  });
}

double chain_ohm(const Chain& chain, End end) {
  if (chain.element == nullptr || chain.count <= 0) return kInfinity;
  return chain.count * resistor_ohm(*chain.element, end);
}

}  // namespace

bool plain_clamped(const circuit::Arrangement& arrangement) {
  const std::string_view name = arrangement.name;
  return name == "half-wave-clamp-ahead" || name == "half-wave-clamp-across" ||
         name == "bridge-clamp-across" || name == "bridge-clamp-ahead";
}

bool shunted(const DesignBox& box) {
  return box.arrangement != nullptr && box.arrangement->thyristor_shunt && box.thyristors.size() == 1 &&
         box.gate_resistors.size() == 1 && box.thyristors.front() != nullptr &&
         box.gate_resistors.front() != nullptr && box.thyristors.front()->trigger_current_A &&
         box.thyristors.front()->holding_current_A;
}

void BoxEnds::take(Figure figure, double least, double greatest) {
  auto& ends = ends_[static_cast<std::size_t>(figure)];
  if (!(ends.least <= least)) ends.least = least;
  if (!(ends.greatest >= greatest)) ends.greatest = greatest;
}

void BoxEnds::turn(Figure figure) {
  auto& ends = ends_[static_cast<std::size_t>(figure)];
  std::swap(ends.least, ends.greatest);
}

BoxEnds::BoxEnds(const DesignBox& box, const BoundContext& context) {
  ends_.fill({kInfinity, -kInfinity});
  const bool all = box.arrangement != nullptr && all_there(box.output_stages) && all_there(box.droppers) &&
                   all_there(box.series_resistors) && all_there(box.clamps) && all_there(box.reservoirs) &&
                   all_there(box.rectifiers) && all_required(box, context);
  known_circuit_ = all && plain_clamped(*box.arrangement);
  known_shunt_ = all && shunted(box);
  if (!known_circuit_ && !known_shunt_) return;
  take_cold_figures(box, context);
  take_air(box, context);
  take_warm_figures(box, context);
  take_standby_figures(box, context);
}

/// What does not depend on how warm the box gets.
void BoxEnds::take_cold_figures(const DesignBox& box, const BoundContext& context) {
  constexpr double kReference_degC = 25;
  for (const auto* part : box.droppers) take(Figure::loss_tangent, part->loss_tangent);
  for (const auto* part : box.series_resistors) {
    take(Figure::series_low_ohm, resistor_ohm(*part, End::low));
    take(Figure::series_high_ohm, resistor_ohm(*part, End::high));
  }
  for (const auto& chain : box.discharges) {
    take(Figure::chain_low_ohm, chain_ohm(chain, End::low));
    take(Figure::chain_high_ohm, chain_ohm(chain, End::high));
  }
  for (const auto* part : box.rectifiers) {
    take(Figure::drop_V, part->threshold_voltage_V);
    const auto least = rectifier_curve(*part, Drops::least, kReference_degC);
    take(Figure::least_drop_V, least.threshold_V);
    take(Figure::drop_ohm, least.slope_ohm);
  }
  for (const auto* part : box.clamps) {
    take(Figure::clamp_ohm, zener_curve(*part, ZenerCurve::high, kReference_degC).main.slope_ohm);
  }
  for (const auto* part : box.reservoirs) {
    take(Figure::new_can_F, part->capacitance_F);
    take(Figure::new_can_ohm, part->esr_ohm);
    take(Figure::leakage_A, part->leakage_A);
  }
  for (const auto* part : box.output_stages) {
    take(Figure::required_V, required_rail_V(*part, context.requirement->output, context.loads).value_or(0));
  }
}

/// The input power heats series resistance (at most peak² times it), what stands behind the dropper (its
/// greatest voltage times the charge of both directions) and the chain.
void BoxEnds::take_air(const DesignBox& box, const BoundContext& context) {
  double most_F = 0;
  double least_F = kInfinity;
  double most_V = 0;
  for (const auto* part : box.droppers) {
    for (const double degC : {std::min(kStandby_degC, context.ambient_low_degC()), kHottest_degC}) {
      most_F = std::max(most_F, dropper_F(*part, End::high, false, degC));
      least_F = std::min(least_F, dropper_F(*part, End::high, false, degC));
    }
  }
  for (const auto* part : box.clamps) {
    const double warm = 1 + std::abs(part->temperature_coefficient_per_K) * (kHottest_degC - 25);
    most_V = std::max(most_V, part->voltage_max_V * warm);
  }
  double power_W = 0;
  for (const auto& supply : context.supplies) {
    for (const Line* line : {&supply.rich, &supply.standby}) {
      // The current follows C·dv/dt through a low-pass of the series resistance and never overtakes it; the
      // twentieth stands for a rail that falls meanwhile, the chain carries at most the crest.
      const double peak_A =
          1.05 * most_F * line->slope_V_per_s + line->crest_V / least(Figure::chain_low_ohm);
      peak_A_ = std::max(peak_A_, peak_A);
      const double series_ohm = greatest(Figure::series_high_ohm) +
                                greatest(Figure::loss_tangent) / (line->omega * std::max(1e-12, least_F));
      const double behind_V = most_V + greatest(Figure::clamp_ohm) * peak_A +
                              2 * (greatest(Figure::drop_V) + 0.2 + greatest(Figure::drop_ohm) * peak_A);
      const double charge_A = 2 * line->frequency_Hz * most_F * line->rises_V;
      const double chain_V = line->crest_V + behind_V;
      power_W = std::max(power_W, series_ohm * peak_A * peak_A + behind_V * charge_A +
                                      chain_V * chain_V / least(Figure::chain_low_ohm));
    }
  }
  const double warmed_K = context.enclosure_K_per_W() * power_W;
  hottest_air_degC_ = std::min(kHottest_degC, context.ambient_high_degC() + warmed_K);
  standby_air_degC_ = std::min(kHottest_degC, kStandby_degC + warmed_K);
}

/// What takes the temperatures of the corners.
void BoxEnds::take_warm_figures(const DesignBox& box, const BoundContext& context) {
  const double hot_degC = context.ambient_high_degC();
  for (const auto* part : box.droppers) {
    const auto lean_F = [&](double degC) { return dropper_F(*part, End::low, true, degC); };
    const double warmed_K = hottest_air_degC_ - hot_degC;
    const double cold_degC = context.ambient_low_degC();
    const double cold_F = std::max(lean_F(cold_degC), lean_F(cold_degC + warmed_K));
    const double hot_F = std::max(lean_F(hot_degC), lean_F(hottest_air_degC_));
    take(Figure::lean_F, std::min(lean_F(cold_degC), lean_F(hottest_air_degC_)), std::min(cold_F, hot_F));
    for (const double degC : {hot_degC, hottest_air_degC_}) {
      take(Figure::rich_F, dropper_F(*part, End::high, false, degC));
    }
  }
  auto& heat = rich_heat_;
  heat.coolest_degC = hot_degC;
  heat.air_degC = hottest_air_degC_;
  heat.peak_A = peak_A_;
  heat.forward_V = greatest(Figure::drop_V) + greatest(Figure::drop_ohm) * peak_A_;
  const double crossings = box.arrangement->full_wave && !box.arrangement->clamp_ahead ? 2 : 1;
  for (const auto& supply : context.supplies) {
    const double charge_A = supply.rich.frequency_Hz * greatest(Figure::rich_F) * supply.rich.rises_V +
                            supply.rich.crest_V / least(Figure::chain_low_ohm);
    heat.mean_A = std::max(heat.mean_A, crossings * charge_A);
  }
  for (const auto* part : box.clamps) {
    const auto span = high_clamp_span(*part, heat);
    take(Figure::rich_clamp_V, span.least_V, span.greatest_V);
    ClampHeat from_cold = heat;
    from_cold.coolest_degC = context.ambient_low_degC();
    const auto cold = high_clamp_span(*part, from_cold);
    take(Figure::cold_clamp_V, cold.least_V, cold.greatest_V);
  }
  for (const auto* part : box.reservoirs) {
    take(Figure::aged_can_F, reservoir_least_F(*part, true, hot_degC));
    take(Figure::aged_can_ohm, reservoir_greatest_esr_ohm(*part, true, hottest_air_degC_),
         reservoir_greatest_esr_ohm(*part, true, hot_degC));
  }
}

/// What takes the temperatures of standby: air from kStandby_degC on.
void BoxEnds::take_standby_figures(const DesignBox& box, const BoundContext& context) {
  for (const auto* part : box.droppers) {
    for (const double degC : {kStandby_degC, standby_air_degC_}) {
      take(Figure::new_F, dropper_F(*part, End::high, false, degC));
    }
  }
  ClampHeat heat;
  heat.coolest_degC = kStandby_degC - kSettled_K;
  heat.air_degC = standby_air_degC_ + kSettled_K;
  heat.peak_A = peak_A_;
  heat.forward_V = greatest(Figure::drop_V) + greatest(Figure::drop_ohm) * peak_A_;
  const double crossings = box.arrangement->full_wave && !box.arrangement->clamp_ahead ? 2 : 1;
  for (const auto& supply : context.supplies) {
    const double charge_A = supply.standby.frequency_Hz * greatest(Figure::new_F) * supply.standby.rises_V +
                            supply.standby.crest_V / least(Figure::chain_low_ohm);
    heat.mean_A = std::max(heat.mean_A, crossings * charge_A);
  }
  for (const auto* part : box.clamps) {
    const auto span = high_clamp_span(*part, heat);
    take(Figure::new_clamp_V, span.least_V, span.greatest_V);
  }
}

}  // namespace dropfront::scoring
