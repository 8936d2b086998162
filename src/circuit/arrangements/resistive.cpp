#include "dropfront/circuit/arrangements/builders.hpp"
#include "dropfront/circuit/building_blocks.hpp"

namespace dropfront::circuit {

Network build_resistive(const ElementValues& values) {
  Network network;
  const Node behind = add_line(network, values);
  const Node rail = network.add_node();
  add_rectifier(network, behind, rail, values.rectifier);
  add_clamp(network, rail, 0, values.clamp);
  add_rail(network, rail, 0, values);
  set_start(network, values, values.clamp.main.threshold_V, values.rectifier.threshold_V);
  return network;
}

}  // namespace dropfront::circuit
