#include "dropfront/circuit/topology.hpp"

#include <queue>

namespace dropfront::circuit {

namespace {

struct TreeEdge {
  Node from, to;
  int column;  // capacitor index, or kSource
};

/// Each node's group, its offset from the group's root and the tree edges between them.
struct Forest {
  std::vector<int> root;  // -1: the neutral's group
  std::vector<Row> offset;
  std::vector<std::array<std::int8_t, kMaxStates + 1>> below;  // node lies behind that tree edge: +-1
  int roots = 0;
  bool loop = false;
};

Forest grow_forest(const Network& network) {
  std::vector<TreeEdge> edges;
  for (int k = 0; k < static_cast<int>(network.capacitors.size()); ++k) {
    edges.push_back({network.capacitors[k].a, network.capacitors[k].b, k});
  }
  edges.push_back({network.source.a, 0, kSource});

  Forest forest;
  forest.root.assign(network.node_count, -2);
  forest.offset.assign(network.node_count, Row{});
  forest.below.assign(network.node_count, {});
  std::vector<bool> used(edges.size(), false);
  for (Node seed = 0; seed < network.node_count; ++seed) {
    if (forest.root[seed] != -2) continue;
    const int group = seed == 0 ? -1 : forest.roots++;
    forest.root[seed] = group;
    std::queue<Node> open;
    open.push(seed);
    while (!open.empty()) {
      const Node here = open.front();
      open.pop();
      for (std::size_t e = 0; e < edges.size(); ++e) {
        if (used[e] || (edges[e].from != here && edges[e].to != here)) continue;
        used[e] = true;
        const bool forward = edges[e].from == here;  // walking from a to b loses v_ab
        const Node next = forward ? edges[e].to : edges[e].from;
        if (forest.root[next] != -2) {
          forest.loop = true;
          continue;
        }
        forest.root[next] = group;
        forest.offset[next] = forest.offset[here];
        forest.offset[next][edges[e].column] += forward ? -1 : 1;
        forest.below[next] = forest.below[here];
        forest.below[next][edges[e].column] = forward ? 1 : -1;
        open.push(next);
      }
    }
  }
  return forest;
}

Topology::Element between(const Forest& forest, Node a, Node b) {
  Topology::Element element;
  for (int c = 0; c < kColumns; ++c) element.offset[c] = forest.offset[a][c] - forest.offset[b][c];
  if (forest.root[a] >= 0) element.roots[forest.root[a]] += 1;
  if (forest.root[b] >= 0) element.roots[forest.root[b]] -= 1;
  for (int k = 0; k <= kMaxStates; ++k) {
    element.tree[k] = static_cast<std::int8_t>(forest.below[a][k] - forest.below[b][k]);
  }
  return element;
}

/// A branch with two legs: its voltage is the sum of both, its current runs through both.
Topology::Element both_legs(const Forest& forest, const BranchElement& branch) {
  Topology::Element element = between(forest, branch.a, branch.b);
  if (!branch.paired()) return element;
  const Topology::Element second = between(forest, branch.a2, branch.b2);
  for (int c = 0; c < kColumns; ++c) element.offset[c] += second.offset[c];
  for (int m = 0; m < kMaxRoots; ++m)
    element.roots[m] = static_cast<std::int8_t>(element.roots[m] + second.roots[m]);
  for (int k = 0; k <= kMaxStates; ++k)
    element.tree[k] = static_cast<std::int8_t>(element.tree[k] + second.tree[k]);
  return element;
}

std::string unusable(const Network& network) {
  const auto exponentials = network.source.waveform.exponentials().size();
  if (network.capacitors.size() + exponentials > kMaxStates) return "more capacitors than the solver holds";
  const auto bits = network.branches.size() + network.loads.size() + network.thyristors.size();
  if (network.resistors.size() + bits > kMaxElements || bits > 31) {
    return "more elements than the solver holds";
  }
  for (const auto& c : network.capacitors) {
    if (!(c.capacitance_F > 0)) return "a capacitor that is not above zero";
  }
  for (const auto& r : network.resistors) {
    if (!(r.resistance_ohm > 0)) return "a resistor that is not above zero";
  }
  for (const auto& d : network.branches) {
    if (!(d.slope_ohm > 0) || !(d.threshold_V >= 0)) return "a branch without a positive slope";
  }
  for (const auto& load : network.loads) {
    if (!(load.current_A >= 0) || !(load.cutoff_V > 0)) return "a load without a current or a cut-off";
  }
  for (const auto& t : network.thyristors) {
    if (!(t.slope_ohm > 0) || !(t.on_voltage_V >= 0) || !(t.holding_A > 0) || !(t.trigger_A > 0)) {
      return "a thyristor without slope, holding or trigger current";
    }
    const auto gates = static_cast<int>(network.resistors.size());
    const auto feeds = static_cast<int>(network.branches.size());
    if (t.gate_resistor < 0 || t.gate_resistor >= gates || t.feed_branch < 0 || t.feed_branch >= feeds) {
      return "a thyristor without gate or feed";
    }
  }
  if (network.source.waveform.tones().size() > kMostTones) return "more than 23 harmonics";
  if (!(network.source.waveform.voltage_Vrms() >= 0) || !(network.source.waveform.frequency_Hz() > 0)) {
    return "mains without voltage or frequency";
  }
  return {};
}

}  // namespace

Topology analyse(const Network& network) {
  Topology topology;
  topology.fault = unusable(network);
  if (!topology.fault.empty()) return topology;
  const Forest forest = grow_forest(network);
  topology.states = static_cast<int>(network.capacitors.size());
  topology.roots = forest.roots;
  if (forest.loop) topology.fault = "a loop of capacitors and source";
  if (forest.roots > kMaxRoots) topology.fault = "more node groups than the solver holds";
  if (!topology.fault.empty()) return topology;
  for (const auto& r : network.resistors) topology.elements.push_back(between(forest, r.a, r.b));
  for (const auto& d : network.branches) topology.elements.push_back(both_legs(forest, d));
  for (const auto& load : network.loads) topology.elements.push_back(between(forest, load.a, load.b));
  for (const auto& t : network.thyristors) topology.elements.push_back(between(forest, t.a, t.b));
  topology.rail = between(forest, network.rail, network.rail_return);
  return topology;
}

}  // namespace dropfront::circuit
