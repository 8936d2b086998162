#include "scoring/bounds/support/box_sample.hpp"

#include <algorithm>

namespace dropfront::scoring::test {

namespace {

Supply supply_of(double volt, double hertz) {
  return {"", {0.9 * volt, volt, 1.1 * volt}, {hertz - 0.5, hertz, hertz + 0.5}, {}, false, false};
}

Requirement requirement_of(double output_V, const Supply& supply) {
  Requirement requirement;
  requirement.supplies.push_back(supply);
  requirement.output.voltage_V = output_V;
  requirement.output.loads.push_back({"asleep", false, 0.2e-3, {}, {}, {}});
  requirement.output.loads.push_back({"awake", false, 6e-3, {}, {}, {}});
  requirement.output.standby_load = 0;
  requirement.output.start_load_A = 1e-3;
  requirement.limits.standby_power_W = 0.5;
  requirement.limits.current_margin = 0.1;
  requirement.limits.discharge = DischargeRule{34, 1, 0.1e-6, ""};
  requirement.limits.series_rated = true;
  requirement.surroundings.max_height_mm = 14;
  requirement.surroundings.life_years = 25;
  requirement.volume = 1000;
  requirement.placement_cost_micro = 4000;
  return requirement;
}

std::vector<Requirement> make_requirements() {
  std::vector<Requirement> all;
  all.push_back(requirement_of(5, supply_of(230, 50)));
  all.push_back(requirement_of(12, supply_of(120, 60)));
  all.back().surroundings.enclosure_K_per_W = 15;
  all.back().surroundings.ambient_degC = {-20, 25, 60};
  all.push_back(requirement_of(3.3, supply_of(230, 50)));
  all.back().supplies.front().harmonics = {{3, 0.03, 0}, {5, 0.02, 3.14159}};
  all.back().supplies.front().harmonics_given = true;
  all.back().surroundings.ambient_degC = {25, 25, 25};
  all.back().output.loads.push_back({"relay", true, 1e-3, 6.0, {}, {}});
  all.push_back(requirement_of(5, supply_of(120, 60)));
  all.back().supplies.push_back(supply_of(230, 50));
  all.back().surroundings.enclosure_K_per_W = 8;
  return all;
}

template <class Part>
std::vector<const Part*> pick(const std::vector<Part>& from, std::size_t count,
                              values::RandomStream& random) {
  std::vector<const Part*> picked;
  while (picked.size() < std::min(count, from.size())) {
    const Part* part = &from[random.below(from.size())];
    if (std::find(picked.begin(), picked.end(), part) == picked.end()) picked.push_back(part);
  }
  return picked;
}

/// The parts of a list that pass a test.
template <class Part, class Test>
std::vector<Part> those(const std::vector<Part>& from, Test test) {
  std::vector<Part> left;
  std::copy_if(from.begin(), from.end(), std::back_inserter(left), test);
  return left;
}

bool feeds(const parts::Resistor& part, std::string_view slot) {
  return part.slots.empty() || std::find(part.slots.begin(), part.slots.end(), slot) != part.slots.end();
}

/// The lists a box draws from.
struct Offers {
  std::vector<parts::Resistor> series, chain;
  std::vector<parts::OutputStage> stages[3];
};

const Offers& offers() {
  static const Offers made = [] {
    const auto& all = demo_parts();
    Offers o;
    o.series = those(all.resistors, [](const auto& r) { return feeds(r, "series_resistor"); });
    o.chain = those(all.resistors,
                    [](const auto& r) { return feeds(r, "discharge") && r.resistance_ohm >= 100e3; });
    for (int kind = 0; kind < 3; ++kind) {
      o.stages[kind] =
          those(all.output_stages, [kind](const auto& s) { return static_cast<int>(s.kind) == kind; });
    }
    return o;
  }();
  return made;
}

}  // namespace

const parts::Catalogue& demo_parts() {
  static const parts::Catalogue catalogue = [] {
    parts::Catalogue read;
    parts::read_parts_folder(DROPFRONT_SOURCE_DIR "/problems/parts/demo", read);
    // What the lists do not hold: lossy films, a class for lesser impulses or none, a capacitance that rises
    // with temperature, ratings left out.
    for (std::size_t i = 0; i < read.droppers.size(); i += 5) {
      auto odd = read.droppers[i];
      odd.loss_tangent = 0.01 + 0.002 * static_cast<double>(i % 7);
      odd.class_name = i % 2 == 0 ? "X3" : "";
      if (i % 3 == 0) odd.temperature_coefficient_per_K = 150e-6;
      if (i % 4 == 0) odd.slew_V_per_s.reset();
      read.droppers.push_back(odd);
    }
    for (std::size_t i = 0; i < read.resistors.size(); i += 9) {
      auto odd = read.resistors[i];
      odd.pulse_energy_J.reset();
      odd.opens_at.reset();
      if (i % 2 == 0) odd.rated_power_W.reset();
      read.resistors.push_back(odd);
    }
    return read;
  }();
  return catalogue;
}

const std::vector<Requirement>& requirements() {
  static const std::vector<Requirement> all = make_requirements();
  return all;
}

const std::vector<BoundContext>& contexts() {
  static const std::vector<BoundContext> all = [] {
    std::vector<BoundContext> made;
    for (const auto& requirement : requirements()) made.emplace_back(requirement);
    return made;
  }();
  return all;
}

DesignBox box_open_in(int slot, const circuit::Arrangement& arrangement, const Requirement& requirement,
                      values::RandomStream& random) {
  auto box = random_box(arrangement, requirement, 1, random);
  // Three whole designs are drawn; of two of them only the open slot is kept.
  for (int i = 0; i < 2; ++i) {
    const auto other = random_box(arrangement, requirement, 1, random);
    const auto take = [](auto& list, const auto& from) { list.push_back(from.front()); };
    if (slot == 0 && other.output_stages.front()->kind == box.output_stages.front()->kind) {
      take(box.output_stages, other.output_stages);
    }
    if (slot == 1) take(box.droppers, other.droppers);
    if (slot == 2) take(box.series_resistors, other.series_resistors);
    if (slot == 3) take(box.clamps, other.clamps);
    if (slot == 4) take(box.reservoirs, other.reservoirs);
    if (slot == 5) take(box.discharges, other.discharges);
    if (slot == 6) take(box.rectifiers, other.rectifiers);
  }
  return box;
}

DesignBox random_box(const circuit::Arrangement& arrangement, const Requirement& requirement,
                     int most_members, values::RandomStream& random) {
  const auto& all = demo_parts();
  DesignBox box;
  box.arrangement = &arrangement;
  double left = most_members;
  // A coin a list: some slots are open, the others hold one part.
  const auto size = [&]() -> std::size_t {
    const std::size_t wanted = random.below(3) == 0 ? 1 : 2 + random.below(2);
    const auto allowed = static_cast<std::size_t>(std::max(1.0, left));
    const std::size_t taken = std::min(wanted, allowed);
    left /= static_cast<double>(taken);
    return taken;
  };
  const bool first_half = random.below(2) == 0;  // so that each slot is often open
  if (first_half) box.reservoirs = pick(all.reservoirs, size(), random);
  const auto kind = random.below(3);
  const auto fitting = [&](const parts::OutputStage& stage) {
    return stage.output_voltage_V <= 1.2 * requirement.output.voltage_V;
  };
  auto stages = pick(offers().stages[kind], offers().stages[kind].size(), random);
  std::stable_sort(stages.begin(), stages.end(),
                   [&](const auto* a, const auto* b) { return fitting(*a) > fitting(*b); });
  stages.resize(std::min(stages.size(), size()));
  box.output_stages = stages;
  box.clamps = pick(all.clamps, size(), random);
  box.series_resistors = pick(offers().series, size(), random);
  box.droppers = pick(all.droppers, size(), random);
  box.rectifiers = pick(all.rectifiers, size(), random);
  const std::size_t chains = size();
  for (std::size_t i = 0; i < chains; ++i) {
    const auto* element = &offers().chain[random.below(offers().chain.size())];
    const int count = static_cast<int>(random.below(4));
    box.discharges.push_back(count == 0 ? Chain{} : Chain{element, count});
  }
  if (!first_half) box.reservoirs = pick(all.reservoirs, size(), random);
  box.varistors = {nullptr};
  box.fuses = {nullptr, &all.fuses[random.below(all.fuses.size())]};
  if (left < 2) box.fuses = {random.below(2) == 0 ? nullptr : box.fuses[1]};
  box.ceramics = {nullptr};
  box.thyristors = {nullptr};
  box.gate_resistors = {nullptr};
  if (arrangement.thyristor_shunt) {
    const auto gates = [](const parts::Resistor& part) {
      return std::find(part.slots.begin(), part.slots.end(), "gate_resistor") != part.slots.end();
    };
    box.thyristors = {&all.thyristors[random.below(all.thyristors.size())]};
    std::vector<const parts::Resistor*> fit;
    for (const auto& part : all.resistors) {
      if (gates(part)) fit.push_back(&part);
    }
    box.gate_resistors = {fit[random.below(fit.size())]};
  }
  return box;
}

std::vector<Design> members_of(const DesignBox& box) {
  std::vector<Design> members{Design{}};
  members.front().arrangement = box.arrangement;
  const auto cross = [&members](const auto& list, auto set) {
    std::vector<Design> next;
    for (const auto& design : members) {
      for (const auto& entry : list) {
        next.push_back(design);
        set(next.back(), entry);
      }
    }
    members = std::move(next);
  };
  cross(box.output_stages, [](Design& d, const auto* p) { d.output_stage = p; });
  cross(box.droppers, [](Design& d, const auto* p) { d.dropper = p; });
  cross(box.series_resistors, [](Design& d, const auto* p) { d.series_resistor = p; });
  cross(box.clamps, [](Design& d, const auto* p) { d.clamp = p; });
  cross(box.reservoirs, [](Design& d, const auto* p) { d.reservoir = p; });
  cross(box.discharges, [](Design& d, const Chain& c) {
    d.discharge = c.element;
    d.discharge_count = c.count;
  });
  cross(box.rectifiers, [](Design& d, const auto* p) { d.rectifier = p; });
  cross(box.varistors, [](Design& d, const auto* p) { d.varistor = p; });
  cross(box.fuses, [](Design& d, const auto* p) { d.fuse = p; });
  cross(box.ceramics, [](Design& d, const auto* p) { d.ceramic = p; });
  cross(box.thyristors, [](Design& d, const auto* p) { d.thyristor = p; });
  cross(box.gate_resistors, [](Design& d, const auto* p) { d.gate_resistor = p; });
  return members;
}

DesignBox box_of(const Design& design) {
  DesignBox box;
  box.arrangement = design.arrangement;
  box.output_stages = {design.output_stage};
  box.droppers = {design.dropper};
  box.series_resistors = {design.series_resistor};
  box.clamps = {design.clamp};
  box.reservoirs = {design.reservoir};
  box.discharges = {{design.discharge, design.discharge_count}};
  box.rectifiers = {design.rectifier};
  box.varistors = {design.varistor};
  box.fuses = {design.fuse};
  box.ceramics = {design.ceramic};
  box.thyristors = {design.thyristor};
  box.gate_resistors = {design.gate_resistor};
  return box;
}

}  // namespace dropfront::scoring::test
