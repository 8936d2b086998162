#include "dropfront/circuit/building_blocks.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace dropfront::circuit {

Node add_line(Network& network, const ElementValues& values) {
  const Node line = network.add_node();
  network.source = {line, values.mains};
  Node entry = line;
  if (values.source_ohm > 0) {
    entry = network.add_node();
    network.resistors.push_back({line, entry, values.source_ohm, Owner::line});
  }
  const Node after_resistor = network.add_node();
  network.resistors.push_back({entry, after_resistor, values.series_resistor_ohm, Owner::series_resistor});
  const Node guarded = values.varistor_before ? entry : after_resistor;
  for (const int way : {1, -1}) {
    if (values.varistor_ways == -way) continue;
    for (const Curve& piece : values.varistor) {
      const Node a = way > 0 ? guarded : 0, b = way > 0 ? 0 : guarded;
      network.branches.push_back({a, b, piece.threshold_V, piece.slope_ohm, Owner::varistor});
    }
  }
  return after_resistor;
}

Node add_mains_side(Network& network, const ElementValues& values) {
  const Node after_resistor = add_line(network, values);
  Node film = after_resistor;
  if (values.dropper_esr_ohm > 0) {
    film = network.add_node();
    network.resistors.push_back({after_resistor, film, values.dropper_esr_ohm, Owner::dropper});
  }
  const Node behind = network.add_node();
  network.capacitors.push_back({film, behind, values.dropper_F, Owner::dropper});
  if (std::isfinite(values.discharge_ohm)) {
    network.resistors.push_back({after_resistor, behind, values.discharge_ohm, Owner::discharge});
  }
  return behind;
}

void add_clamp(Network& network, Node cathode, Node anode, const ClampCurve& clamp) {
  if (clamp.knee) {
    network.branches.push_back(
        {cathode, anode, clamp.knee->threshold_V, clamp.knee->slope_ohm, Owner::clamp});
  }
  network.branches.push_back({cathode, anode, clamp.main.threshold_V, clamp.main.slope_ohm, Owner::clamp});
}

void add_rectifier(Network& network, Node anode, Node cathode, const Curve& curve) {
  network.branches.push_back({anode, cathode, curve.threshold_V, curve.slope_ohm, Owner::rectifier});
}

BridgeNodes add_bridge(Network& network, Node line_side, const ElementValues& values) {
  const Node positive = network.add_node();
  const Node negative = network.add_node();
  // Branches already there come in mirrored halves (clamps ahead of the bridge), or there are none.
  const int before = static_cast<int>(network.branches.size());
  for (int b = 0; b < before; ++b) network.half_period_partner.push_back((b + before / 2) % before);
  for (const int partner : {1, 0}) network.half_period_partner.push_back(before + partner);
  // Diodes that conduct together share their current to the last electron, so each pair is one branch.
  const double threshold_V = 2 * values.rectifier.threshold_V;
  const double slope_ohm = 2 * values.rectifier.slope_ohm;
  network.branches.push_back({line_side, positive, threshold_V, slope_ohm, Owner::rectifier, negative, 0});
  network.branches.push_back({0, positive, threshold_V, slope_ohm, Owner::rectifier, negative, line_side});
  network.resistors.push_back({negative, 0, kBridgeLeak_ohm, Owner::leak});
  if (values.mains.odd_only()) network.half_period_signs = {-1, 1};
  return {positive, negative};
}

namespace {

/// P/v by chords between voltages in geometric steps: the first chord is the load's own slope, every further
/// one a branch that opens where the chord before ends. Chords lie above the curve, by (r - 1)^2/(4·r).
void add_power_load(Network& network, Node positive, Node negative, const ElementValues& values) {
  const int chords = std::max(1, values.power_chords);
  const double from_V = values.power_from_V;
  const double ratio = std::pow(std::max(values.power_to_V, 1.01 * from_V) / from_V, 1.0 / chords);
  double low_V = from_V;
  double slope_S = 0;
  for (int k = 0; k <= chords; ++k) {
    const double high_V = low_V * ratio;
    const double next_S = k == chords ? 0 : -values.rail_power_W / (low_V * high_V);
    if (k == 0) {
      network.loads.push_back({positive, negative, values.rail_power_W / from_V, from_V, next_S});
    } else {
      network.branches.push_back({positive, negative, low_V, 1 / (next_S - slope_S), Owner::load});
    }
    slope_S = next_S;
    low_V = high_V;
  }
}

}  // namespace

