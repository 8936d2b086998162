#include "dropfront/circuit/arrangements/builders.hpp"
#include "dropfront/circuit/building_blocks.hpp"

namespace dropfront::circuit {

Network build_bridge_thyristor_shunt(const ElementValues& values) {
  Network network;
  const Node behind = add_mains_side(network, values);
  const auto [positive, negative] = add_bridge(network, behind, values);
  network.resistors.push_back({positive, negative, kShuntLeak_ohm, Owner::leak});
  const Node rail = network.add_node();
  const int feed = static_cast<int>(network.branches.size());
  add_rectifier(network, positive, rail, values.rectifier);
  add_rail(network, rail, negative, values);
  add_shunt(network, positive, negative, rail, negative, feed, values);
  while (network.half_period_partner.size() < network.branches.size()) {
    network.half_period_partner.push_back(static_cast<int>(network.half_period_partner.size()));
  }
  // Just behind the crest the dropper's current has passed zero and its node is on the way to the other
  // side: the current rests and nothing is latched.
  network.period_start_s = values.mains.crest_time_s() + 0.01 * values.mains.period_s();
  const double drop_V = 2 * values.rectifier.threshold_V + values.thyristor.threshold_V;
  network.capacitors[0].start_V = values.mains.crest_V() - drop_V;
  network.capacitors[1].start_V = firing_rail_V(values);
  return network;
}

}  // namespace dropfront::circuit
