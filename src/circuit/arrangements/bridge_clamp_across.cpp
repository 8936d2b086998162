#include "dropfront/circuit/arrangements/builders.hpp"
#include "dropfront/circuit/building_blocks.hpp"

namespace dropfront::circuit {

Network build_bridge_clamp_across(const ElementValues& values) {
  Network network;
  const Node behind = add_mains_side(network, values);
  const auto [positive, negative] = add_bridge(network, behind, values);
  add_clamp(network, positive, negative, values.clamp);
  add_rail(network, positive, negative, values);
  set_start(network, values, values.clamp.main.threshold_V, 2 * values.rectifier.threshold_V);
  return network;
}

}  // namespace dropfront::circuit
