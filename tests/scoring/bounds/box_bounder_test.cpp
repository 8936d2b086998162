#include "dropfront/scoring/bounds/box_bounder.hpp"

#include <algorithm>
#include <set>

#include "dropfront/scoring/board_area.hpp"
#include "dropfront/scoring/bounds/bound_table.hpp"
#include "dropfront/scoring/check_table.hpp"
#include "dropfront/scoring/cost.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "scoring/bounds/support/box_sample.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::scoring;

namespace {

BoxBound bound_of(const test::Example& example, int depth = 0) {
  return BoxBounder(example.requirement).bound(test::box_of(example.design()), depth);
}

/// Whether a member breaks a check on some supply; unsolved, it is never compliant either.
bool breaks(const Design& member, const Requirement& requirement, std::string_view id) {
  const auto& table = check_table();
  const auto rule = std::find_if(table.begin(), table.end(), [id](const auto& r) { return r.id == id; });
  if (rule == table.end()) return false;
  for (const auto& supply : requirement.supplies) {
    Evidence evidence(member, requirement, supply);
    const auto check = rule->evaluate(evidence);
    if (check && (check->unsolved || check->pass == std::optional(false))) return true;
  }
  return false;
}

}  // namespace

TEST_CASE("Cost and area of a box are the sums of its cheapest and its smallest parts, to the unit") {
  values::RandomStream random(3);
  for (const auto& arrangement : circuit::arrangements()) {
    for (int i = 0; i < 20; ++i) {
      auto requirement = test::requirements()[0];
      requirement.limits = {};
      requirement.surroundings.max_height_mm.reset();
      requirement.surroundings.life_years = 0;
      const auto box = test::random_box(arrangement, requirement, 8, random);
      std::int64_t cheapest = INT64_MAX, smallest = INT64_MAX;
      for (const auto& member : test::members_of(box)) {
        cheapest = std::min(cheapest, cost_micro(member, requirement).value());
        smallest = std::min(smallest, board_area_um2(member, requirement).value());
      }
      const auto bound = BoxBounder(requirement).bound(box, 0);
      REQUIRE(bound.cost_micro == cheapest);
      REQUIRE(bound.board_area_um2 == smallest);
    }
  }
}

TEST_CASE("A check that a box is said to break is broken by every member") {
  values::RandomStream random(4);
  std::set<std::string_view> seen;
  int boxes = 0;
  for (int i = 0; i < 400; ++i) {
    const auto& arrangement = circuit::arrangements()[random.below(circuit::arrangements().size())];
    auto requirement = test::requirements()[static_cast<std::size_t>(i) % 4];
    if (i % 3 != 0) {  // so that the rarer limits are reached
      requirement.surroundings.max_height_mm.reset();
      requirement.surroundings.life_years = 1;
      requirement.limits.discharge.reset();
      requirement.limits.series_rated = false;
    }
    const auto box = test::random_box(arrangement, requirement, 3, random);
    const auto bound = BoxBounder(requirement).bound(box, 1);
    if (bound.broken.empty()) continue;
    ++boxes;
    seen.insert(bound.broken);
    for (const auto& member : test::members_of(box)) {
      INFO(bound.broken);
      REQUIRE(breaks(member, requirement, bound.broken));
    }
  }
  REQUIRE(boxes > 100);
  REQUIRE(seen.size() >= 8);
}

TEST_CASE("Every bound is named after a check of the table or an objective, once a class, depth and range") {
  std::set<std::string_view> ids{"cost", "board_area", "standby_loss", "current_margin"};
  for (const auto& rule : check_table()) ids.insert(rule.id);
  std::set<std::tuple<std::string_view, BoundClass, int, std::string_view>> seen;
  for (const auto& rule : bound_table()) {
    INFO(rule.id);
    REQUIRE(ids.count(rule.id) == 1);
    REQUIRE((rule.objective != nullptr) != (rule.limit != nullptr));
    REQUIRE(!rule.range.empty());
    REQUIRE(seen.insert({rule.id, rule.bound_class, rule.depth, rule.range}).second);
  }
}

