#include "dropfront/circuit/faults.hpp"

#include <algorithm>
#include <utility>
#include <vector>

namespace dropfront::circuit {

namespace {

using Ends = std::pair<Node, Node>;

/// The distinct pairs of nodes between which elements of `owner` lie, in network order.
std::vector<Ends> places_of(const Network& network, Owner owner) {
  std::vector<Ends> places;
  const auto add = [&](Owner of, Node a, Node b) {
    if (of == owner && std::find(places.begin(), places.end(), Ends{a, b}) == places.end()) {
      places.emplace_back(a, b);
    }
  };
  for (const auto& c : network.capacitors) add(c.owner, c.a, c.b);
  // A capacitor's series resistance is no part of its own.
  if (places.empty()) {
    for (const auto& r : network.resistors) add(r.owner, r.a, r.b);
  }
  for (const auto& d : network.branches) add(d.owner, d.a, d.b);
  return places;
}

bool lies(const Ends& ends, Node a, Node b) { return ends.first == a && ends.second == b; }

}  // namespace

int fault_places(const Network& network, Owner owner) {
  return static_cast<int>(places_of(network, owner).size());
}

Network with_fault(Network network, Owner owner, FaultKind kind, int place) {
  const auto places = places_of(network, owner);
  if (place < 0 || place >= static_cast<int>(places.size())) return network;
  const Ends ends = places[static_cast<std::size_t>(place)];
  network.half_period_signs.clear();
  if (kind == FaultKind::shorted) {
    network.resistors.push_back({ends.first, ends.second, kShort_ohm, owner});
    return network;
  }
  for (auto& c : network.capacitors) {
    if (c.owner == owner && lies(ends, c.a, c.b)) c.capacitance_F = kOpened_F;
  }
  for (auto& r : network.resistors) {
    if (r.owner == owner && lies(ends, r.a, r.b)) r.resistance_ohm = 1e12;
  }
  auto& branches = network.branches;
  const auto gone = [&](const BranchElement& d) { return d.owner == owner && lies(ends, d.a, d.b); };
  for (auto& thyristor : network.thyristors) {  // its feeding branch keeps its place in the list
    const auto before = branches.begin() + thyristor.feed_branch;
    thyristor.feed_branch -= static_cast<int>(std::count_if(branches.begin(), before, gone));
  }
  branches.erase(std::remove_if(branches.begin(), branches.end(), gone), branches.end());
  network.half_period_partner.clear();
  return network;
}

}  // namespace dropfront::circuit
