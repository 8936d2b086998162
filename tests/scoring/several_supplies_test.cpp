// One design on three supplies of the world: each check is as bad as its worst supply, and says which.
#include <algorithm>

#include "dropfront/scoring/check_table.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/score.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// Japan's 100 V at 50 Hz, 120 V at 60 Hz, Europe's 230 V at 50 Hz, each with its usual band.
std::vector<Supply> world() {
  return {{"japan", {95, 100, 107}, {49.8, 50, 50.2}, {}, false, false},
          {"america", {110, 120, 127}, {59.9, 60, 60.1}, {}, false, false},
          {"europe", {207, 230, 253}, {49.5, 50, 50.5}, {}, false, false}};
}

test::Example worldwide() {
  test::Example example("bridge-clamp-across");
  example.linear(5, 0.04, 1.7, 1e-3);
  example.stage.thermal_resistance_K_per_W = 100;
  example.stage.max_junction_degC = 150;
  example.requirement.limits.standby_power_W = 1;
  example.requirement.limits.discharge = DischargeRule{};
  example.requirement.supplies = world();
  return example;
}

std::vector<Score> alone(const test::Example& example) {
  std::vector<Score> scores;
  for (const auto& supply : example.requirement.supplies) {
    auto need = example.requirement;
    need.supplies = {supply};
    scores.push_back(score(example.design(), need, Depth::full));
  }
  return scores;
}

const Check* find(const Score& score, std::string_view id) {
  const auto it =
      std::find_if(score.checks.begin(), score.checks.end(), [&](const auto& c) { return c.id == id; });
  return it == score.checks.end() ? nullptr : &*it;
}

}  // namespace

TEST_CASE("Over several supplies every check repeats its worst single supply to the bit, by name") {
  const auto example = worldwide();
  const auto all = score(example.design(), example.requirement, Depth::full);
  const auto singles = alone(example);
  for (const auto& check : all.checks) {
    INFO(check.id << " on " << check.at.supply);
    const auto supply = std::find_if(example.requirement.supplies.begin(), example.requirement.supplies.end(),
                                     [&](const auto& s) { return s.name == check.at.supply; });
    REQUIRE(supply != example.requirement.supplies.end());
    const auto& own = singles[static_cast<std::size_t>(supply - example.requirement.supplies.begin())];
    const Check* same = find(own, check.id);
    REQUIRE(same != nullptr);
    CHECK(same->value == check.value);
    CHECK(same->limit == check.limit);
    for (const auto& single : singles) {
      const Check* other = find(single, check.id);
      if (other == nullptr || !other->headroom() || !check.headroom()) continue;
      CHECK((check.pass != other->pass || *check.headroom() <= *other->headroom()));
    }
  }
}

TEST_CASE("Standby is the greatest and the margin the least of all supplies, each named") {
  const auto example = worldwide();
  const auto all = score(example.design(), example.requirement, Depth::full);
  const auto singles = alone(example);
  double standby_W = 0, margin_A = 1;
  for (const auto& single : singles) {
    standby_W = std::max(standby_W, *single.objectives.standby_loss_W);
    margin_A = std::min(margin_A, *single.objectives.current_margin_A);
  }
  CHECK(all.objectives.standby_loss_W == standby_W);
  CHECK(all.objectives.current_margin_A == margin_A);
  // The discharge chain and the clamp take most at the high line; the dropper passes f·C·V least on 100 V.
  CHECK(all.standby_supply == "europe");
  CHECK(all.margin_supply == "japan");
  CHECK(find(all, "standby.power")->at.supply == "europe");
  CHECK(find(all, "supply.margin")->at.supply == "japan");
  CHECK(find(all, "discharge.voltage")->at.supply == "europe");
}

TEST_CASE("Each supply keeps its own operating points, at its own line") {
  const auto example = worldwide();
  const auto all = score(example.design(), example.requirement, Depth::full);
  const auto singles = alone(example);
  REQUIRE(all.operations.size() == 3);
  for (std::size_t i = 0; i < 3; ++i) {
    CHECK(all.operations[i].supply == example.requirement.supplies[i].name);
    const auto& rows = all.operations[i].operations;
    const auto& own = singles[i].operations.front().operations;
    REQUIRE(rows.size() == own.size());
    for (std::size_t k = 0; k < rows.size(); ++k) {
      CHECK(rows[k].corner == own[k].corner);
      CHECK(rows[k].state.input_power_W == own[k].state.input_power_W);
      CHECK(rows[k].state.rail_min_V == own[k].state.rail_min_V);
    }
  }
}

TEST_CASE("One supply without a steady answer leaves the verdict open, whatever the others say") {
  auto example = worldwide();
  example.requirement.supplies[0].voltage_Vrms = {1, 1, 1};  // nothing reaches the rail
  const auto all = score(example.design(), example.requirement, Depth::full);
  CHECK(all.verdict != Verdict::compliant);
}