TEST_CASE("Ratings, prices and sizes that are not given discard nothing") {
  test::Example example("half-wave-clamp-across");
  example.series_resistor.overload_voltage_V = 100;
  REQUIRE(bound_of(example).broken == "resistor.pulse_voltage");
  example.series_resistor.overload_voltage_V.reset();
  REQUIRE(bound_of(example).broken != "resistor.pulse_voltage");
  example = test::Example("half-wave-clamp-across");
  const auto priced = bound_of(example);
  example.dropper.info.price_breaks.clear();
  example.dropper.info.width_um.reset();
  const auto unpriced = bound_of(example);
  REQUIRE(*unpriced.cost_micro < *priced.cost_micro);
  REQUIRE(*unpriced.board_area_um2 < *priced.board_area_um2);
}

TEST_CASE(
    "A stage whose rail is not known, an unknown arrangement or a missing part show nothing by currents") {
  test::Example example;
  example.stage.kind = parts::StageKind::step_down;
  example.stage.efficiency = 0.8;
  const auto open = bound_of(example, 1);
  REQUIRE(!open.current_margin_A);
  REQUIRE(!open.standby_loss_W);
  REQUIRE(open.cost_micro);
  auto shunt = *example.arrangement;
  shunt.name = "half-wave-thyristor-shunt";
  example = test::Example();
  example.arrangement = &shunt;
  REQUIRE(!bound_of(example, 1).standby_loss_W);
  auto box = test::box_of(test::Example().design());
  box.droppers = {nullptr};
  REQUIRE(!BoxBounder(test::Example().requirement).bound(box, 1).current_margin_A);
  box.arrangement = nullptr;
  REQUIRE(!BoxBounder(test::Example().requirement).bound(box, 1).cost_micro);
}

TEST_CASE(
    "Any one supply's broken limit discards; margin is the least and standby the greatest over supplies") {
  test::Example example("half-wave-clamp-across");
  example.linear(5, 0.04, 1.7, 1e-3);
  example.stage.input_max_V = 60;
  example.reservoir.rated_voltage_V = 35;
  example.reservoir.surge_voltage_V = 60;
  example.requirement.output.loads.clear();
  example.requirement.output.start_load_A = 1e-3;
  const auto alone = bound_of(example);
  REQUIRE(alone.broken.empty());
  example.requirement.supplies.push_back({"low", {90, 100, 110}, {49.5, 50, 50.5}, {}, false, false});
  const auto both = bound_of(example);
  std::swap(example.requirement.supplies[0], example.requirement.supplies[1]);
  const auto swapped = bound_of(example);
  example.requirement.supplies.pop_back();
  const auto low = bound_of(example);
  INFO(both.broken << low.broken);
  REQUIRE(both.broken.empty());
  REQUIRE(low.broken.empty());
  REQUIRE(both.current_margin_A == swapped.current_margin_A);
  REQUIRE(both.standby_loss_W == swapped.standby_loss_W);
  REQUIRE(*low.current_margin_A < *alone.current_margin_A);
  REQUIRE(*both.standby_loss_W > *low.standby_loss_W);
  example.requirement.supplies.push_back({"high", {396, 440, 484}, {49.5, 50, 50.5}, {}, false, false});
  REQUIRE(!bound_of(example).broken.empty());
}

TEST_CASE("A deeper bound is never looser") {
  values::RandomStream random(8);
  int tightened = 0;
  for (int i = 0; i < 60; ++i) {
    const auto& arrangement = circuit::arrangements()[random.below(4)];  // those with bounds by the engine
    auto requirement = test::requirements()[static_cast<std::size_t>(i) % 4];
    requirement.limits = {};
    const auto box = test::random_box(arrangement, requirement, 4, random);
    const BoxBounder bounder(requirement);
    const auto shallow = bounder.bound(box, 0), deep = bounder.bound(box, 1);
    if (!shallow.standby_loss_W || !deep.standby_loss_W || !deep.current_margin_A) continue;
    REQUIRE(*deep.standby_loss_W >= *shallow.standby_loss_W);
    REQUIRE(*deep.current_margin_A <= *shallow.current_margin_A);
    if (*deep.standby_loss_W > *shallow.standby_loss_W) ++tightened;
  }
  REQUIRE(tightened > 0);
}
