#include "dropfront/problem/relaxed_design.hpp"

#include <limits>

namespace dropfront::problem {
namespace {

double given(const parts::Rating& rating) { return rating.value_or(0); }

std::int64_t chain_price(const Offers::Chain& chain, std::int64_t volume) {
  const auto price = parts::price_micro_at(chain.element->info, volume);
  return price ? *price * chain.count : std::numeric_limits<std::int64_t>::max();
}

}  // namespace

RelaxedDesigns::RelaxedDesigns(const Problem& problem, const SlotSpace& slots)
    : problem_(problem),
      slots_(slots),
      stress_(problem.requirement),
      droppers_(problem.offers.droppers, &parts::Dropper::capacitance_F, problem.requirement.volume),
      series_resistors_(problem.offers.series_resistors, &parts::Resistor::resistance_ohm,
                        problem.requirement.volume),
      clamps_(problem.offers.clamps, &parts::Clamp::voltage_V, problem.requirement.volume),
      reservoirs_(problem.offers.reservoirs, &parts::Reservoir::capacitance_F, problem.requirement.volume) {
  for (const Offers::Chain& chain : problem.offers.discharges) {
    if (chain.element) totals_.push_back({chain.element->resistance_ohm * chain.count, chain});
    chain_optional_ = chain_optional_ || !chain.element;
  }
  std::stable_sort(totals_.begin(), totals_.end(), [&](const Total& a, const Total& b) {
    if (a.ohm != b.ohm) return a.ohm < b.ohm;
    return chain_price(a.chain, problem.requirement.volume) <
           chain_price(b.chain, problem.requirement.volume);
  });
}

double RelaxedDesigns::position_of(SlotId id, const std::vector<double>& position) const {
  std::size_t axis = 0;
  for (std::size_t slot = 0; slot < slots_.ids.size(); ++slot) {
    const bool has_axis = !slots_.space.slots[slot].coordinate.empty();
    if (slots_.ids[slot] == id) {
      const double x = has_axis && axis < position.size() ? position[axis] : 0;
      return x >= 0 ? std::min(x, 1.0) : 0;  // a NaN counts as 0
    }
    if (has_axis) ++axis;
  }
  return 0;
}

scoring::Design RelaxedDesigns::make(const search::Choice& categories, const std::vector<double>& position,
                                     RelaxedParts& parts) const {
  search::Choice base(slots_.ids.size(), 0);
  for (std::size_t slot = 0; slot < base.size(); ++slot) {
    if (slots_.space.slots[slot].category) base[slot] = categories[slot];
  }
  scoring::Design design = design_of(problem_.offers, slots_.ids, base);
  const scoring::Derating& derating = problem_.requirement.derating;
  const bool full_wave = design.arrangement->full_wave;

  double most_F = 0;
  if (design.arrangement->dropper) {
    parts.dropper = droppers_.at(
        position_of(SlotId::dropper, position),
        [&](const parts::Dropper& part) {
          return part.rated_voltage_Vrms * derating.dropper_voltage >= stress_.line_Vrms() &&
                 (part.series_rated || !problem_.requirement.limits.series_rated);
        },
        [](const parts::Dropper& part) { return part.rated_voltage_Vrms; });
    design.dropper = &parts.dropper;
    most_F = design.dropper_count * parts.dropper.capacitance_F * (1 + parts.dropper.tolerance);
  }

  parts.series_resistor = series_resistors_.at(
      position_of(SlotId::series_resistor, position),
      [&](const parts::Resistor& part) {
        const double power_W = design.dropper
                                   ? stress_.resistor_W(most_F, part.resistance_ohm)
                                   : stress_.line_Vrms() * stress_.line_Vrms() / 2 / part.resistance_ohm;
        return given(part.rated_power_W) * derating.resistor_power >= power_W;
      },
      [](const parts::Resistor& part) { return given(part.rated_power_W); });
  design.series_resistor = &parts.series_resistor;

  const int clamps = std::max(1, design.arrangement->clamp_count);
  parts.clamp = clamps_.at(
      position_of(SlotId::clamp, position),
      [&](const parts::Clamp& part) {
        const double power_W = design.dropper ? stress_.clamp_W(most_F, part.voltage_max_V, full_wave)
                                              : part.voltage_max_V * current_Arms(design);
        return given(part.rated_power_W) * derating.clamp_power * clamps >= power_W;
      },
      [](const parts::Clamp& part) { return given(part.rated_power_W); });
  design.clamp = &parts.clamp;

  parts.reservoir = reservoirs_.at(
      position_of(SlotId::reservoir, position),
      [&](const parts::Reservoir& part) {
        return part.rated_voltage_V * derating.reservoir_voltage >= parts.clamp.voltage_max_V;
      },
      [](const parts::Reservoir& part) { return part.rated_voltage_V; });
  design.reservoir = &parts.reservoir;
  make_chain(position_of(SlotId::discharge, position), parts, design);
  return design;
}

double RelaxedDesigns::current_Arms(const scoring::Design& design) const {
  if (design.dropper) return stress_.current_Arms(design.dropper_count * design.dropper->capacitance_F);
  return stress_.line_Vrms() / (design.series_resistor_count * design.series_resistor->resistance_ohm);
}

void RelaxedDesigns::make_chain(double position, RelaxedParts& parts, scoring::Design& design) const {
  design.discharge = nullptr;
  design.discharge_count = 0;
  if (totals_.empty()) return;
  const double least = std::log(totals_.front().ohm), greatest = std::log(totals_.back().ohm);
  const double wanted = least + position * (greatest + (chain_optional_ ? 1 : 0) - least);
  if (wanted > greatest + 0.5) return;
  const double total_ohm = std::exp(std::min(wanted, greatest));
  const double element_limit_W = problem_.requirement.derating.resistor_power;
  // The nearest total whose elements hold voltage and power; else the nearest of all.
  const Total* best = nullptr;
  double best_distance = 0;
  for (const bool strict : {true, false}) {
    for (const Total& candidate : totals_) {
      const parts::Resistor& element = *candidate.chain.element;
      const double share_V = stress_.line_Vrms() / candidate.chain.count;
      const bool holds =
          given(element.rated_voltage_Vrms) >= share_V &&
          given(element.rated_power_W) * element_limit_W >= share_V * share_V / element.resistance_ohm;
      if (strict && !holds) continue;
      const double distance = std::abs(std::log(candidate.ohm / total_ohm));
      if (best && !(distance < best_distance)) continue;
      best = &candidate;
      best_distance = distance;
    }
    if (best) break;
  }
  parts.discharge = *best->chain.element;
  parts.discharge.resistance_ohm = total_ohm / best->chain.count;
  design.discharge = &parts.discharge;
  design.discharge_count = best->chain.count;
}

}  // namespace dropfront::problem