void add_rail(Network& network, Node positive, Node negative, const ElementValues& values) {
  Node plate = positive;
  if (values.reservoir_esr_ohm > 0) {
    plate = network.add_node();
    network.resistors.push_back({positive, plate, values.reservoir_esr_ohm, Owner::reservoir});
  }
  const bool direct = plate == positive;  // no series resistance: a ceramic beside it is one with it
  const double reservoir_F = values.reservoir_F + (direct ? values.ceramic_F : 0);
  network.capacitors.push_back({plate, negative, reservoir_F, Owner::reservoir});
  if (values.ceramic_F > 0 && !direct) {
    network.capacitors.push_back({positive, negative, values.ceramic_F, Owner::ceramic});
    if (!network.half_period_signs.empty()) network.half_period_signs.push_back(1);
  }
  if (values.rail_current_A > 0) {
    network.loads.push_back({positive, negative, values.rail_current_A, values.load_cutoff_V});
  }
  if (values.rail_power_W > 0) add_power_load(network, positive, negative, values);
  if (!network.half_period_signs.empty()) {
    // What hangs on the rail does half a period later what it does now.
    while (network.half_period_partner.size() < network.branches.size()) {
      network.half_period_partner.push_back(static_cast<int>(network.half_period_partner.size()));
    }
  }
  network.rail = positive;
  network.rail_return = negative;
}

void set_start(Network& network, const ElementValues& values, double rail_V, double drop_V) {
  const double crest_current_A =
      values.mains.omega() * values.dropper_F * std::numbers::sqrt2 * values.mains.voltage_Vrms();
  for (auto& capacitor : network.capacitors) {
    if (capacitor.owner == Owner::dropper) {
      capacitor.start_V = -(rail_V + drop_V) - crest_current_A * values.series_resistor_ohm;
    } else {
      capacitor.start_V = rail_V;
    }
  }
}

void add_shunt(Network& network, Node anode, Node cathode, Node positive, Node negative, int feed_branch,
               const ElementValues& values) {
  const Node gate = network.add_node();
  const int gate_resistor = static_cast<int>(network.resistors.size());
  network.resistors.push_back({positive, gate, values.gate_resistor_ohm, Owner::gate_resistor});
  ClampCurve trigger = values.clamp;
  trigger.main.threshold_V += kGateVoltage_V;
  if (trigger.knee) trigger.knee->threshold_V += kGateVoltage_V;
  add_clamp(network, gate, negative, trigger);
  network.thyristors.push_back({anode, cathode, values.thyristor.threshold_V, values.thyristor.slope_ohm,
                                values.thyristor_holding_A, gate_resistor, values.thyristor_trigger_A,
                                feed_branch});
}

double firing_rail_V(const ElementValues& values) {
  const double current_A = values.thyristor_trigger_A;
  const auto& clamp = values.clamp;
  double zener_V = clamp.main.threshold_V + clamp.main.slope_ohm * current_A;
  if (clamp.knee) {
    // Below the bend the knee branch carries all; above it both share.
    const double knee_V = clamp.knee->threshold_V + clamp.knee->slope_ohm * current_A;
    const double both_S = 1 / clamp.knee->slope_ohm + 1 / clamp.main.slope_ohm;
    const double shared_V = (current_A + clamp.knee->threshold_V / clamp.knee->slope_ohm +
                             clamp.main.threshold_V / clamp.main.slope_ohm) /
                            both_S;
    zener_V = knee_V <= clamp.main.threshold_V ? knee_V : shared_V;
  }
  return zener_V + kGateVoltage_V + values.gate_resistor_ohm * current_A;
}

ClampCurve in_series(const ClampCurve& clamp, const Curve& forward) {
  ClampCurve sum;
  if (!clamp.knee) {
    sum.main = {clamp.main.threshold_V + forward.threshold_V, clamp.main.slope_ohm + forward.slope_ohm};
    return sum;
  }
  const double knee_slope = clamp.knee->slope_ohm;
  const double both = 1 / (1 / knee_slope + 1 / clamp.main.slope_ohm);
  // Current at which the main branch opens beside the knee branch; the series curve bends there too.
  const double bend_A = (clamp.main.threshold_V - clamp.knee->threshold_V) / knee_slope;
  sum.knee = Curve{clamp.knee->threshold_V + forward.threshold_V, knee_slope + forward.slope_ohm};
  sum.main.threshold_V = clamp.main.threshold_V + forward.threshold_V + forward.slope_ohm * bend_A;
  const double both_in_series = both + forward.slope_ohm;
  sum.main.slope_ohm = 1 / (1 / both_in_series - 1 / sum.knee->slope_ohm);
  return sum;
}

}  // namespace dropfront::circuit
