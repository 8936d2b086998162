#include <algorithm>
#include <array>

#include "dropfront/circuit/steady_state.hpp"
#include "dropfront/scoring/bounds/charge.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

namespace {

constexpr int kMostTried = 4;  // steady states one bound may cost

/// Where the input power was found to grow with C, Rs, clamp and 1/Rb and to fall with the load. A chain that
/// takes a good part of the current turns the clamp's sign: a higher clamp leaves it less voltage, which
/// saves more than the clamp takes [68 nF, 100 kohm, bridge: 0.631 W at 45 V, 0.617 W at 86 V]. A bridge's
/// clamp takes 4f·C·(Vpk - 2V) more a volt, the chain about 1.2·Vpk/Rb less; a half-wave's 2f·C·(Vpk - V) and
/// half.
bool in_range(const BoxQuestion& question, const CornerCharge& charge) {
  const auto& ends = question.ends;
  const double omega = question.supply.standby.omega;
  const double phase = omega * ends.greatest(Figure::series_high_ohm) * ends.greatest(Figure::new_F);
  const double chain = 1 / (omega * ends.least(Figure::new_F) * ends.least(Figure::chain_low_ohm));
  const double share = question.full_wave() ? 0.42 - 0.5 * phase - 1.5 * chain : 0.5 - 1.5 * chain;
  return phase <= 0.4 && chain <= 0.15 && charge.node_most_V <= share * question.supply.standby.crest_V;
}

/// Whether one entry of a list stands for another in the standby corner.
bool alike(const parts::Reservoir& a, const parts::Reservoir& b) {
  return a.capacitance_F == b.capacitance_F && a.esr_ohm == b.esr_ohm;
}
bool alike(const parts::Rectifier& a, const parts::Rectifier& b) {
  return a.threshold_voltage_V == b.threshold_voltage_V && a.slope_resistance_ohm == b.slope_resistance_ohm;
}

template <class Part>
std::vector<const Part*> unlike(const std::vector<const Part*>& list) {
  std::vector<const Part*> kept;
  for (const auto* part : list) {
    const auto same = [part](const Part* other) { return alike(*part, *other); };
    if (std::none_of(kept.begin(), kept.end(), same)) kept.push_back(part);
    if (kept.size() > kMostTried) break;
  }
  return kept;
}

}  // namespace

/// Input power of a steady state with the least C (over the air of standby), Rs, clamp threshold and slope,
/// the greatest chain and the greatest load of the box; reservoirs and rectifiers are tried. Monotone by
/// test, in the range of `in_range`; a state that does not converge shows nothing. A clamp that warms itself
/// stands higher by its tempco and takes more: its threshold is the least over the junctions there can be,
/// warmed by the least charge that must pass it (self_heated_V); one that falls as it warms counts at its
/// hottest.
std::optional<double> standby_by_engine(const BoxQuestion& question) {
  const auto& ends = question.ends;
  if (!ends.known_circuit()) return std::nullopt;
  const auto& charge = question.charge(BoxCorner::standby);
  if (!in_range(question, charge)) return std::nullopt;
  const auto reservoirs = unlike(question.box.reservoirs);
  const auto rectifiers = unlike(question.box.rectifiers);
  if (reservoirs.size() * rectifiers.size() > kMostTried) return std::nullopt;
  circuit::ElementValues values;
  values.mains = question.supply.shapes.nominal;
  values.series_resistor_ohm = ends.least(Figure::series_high_ohm);
  values.dropper_F = ends.least(Figure::new_F);
  values.dropper_esr_ohm = ends.least(Figure::loss_tangent) / (values.mains.omega() * values.dropper_F);
  values.discharge_ohm = ends.greatest(Figure::chain_low_ohm);
  values.clamp.main = {charge.clamp_V, ends.least(Figure::clamp_ohm)};
  values.rail_current_A = load_most_A(question, BoxCorner::standby, 1);
  values.load_cutoff_V = 0.5 * ends.least(Figure::required_V);
  std::optional<double> least_W;
  for (const auto* reservoir : reservoirs) {
    values.reservoir_F = reservoir->capacitance_F;
    values.reservoir_esr_ohm = reservoir->esr_ohm;
    for (const auto* rectifier : rectifiers) {
      values.rectifier = {rectifier->threshold_voltage_V, rectifier->slope_resistance_ohm};
      const auto state = circuit::solve_steady_state(question.box.arrangement->build(values),
                                                     {.peaks = false, .multipliers = false});
      if (!state.usable()) return std::nullopt;
      least_W = std::min(least_W.value_or(state.input_power_W), state.input_power_W);
    }
  }
  // The score settles its load to a millionth and the energy law closes to one.
  return *least_W * (1 - 5e-6);
}

}  // namespace dropfront::scoring::bounds
