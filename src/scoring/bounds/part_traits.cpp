#include "dropfront/scoring/bounds/part_traits.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "dropfront/circuit/discharge.hpp"
#include "dropfront/scoring/board_area.hpp"
#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/bounds/placed.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

namespace {

constexpr double kNone = std::numeric_limits<double>::quiet_NaN();
constexpr double kInfinity = std::numeric_limits<double>::infinity();

double given(const std::optional<double>& value) { return value ? *value : kNone; }
/// A rating, counted up to what suffices.
double up_to(double rating, double enough) { return rating > enough ? enough : rating; }
double up_to(const std::optional<double>& rating, double enough) { return up_to(given(rating), enough); }

/// Price, area and height of what an entry places.
template <class Entry>
PartTraits placed_traits(const Entry& entry, const BoxStress& stress, std::int64_t margin_um) {
  PartTraits traits;
  const auto placed = bounds::placed_of(entry);
  if (placed.count == 0) return traits;
  const auto& requirement = *stress.context->requirement;
  const auto& info = *placed.info;
  const auto price = parts::price_micro_at(info, requirement.volume);
  traits.price =
      price ? static_cast<double>(placed.count * (*price + requirement.placement_cost_micro)) : kNone;
  const bool sized = info.length_um && info.width_um;
  traits.area = sized ? static_cast<double>(placed.count * (*info.length_um + 2 * margin_um) *
                                            (*info.width_um + 2 * margin_um))
                      : kNone;
  if (requirement.surroundings.max_height_mm) {
    const double height_mm = info.height_um ? static_cast<double>(*info.height_um) / 1000 : kNone;
    traits.ratings[0] = up_to(-height_mm, -*requirement.surroundings.max_height_mm);
  }
  return traits;
}

}  // namespace

BoxStress::BoxStress(const DesignBox& box, const BoxEnds& ends, const BoundContext& of) : context(&of) {
  clamp_W = chain_Vrms = rail_V = kInfinity;
  series_least_ohm = 0;
  for (const auto& supply : of.supplies) {
    line_Vrms = std::max(line_Vrms, supply.rich.voltage_Vrms);
    pulse_V = std::max(pulse_V, 2 * supply.rich.crest_V);
  }
  if (of.requirement->limits.surge) pulse_V = kInfinity;
  if (!ends.known_circuit()) return;
  series_least_ohm = ends.least(Figure::series_low_ohm);
  clamp_W = chain_Vrms = rail_V = 0;
  for (const auto& supply : of.supplies) {
    const BoxQuestion question{box, ends, of, supply};
    const auto charge = corner_charge(question, BoxCorner::rich);
    const double clamp_V =
        ends.greatest(Figure::cold_clamp_V) + ends.greatest(Figure::clamp_ohm) * ends.peak_A();
    clamp_W = std::max(clamp_W, (clamp_V + ends.rich_heat().forward_V) * ends.rich_heat().mean_A);
    chain_Vrms = std::max(chain_Vrms, supply.rich.voltage_Vrms + charge.node_most_V +
                                          ends.greatest(Figure::series_high_ohm) * ends.peak_A());
    // Drops are counted in; nothing adds more than three and the idle diode's 0.3 V.
    rail_V = std::max(rail_V, clamp_V + 3 * ends.rich_heat().forward_V + 0.3);
  }
}

PartTraits traits_of(const parts::Dropper* part, const BoxStress& stress) {
  auto traits = placed_traits(part, stress, stress.context->mains_margin_um);
  const auto& requirement = *stress.context->requirement;
  traits.electrical = {part->capacitance_F, part->tolerance, part->loss_tangent, part->end_of_life_loss,
                       part->temperature_coefficient_per_K};
  const bool fit = part->class_name == "X1" || part->class_name == "X2";
  const double least_F = dropper_F(*part, End::low, true, stress.context->ambient_high_degC());
  traits.ratings[1] =
      up_to(part->rated_voltage_Vrms * requirement.derating.dropper_voltage, stress.line_Vrms);
  traits.ratings[2] = part->class_name.empty() ? kNone : fit ? 1 : 0;
  traits.ratings[3] = part->series_rated ? 1 : 0;
  // A hair above what is needed, so that rounding decides nothing.
  traits.ratings[4] =
      up_to(part->slew_V_per_s, 1.000001 * stress.pulse_V / (stress.series_least_ohm * least_F));
  traits.ratings[5] = given(part->impulse_V);
  return traits;
}

PartTraits traits_of(const parts::Resistor* part, const BoxStress& stress) {
  auto traits = placed_traits(part, stress, stress.context->mains_margin_um);
  traits.electrical = {part->resistance_ohm, part->tolerance,
                       part->construction == parts::Construction::film ? 0.0 : 1.0};
  traits.ratings[1] = given(part->rated_power_W);
  traits.ratings[2] = given(part->rated_voltage_Vrms);
  traits.ratings[3] = up_to(part->overload_voltage_V, stress.pulse_V);
  traits.ratings[4] = given(part->pulse_energy_J);
  traits.ratings[5] = part->fusible ? 1 : 0;
  // What it must get before it opens: less is better.
  traits.ratings[6] = part->opens_at && part->rated_power_W ? -*part->opens_at * *part->rated_power_W : kNone;
  traits.ratings[7] = -given(part->thermal_resistance_K_per_W);
  return traits;
}

