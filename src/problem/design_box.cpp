#include "dropfront/problem/design_box.hpp"

#include <cstddef>

namespace dropfront::problem {
namespace {

bool same(const scoring::Chain& a, const Offers::Chain& b) {
  return a.element == b.element && a.count == b.count;
}
template <class Part>
bool same(const Part* a, const Part* b) {
  return a == b;
}

scoring::Chain as_listed(const Offers::Chain& chain) { return {chain.element, chain.count}; }
template <class Part>
const Part* as_listed(const Part* part) {
  return part;
}

/// Calls act(offered list, list of the box) for one slot; the arrangement's is no list of parts.
template <class Box, class Act>
void with_lists(SlotId id, const Offers& offers, Box& box, const Act& act) {
  switch (id) {
    case SlotId::arrangement:
      return;
    case SlotId::output_stage:
      return act(offers.output_stages, box.output_stages);
    case SlotId::dropper:
      return act(offers.droppers, box.droppers);
    case SlotId::series_resistor:
      return act(offers.series_resistors, box.series_resistors);
    case SlotId::clamp:
      return act(offers.clamps, box.clamps);
    case SlotId::reservoir:
      return act(offers.reservoirs, box.reservoirs);
    case SlotId::discharge:
      return act(offers.discharges, box.discharges);
    case SlotId::rectifier:
      return act(offers.rectifiers, box.rectifiers);
    case SlotId::varistor:
      return act(offers.varistors, box.varistors);
    case SlotId::fuse:
      return act(offers.fuses, box.fuses);
    case SlotId::ceramic:
      return act(offers.ceramics, box.ceramics);
  }
}

/// A slot that offers nothing still has one entry: no part.
template <class Part>
void fill(std::vector<Part>& list) {
  if (list.empty()) list.push_back(Part{});
}

}  // namespace

scoring::DesignBox design_box(const Offers& offers, const std::vector<SlotId>& ids, const search::Box& box) {
  scoring::DesignBox out;
  for (std::size_t slot = 0; slot < ids.size(); ++slot) {
    const auto& options = box.options[slot];
    if (ids[slot] == SlotId::arrangement) {
      const Offers::Wiring wiring = offers.wirings()[static_cast<std::size_t>(options.front())];
      out.arrangement = wiring.arrangement;
      out.thyristors = {wiring.thyristor};
      out.gate_resistors = {wiring.gate_resistor};
    }
    with_lists(ids[slot], offers, out, [&](const auto& offered, auto& list) {
      list.reserve(options.size());
      for (const auto option : options) list.push_back(as_listed(offered[static_cast<std::size_t>(option)]));
    });
  }
  fill(out.output_stages);
  fill(out.droppers);
  fill(out.series_resistors);
  fill(out.clamps);
  fill(out.reservoirs);
  fill(out.discharges);
  fill(out.rectifiers);
  fill(out.varistors);
  fill(out.fuses);
  fill(out.ceramics);
  fill(out.thyristors);
  fill(out.gate_resistors);
  return out;
}

void keep_parts(const Offers& offers, const std::vector<SlotId>& ids, const scoring::DesignBox& left,
                search::Box& box) {
  for (std::size_t slot = 0; slot < ids.size(); ++slot) {
    auto& options = box.options[slot];
    with_lists(ids[slot], offers, left, [&](const auto& offered, const auto& list) {
      std::size_t kept = 0;
      for (const auto option : options) {
        if (kept == list.size()) break;
        if (same(list[kept], offered[static_cast<std::size_t>(option)])) options[kept++] = option;
      }
      options.resize(kept);
    });
  }
}

}  // namespace dropfront::problem
