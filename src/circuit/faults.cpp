#include "dropfront/circuit/faults.hpp"

#include <algorithm>
#include <utility>

#include "dropfront/circuit/element_values.hpp"

namespace dropfront::circuit {

namespace {

bool lies(const BranchElement& d, Node a, Node b) { return d.a == a && d.b == b && !d.paired(); }

bool clamped(const Network& network, Node a, Node b) {
  const auto& branches = network.branches;
  return std::any_of(branches.begin(), branches.end(),
                     [&](const BranchElement& d) { return d.owner == Owner::clamp && lies(d, a, b); });
}

/// A diode exactly anti-parallel to a zener is that zener's own forward direction.
bool is_forward_of_clamp(const Network& network, const BranchElement& d) {
  return d.owner == Owner::rectifier && clamped(network, d.b, d.a);
}

bool back_to_back(const Network& network, const FaultPlace& place) {
  return place.owner == Owner::clamp && clamped(network, place.b, place.a);
}

template <typename Gone>
void remove_branches(Network& network, Gone gone) {
  auto& branches = network.branches;
  for (auto& thyristor : network.thyristors) {  // its feeding branch keeps its place in the list
    const auto before = branches.begin() + thyristor.feed_branch;
    thyristor.feed_branch -= static_cast<int>(std::count_if(branches.begin(), before, gone));
  }
  branches.erase(std::remove_if(branches.begin(), branches.end(), gone), branches.end());
}

Curve forward_curve(const Network& network) {
  for (const auto& d : network.branches) {
    if (d.owner != Owner::rectifier) continue;
    const double legs = d.paired() ? 2 : 1;
    return {d.threshold_V / legs, d.slope_ohm / legs};
  }
  return {0.7, 0.1};
}

/// One of two zeners shorted: the other still breaks down one way and conducts forward the other way.
void short_one_zener(Network& network, const FaultPlace& place) {
  const Curve forward = forward_curve(network);
  remove_branches(
      network, [&](const BranchElement& d) { return d.owner == Owner::clamp && lies(d, place.b, place.a); });
  network.branches.push_back({place.b, place.a, forward.threshold_V, forward.slope_ohm, Owner::clamp});
  for (auto& d : network.branches) {
    if (d.owner != Owner::clamp || !lies(d, place.a, place.b)) continue;
    d.threshold_V = std::max(0.1, d.threshold_V - forward.threshold_V);
    d.slope_ohm = std::max(1e-3, d.slope_ohm - forward.slope_ohm);
  }
}

bool has_leg(const BranchElement& d, const FaultPlace& place) {
  if (d.owner != place.owner || !d.paired()) return false;
  return (d.a == place.a && d.b == place.b) || (d.a2 == place.a && d.b2 == place.b);
}

/// Every diode of the bridge on its own but the one at `place`.
void single_out(Network& network, const FaultPlace& place) {
  std::vector<BranchElement> singles;
  for (const auto& d : network.branches) {
    if (d.owner != Owner::rectifier || !d.paired()) continue;
    for (const auto& [a, b] : {std::pair{d.a, d.b}, std::pair{d.a2, d.b2}}) {
      if (a == place.a && b == place.b) continue;
      singles.push_back({a, b, d.threshold_V / 2, d.slope_ohm / 2, d.owner});
    }
  }
  remove_branches(network, [](const BranchElement& d) { return d.owner == Owner::rectifier && d.paired(); });
  network.branches.insert(network.branches.end(), singles.begin(), singles.end());
}

}  // namespace

std::vector<FaultPlace> fault_places(const Network& network) {
  std::vector<FaultPlace> places;
  const auto add = [&](Owner owner, Node a, Node b) {
    const bool known = std::any_of(places.begin(), places.end(), [&](const FaultPlace& p) {
      return p.owner == owner && p.a == a && p.b == b;
    });
    if (!known) places.push_back({owner, a, b});
  };
  for (const auto& c : network.capacitors) add(c.owner, c.a, c.b);
  for (const auto& r : network.resistors) {
    // A capacitor's series resistance, a generator's and the leak are no parts of their own.
    const bool part =
        r.owner == Owner::series_resistor || r.owner == Owner::discharge || r.owner == Owner::gate_resistor;
    if (part) add(r.owner, r.a, r.b);
  }
  for (const auto& d : network.branches) {
    if (d.owner == Owner::load || is_forward_of_clamp(network, d)) continue;
    if (d.owner == Owner::varistor && d.a == 0) continue;  // its other direction
    add(d.owner, d.a, d.b);
    if (d.paired()) add(d.owner, d.a2, d.b2);
  }
  for (const auto& t : network.thyristors) add(Owner::thyristor, t.a, t.b);
  return places;
}

Network with_fault(Network network, const FaultPlace& place, FaultKind kind) {
  network.half_period_signs.clear();
  network.half_period_partner.clear();
  const auto in_bridge = [&](const BranchElement& d) { return has_leg(d, place); };
  const bool bridge = std::any_of(network.branches.begin(), network.branches.end(), in_bridge);
  if (kind == FaultKind::shorted) {
    if (bridge) single_out(network, place);
    if (back_to_back(network, place)) {
      short_one_zener(network, place);
    } else {
      network.resistors.push_back({place.a, place.b, kShort_ohm, Owner::leak});
    }
    return network;
  }
  for (auto& c : network.capacitors) {
    if (c.owner == place.owner && c.a == place.a && c.b == place.b) c.capacitance_F = kOpened_F;
  }
  for (auto& r : network.resistors) {
    if (r.owner == place.owner && r.a == place.a && r.b == place.b) r.resistance_ohm = 1e12;
  }
  if (place.owner == Owner::thyristor) network.thyristors.clear();
  const bool zener = place.owner == Owner::clamp;
  const bool both_ways = zener || place.owner == Owner::varistor;
  const auto forward = [&](const BranchElement& d) {
    return zener && d.owner == Owner::rectifier && lies(d, place.b, place.a);
  };
  remove_branches(network, [&](const BranchElement& d) {
    if (forward(d) || in_bridge(d)) return true;
    if (d.owner != place.owner) return false;
    return lies(d, place.a, place.b) || (both_ways && lies(d, place.b, place.a));
  });
  return network;
}

}  // namespace dropfront::circuit