PartTraits traits_of(const parts::Clamp* part, const BoxStress& stress) {
  auto traits = placed_traits(part, stress, kBoardMargin_um);
  traits.electrical = {part->voltage_V,
                       part->voltage_min_V,
                       part->voltage_max_V,
                       part->test_current_A,
                       part->slope_min_ohm,
                       part->slope_resistance_ohm,
                       part->knee_current_A.value_or(-1),
                       part->knee_resistance_ohm.value_or(-1),
                       part->temperature_coefficient_per_K,
                       part->thermal_resistance_K_per_W,
                       part->max_junction_degC};
  const double derating = stress.context->requirement->derating.clamp_power;
  traits.ratings[1] = up_to(part->rated_power_W, stress.clamp_W / derating);
  const bool pulsed = part->pulse_power_W && part->pulse_time_s;
  traits.ratings[2] = pulsed ? *part->pulse_power_W * std::sqrt(*part->pulse_time_s) : kNone;
  return traits;
}

PartTraits traits_of(const parts::Reservoir* part, const BoxStress& stress) {
  auto traits = placed_traits(part, stress, kBoardMargin_um);
  // The cold ratio's default goes by the rated voltage.
  const double cold = part->esr_cold_ohm > 0 ? part->esr_cold_ohm : part->rated_voltage_V <= 16 ? -1 : -2;
  traits.electrical = {part->capacitance_F,
                       part->tolerance,
                       part->esr_ohm,
                       cold,
                       part->leakage_A,
                       part->end_of_life_loss,
                       part->end_of_life_esr,
                       part->ripple_frequency_Hz,
                       part->life_temperature_degC.value_or(-1)};
  const double derating = stress.context->requirement->derating.reservoir_voltage;
  traits.ratings[1] = up_to(part->rated_voltage_V * derating, stress.rail_V);
  traits.ratings[2] = given(part->surge_voltage_V);
  traits.ratings[3] = given(part->ripple_current_Arms);
  traits.ratings[4] = given(part->life_h);
  return traits;
}

PartTraits traits_of(const parts::Rectifier* part, const BoxStress& stress) {
  auto traits = placed_traits(part, stress, kBoardMargin_um);
  traits.electrical = {part->threshold_voltage_V, part->slope_resistance_ohm};
  traits.ratings[1] = up_to(part->reverse_voltage_V, stress.pulse_V);
  // At plug-in no more than twice the crest (and a drop) stands on the series resistor.
  traits.ratings[2] = up_to(part->surge_current_A, 1.05 * stress.pulse_V / stress.series_least_ohm);
  return traits;
}

PartTraits traits_of(const parts::OutputStage* part, const BoxStress& stress) {
  auto traits = placed_traits(part, stress, kBoardMargin_um);
  traits.electrical = {static_cast<double>(part->kind),
                       part->output_voltage_V,
                       part->tolerance,
                       part->dropout_V,
                       part->quiescent_current_A,
                       part->quiescent_current_dropout_A,
                       part->input_min_V.value_or(-1),
                       part->input_on_V.value_or(-1),
                       part->input_off_V.value_or(-1),
                       part->efficiency.value_or(-1)};
  traits.ratings[1] = given(part->input_max_V);
  traits.ratings[2] = -given(part->thermal_resistance_K_per_W);
  traits.ratings[3] = given(part->max_junction_degC);
  return traits;
}

PartTraits traits_of(const Chain& chain, const BoxStress& stress) {
  auto traits = placed_traits(chain, stress, stress.context->mains_margin_um);
  if (chain.element == nullptr || chain.count <= 0) return traits;
  const auto& part = *chain.element;
  traits.electrical = {1, chain.count * resistor_ohm(part, End::low), chain.count * part.resistance_ohm,
                       chain.count * resistor_ohm(part, End::high)};
  // Voltage on the whole chain at which one element reaches its rating.
  const double unit_W =
      circuit::greatest_element_power_W(1, chain.count, part.resistance_ohm, part.tolerance);
  const double share = circuit::greatest_voltage_share(chain.count, part.tolerance);
  traits.ratings[1] = std::sqrt(given(part.rated_power_W) / unit_W);
  traits.ratings[2] = up_to(given(part.rated_voltage_Vrms) / share, stress.chain_Vrms);
  traits.ratings[3] = given(part.overload_voltage_V) / share;
  traits.ratings[4] = given(part.pulse_energy_J) * chain.count;
  return traits;
}

}  // namespace dropfront::scoring
