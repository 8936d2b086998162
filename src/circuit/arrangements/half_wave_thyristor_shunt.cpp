#include <numbers>

#include "dropfront/circuit/arrangements/builders.hpp"
#include "dropfront/circuit/building_blocks.hpp"

namespace dropfront::circuit {

Network build_half_wave_thyristor_shunt(const ElementValues& values) {
  Network network;
  const Node behind = add_mains_side(network, values);
  add_rectifier(network, 0, behind, values.rectifier);  // resets the dropper in the other half cycle
  const Node rail = network.add_node();
  const int feed = static_cast<int>(network.branches.size());
  add_rectifier(network, behind, rail, values.rectifier);
  add_rail(network, rail, 0, values);
  add_shunt(network, behind, 0, rail, 0, feed, values);
  // The mains falls through zero and the reset diode carries the dropper's crest current: nothing is latched.
  network.period_start_s = 0.5 * values.mains.period_s();
  const double crest_A =
      values.mains.omega() * values.dropper_F * std::numbers::sqrt2 * values.mains.voltage_Vrms();
  network.capacitors[0].start_V = crest_A * values.series_resistor_ohm + values.rectifier.threshold_V;
  network.capacitors[1].start_V = firing_rail_V(values);
  return network;
}

}  // namespace dropfront::circuit
