#include "dropfront/circuit/arrangements/builders.hpp"
#include "dropfront/circuit/building_blocks.hpp"

namespace dropfront::circuit {

Network build_bridge_clamp_ahead(const ElementValues& values) {
  Network network;
  const Node behind = add_mains_side(network, values);
  // Two zeners back to back: in either direction one breaks down while the other conducts forward.
  const ClampCurve pair = in_series(values.clamp, values.rectifier);
  add_clamp(network, behind, 0, pair);
  add_clamp(network, 0, behind, pair);
  const auto [positive, negative] = add_bridge(network, behind, values);
  add_rail(network, positive, negative, values);
  set_start(network, values, values.clamp.main.threshold_V - values.rectifier.threshold_V,
            2 * values.rectifier.threshold_V);
  return network;
}

}  // namespace dropfront::circuit
