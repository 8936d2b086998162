// Dropping parts that others replace loses nothing: a box enumerated in full and its reduced form have the
// same best designs.
#include "dropfront/scoring/bounds/replaces.hpp"

#include <array>
#include <cmath>

#include "dropfront/scoring/bounds/box_bounder.hpp"
#include "dropfront/scoring/score.hpp"
#include "dropfront/values/random.hpp"
#include "scoring/bounds/support/box_sample.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// A design that keeps its limits, to vary parts of.
test::Example sound(const char* wiring) {
  test::Example example(wiring);
  example.linear(5, 0.04, 1.7, 1e-3);
  example.stage.input_max_V = 60;
  example.stage.thermal_resistance_K_per_W = 100;
  example.stage.max_junction_degC = 150;
  example.reservoir.surge_voltage_V = 60;
  example.reservoir.rated_voltage_V = 35;
  example.clamp.pulse_power_W = 60;
  return example;
}

/// Variants of the example's parts: ratings, prices, sizes and now and then values changed.
struct Variants {
  std::array<parts::Resistor, 3> series_resistors;
  std::array<parts::Clamp, 2> clamps;
  std::array<parts::Reservoir, 3> reservoirs;
  std::array<parts::Rectifier, 3> rectifiers;
  std::array<parts::Resistor, 2> elements;
};

template <class Value>
Value one_of(std::initializer_list<Value> values, values::RandomStream& random) {
  return *(values.begin() + random.below(values.size()));
}

void vary_body(parts::PartInfo& info, values::RandomStream& random) {
  info.price_breaks[0].price_micro += one_of<std::int64_t>({0, 0, 1000, 5000}, random);
  *info.length_um += one_of<std::int64_t>({0, 0, 500}, random);
}

Variants vary(const test::Example& example, values::RandomStream& random) {
  Variants v;
  v.series_resistors.fill(example.series_resistor);
  v.clamps.fill(example.clamp);
  v.reservoirs.fill(example.reservoir);
  v.rectifiers.fill(example.rectifier);
  v.elements.fill(example.discharge);
  for (auto& part : v.series_resistors) {
    vary_body(part.info, random);
    part.rated_power_W = one_of({0.25, 1.0, 2.0}, random);
    part.overload_voltage_V = one_of({600.0, 1000.0, 1500.0}, random);
    part.pulse_energy_J = one_of({0.1, 1.0, 2.0}, random);
  }
  for (auto& part : v.clamps) {
    vary_body(part.info, random);
    part.rated_power_W = one_of({0.1, 1.0, 3.0}, random);
  }
  for (auto& part : v.reservoirs) {
    vary_body(part.info, random);
    part.rated_voltage_V = one_of({16.0, 25.0, 35.0}, random);
    part.ripple_current_Arms = one_of({0.01, 0.3, 0.4}, random);
    if (random.below(4) == 0) part.capacitance_F *= 1.5;
  }
  for (auto& part : v.rectifiers) {
    vary_body(part.info, random);
    part.reverse_voltage_V = one_of({400.0, 800.0, 1000.0}, random);
    part.surge_current_A = one_of({5.0, 30.0, 50.0}, random);
  }
  for (auto& part : v.elements) {
    vary_body(part.info, random);
    part.rated_voltage_Vrms = one_of({100.0, 200.0, 300.0}, random);
  }
  return v;
}

DesignBox box_of(const test::Example& example, const Variants& v) {
  DesignBox box = test::box_of(example.design());
  const auto all = [](const auto& from, auto& list) {
    list.clear();
    for (const auto& part : from) list.push_back(&part);
  };
  all(v.series_resistors, box.series_resistors);
  all(v.clamps, box.clamps);
  all(v.reservoirs, box.reservoirs);
  all(v.rectifiers, box.rectifiers);
  box.discharges = {{&v.elements[0], 2}, {&v.elements[1], 2}};
  return box;
}

struct Scored {
  Design design;
  std::array<double, 4> objectives;  ///< less is better
};

std::vector<Scored> compliant_of(const DesignBox& box, const Requirement& requirement) {
  const Scorer scorer(requirement);
  std::vector<Scored> found;
  for (const auto& design : test::members_of(box)) {
    const auto score = scorer.score(design, Depth::compliant);
    if (score.verdict != Verdict::compliant) continue;
    found.push_back(
        {design,
         {static_cast<double>(*score.objectives.cost_micro), *score.objectives.standby_loss_W,
          static_cast<double>(*score.objectives.board_area_um2), -*score.objectives.current_margin_A}});
  }
  return found;
}

bool dominates(const Scored& a, const Scored& b) {
  bool less = false;
  for (std::size_t k = 0; k < 4; ++k) {
    if (a.objectives[k] > b.objectives[k]) return false;
    less = less || a.objectives[k] < b.objectives[k];
  }
  return less;
}

/// The front, of equal objectives the first member only.
std::vector<Scored> front_of(const std::vector<Scored>& all) {
  std::vector<Scored> front;
  for (const auto& one : all) {
    bool beaten = false;
    for (const auto& other : all) beaten = beaten || dominates(other, one);
    for (const auto& kept : front) beaten = beaten || kept.objectives == one.objectives;
    if (!beaten) front.push_back(one);
  }
  return front;
}

bool same(const Design& a, const Design& b) {
  return a.series_resistor == b.series_resistor && a.clamp == b.clamp && a.reservoir == b.reservoir &&
         a.rectifier == b.rectifier && a.discharge == b.discharge;
}

}  // namespace

TEST_CASE("A reduced box has the same front, design for design, as the box enumerated in full") {
  double dropped = 0;
  std::size_t members = 0;
  const values::RandomStream all(31);
  for (int round = 0; round < 8; ++round) {
    auto random = all.split(static_cast<std::uint64_t>(round));
    const auto example = sound(round % 2 == 0 ? "half-wave-clamp-across" : "bridge-clamp-across");
    const auto variants = vary(example, random);
    const auto box = box_of(example, variants);
    auto reduced = box;
    dropped += BoxBounder(example.requirement).reduce(reduced);
    const auto whole = front_of(compliant_of(box, example.requirement));
    const auto rest = front_of(compliant_of(reduced, example.requirement));
    INFO("round " << round);
    REQUIRE(rest.size() == whole.size());
    for (std::size_t i = 0; i < whole.size(); ++i) {
      REQUIRE(rest[i].objectives == whole[i].objectives);
      REQUIRE(same(rest[i].design, whole[i].design));
    }
    members += whole.size();
  }
  REQUIRE(members > 0);
  REQUIRE(dropped > 100);
}
