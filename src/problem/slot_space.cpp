#include "dropfront/problem/slot_space.hpp"

#include <algorithm>
#include <cmath>

namespace dropfront::problem {
namespace {

class Builder {
 public:
  explicit Builder(SlotSpace& out) : out_(out) {}

  void add(SlotId id, const char* name, std::size_t size, std::vector<double> coordinate = {},
           bool category = false) {
    if (size == 0) return;
    search::Slot slot;
    slot.name = name;
    slot.size = static_cast<int>(size);
    slot.category = category;
    if (size > 1) slot.coordinate = std::move(coordinate);
    out_.space.slots.push_back(std::move(slot));
    out_.ids.push_back(id);
  }

  void couple(SlotId a, SlotId b) {
    const auto at = [&](SlotId id) {
      return static_cast<int>(std::find(out_.ids.begin(), out_.ids.end(), id) - out_.ids.begin());
    };
    const int count = static_cast<int>(out_.ids.size());
    if (at(a) < count && at(b) < count) out_.space.coupled.emplace_back(at(a), at(b));
  }

 private:
  SlotSpace& out_;
};

template <class Part>
std::vector<double> logs(const std::vector<const Part*>& parts, double Part::*value) {
  std::vector<double> out;
  for (const Part* part : parts) out.push_back(std::log(part->*value));
  return out;
}

std::vector<double> chain_logs(const std::vector<Offers::Chain>& chains) {
  std::vector<double> out;
  double greatest = 0;
  for (const Offers::Chain& chain : chains) {
    out.push_back(chain.element ? std::log(chain.element->resistance_ohm * chain.count) : 0);
    if (chain.element) greatest = std::max(greatest, out.back());
  }
  for (std::size_t i = 0; i < chains.size(); ++i) {
    if (!chains[i].element) out[i] = greatest + 1;
  }
  return out;
}

}  // namespace

std::vector<Offers::Wiring> Offers::wirings() const {
  std::vector<Wiring> out;
  for (const auto* arrangement : arrangements) {
    if (!arrangement->thyristor_shunt) {
      out.push_back({arrangement, nullptr, nullptr});
      continue;
    }
    for (const auto* thyristor : thyristors) {
      for (const auto* gate : gate_resistors) out.push_back({arrangement, thyristor, gate});
    }
  }
  return out;
}

SlotSpace make_space(const Offers& offers) {
  SlotSpace out;
  Builder build(out);
  build.add(SlotId::arrangement, "arrangement", offers.wirings().size(), {}, true);
  build.add(SlotId::output_stage, "output_stage", offers.output_stages.size(), {}, true);
  for (const parts::OutputStage* stage : offers.output_stages)
    out.space.slots.back().group.push_back(static_cast<int>(stage->kind));
  build.add(SlotId::dropper, "dropper", offers.droppers.size(),
            logs(offers.droppers, &parts::Dropper::capacitance_F));
  build.add(SlotId::series_resistor, "series_resistor", offers.series_resistors.size(),
            logs(offers.series_resistors, &parts::Resistor::resistance_ohm));
  build.add(SlotId::clamp, "clamp", offers.clamps.size(), logs(offers.clamps, &parts::Clamp::voltage_V));
  build.add(SlotId::reservoir, "reservoir", offers.reservoirs.size(),
            logs(offers.reservoirs, &parts::Reservoir::capacitance_F));
  build.add(SlotId::discharge, "discharge", offers.discharges.size(), chain_logs(offers.discharges));
  build.add(SlotId::rectifier, "rectifier", offers.rectifiers.size());
  build.add(SlotId::varistor, "varistor", offers.varistors.size());
  build.add(SlotId::fuse, "fuse", offers.fuses.size());
  build.add(SlotId::ceramic, "ceramic", offers.ceramics.size());
  build.couple(SlotId::dropper, SlotId::series_resistor);
  build.couple(SlotId::clamp, SlotId::reservoir);
  build.couple(SlotId::clamp, SlotId::output_stage);
  build.couple(SlotId::dropper, SlotId::discharge);
  return out;
}

scoring::Design design_of(const Offers& offers, const std::vector<SlotId>& ids,
                          const search::Choice& choice) {
  scoring::Design design;
  design.dropper_count = offers.dropper_parallel;
  design.series_resistor_count = offers.series_resistor_split;
  design.varistor_before = offers.varistor_before_resistor;
  for (std::size_t slot = 0; slot < ids.size(); ++slot) {
    const auto i = static_cast<std::size_t>(choice[slot]);
    switch (ids[slot]) {
      case SlotId::arrangement: {
        const auto wirings = offers.wirings();
        design.arrangement = wirings[i].arrangement;
        design.thyristor = wirings[i].thyristor;
        design.gate_resistor = wirings[i].gate_resistor;
        break;
      }
      case SlotId::output_stage:
        design.output_stage = offers.output_stages[i];
        break;
      case SlotId::dropper:
        design.dropper = offers.droppers[i];
        break;
      case SlotId::series_resistor:
        design.series_resistor = offers.series_resistors[i];
        break;
      case SlotId::clamp:
        design.clamp = offers.clamps[i];
        break;
      case SlotId::reservoir:
        design.reservoir = offers.reservoirs[i];
        break;
      case SlotId::discharge:
        design.discharge = offers.discharges[i].element;
        design.discharge_count = offers.discharges[i].count;
        break;
      case SlotId::rectifier:
        design.rectifier = offers.rectifiers[i];
        break;
      case SlotId::varistor:
        design.varistor = offers.varistors[i];
        break;
      case SlotId::fuse:
        design.fuse = offers.fuses[i];
        break;
      case SlotId::ceramic:
        design.ceramic = offers.ceramics[i];
        break;
    }
  }
  return design;
}

}  // namespace dropfront::problem
