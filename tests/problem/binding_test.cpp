#include "dropfront/problem/binding.hpp"

#include <cmath>

#include "dropfront/scoring/check_table.hpp"
#include "dropfront/scoring/score.hpp"
#include "problem/fixture.hpp"
#include "support/catch.hpp"

using namespace dropfront::problem::testing;
using namespace dropfront;

namespace {

problem::Problem small(const Bench& bench) {
  return bench.problem({R"(slots={"arrangement": ["half-wave-clamp-ahead", "bridge-clamp-across"],
      "discharge": {"count": [2, 3], "where": {"resistance": {"min": "100k"}}}, "output_stage": {"only": "lin-5"}})"});
}

search::Choice first(const search::Space& space) { return search::Choice(space.slots.size(), 0); }

int slot_named(const search::Space& space, const std::string& name) {
  for (std::size_t i = 0; i < space.slots.size(); ++i) {
    if (space.slots[i].name == name) return static_cast<int>(i);
  }
  return -1;
}

}  // namespace

TEST_CASE("slots stand in their documented order with logarithmic coordinates") {
  const Bench bench;
  const auto p = small(bench);
  const auto bound = problem::bind(p);
  const search::Space& space = bound->space();
  std::vector<std::string> names;
  for (const auto& slot : space.slots) names.push_back(slot.name);
  CHECK(names == std::vector<std::string>{"arrangement", "output_stage", "dropper", "series_resistor",
                                          "clamp", "reservoir", "discharge", "rectifier"});
  CHECK(space.size() == 2.0 * 1 * 4 * 4 * 3 * 4 * 4 * 1);
  CHECK(space.slots[0].category);
  CHECK(space.slots[0].coordinate.empty());
  CHECK(space.slots[7].coordinate.empty());  // one rectifier: nothing to choose
  CHECK(space.slots[2].coordinate[3] == std::log(1e-6));
  // Two of 220k in series.
  CHECK_THAT(space.slots[6].coordinate[0], Catch::Matchers::WithinRel(std::log(440e3), 1e-12));
  const std::vector<std::pair<int, int>> coupled{{2, 3}, {4, 5}, {4, 1}, {2, 6}};
  CHECK(space.coupled == coupled);
}

TEST_CASE("a choice is a design of the parts it points at") {
  const Bench bench;
  const auto p = small(bench);
  const auto bound = problem::bind(p);
  const auto d = bound->design({1, 0, 3, 2, 1, 2, 3, 0});
  CHECK(d.arrangement->name == "bridge-clamp-across");
  CHECK(d.dropper->info.name == "film-1u");
  CHECK(d.series_resistor->info.name == "fuse-220R");
  CHECK(d.clamp->info.name == "z12");
  CHECK(d.reservoir->info.name == "e220u-35");
  CHECK(d.discharge->info.name == "chip-470k");
  CHECK(d.discharge_count == 3);
  CHECK(d.rectifier->info.name == "d1000");
}

TEST_CASE("evaluation says what the score says, in the problem's order and minimised") {
  const Bench bench;
  const auto p = small(bench);
  const auto bound = problem::bind(p);
  const search::Choice choice{0, 0, 3, 1, 1, 2, 3, 0};
  const auto score = scoring::score(bound->design(choice), p.requirement, scoring::Depth::full);
  const auto evaluation = bound->evaluate(choice, {});
  REQUIRE(evaluation.objectives.size() == 4);
  REQUIRE(score.objectives.cost_micro);
  REQUIRE(score.objectives.board_area_um2);
  REQUIRE(score.objectives.standby_loss_W);
  REQUIRE(score.objectives.current_margin_A);
  CHECK(evaluation.objectives[0] == static_cast<double>(*score.objectives.cost_micro) / 1e6);
  CHECK(evaluation.objectives[1] == *score.objectives.standby_loss_W);
  CHECK(evaluation.objectives[2] == static_cast<double>(*score.objectives.board_area_um2) / 1e6);
  CHECK(evaluation.objectives[3] == -*score.objectives.current_margin_A);
  CHECK(evaluation.complete == score.complete);
  std::size_t failed = 0;
  for (const auto& check : score.checks) {
    if (check.pass.value_or(true)) continue;
    REQUIRE(failed < evaluation.broken.size());
    CHECK(bound->check_names().at(evaluation.broken[failed]) == check.id);
    CHECK(evaluation.shortfall[failed] >= 0);
    ++failed;
  }
  CHECK(failed == evaluation.broken.size());
  CHECK((evaluation.outcome == search::Outcome::compliant) == (score.verdict == scoring::Verdict::compliant));
}

TEST_CASE("a look gives cost and area of the full score and leaves the solved objectives open") {
  const Bench bench;
  const auto p = small(bench);
  const auto bound = problem::bind(p);
  const search::Choice choice{1, 0, 1, 1, 1, 2, 2, 0};
  const auto look = bound->look(choice);
  const auto full = bound->evaluate(choice, {});
  CHECK(look.objectives[0] == full.objectives[0]);
  CHECK(look.objectives[2] == full.objectives[2]);
  CHECK(std::isnan(look.objectives[1]));
  CHECK(std::isnan(look.objectives[3]));
}

TEST_CASE("a dominated design is left early and says so") {
  const Bench bench;
  const auto p = small(bench);
  const auto bound = problem::bind(p);
  int asked = 0;
  const auto evaluation = bound->evaluate(first(bound->space()), [&](const std::vector<double>& known) {
    ++asked;
    CHECK(known.size() == 4);
    return true;
  });
  CHECK_FALSE(evaluation.complete);
  CHECK(asked <= 1);
}

TEST_CASE("a relaxed design at the place of an option has that option's value and finite figures") {
  const Bench bench;
  // One part a slot but the dropper: at the ends of its axis the relaxed design is the real one.
  const auto p =
      bench.problem({R"(slots={"arrangement": "half-wave-clamp-ahead", "output_stage": {"only": "lin-5"},
      "dropper": {"only": ["film-220n", "film-1u"]}, "series_resistor": {"only": "fuse-100R"},
      "clamp": {"only": "z12"}, "reservoir": {"only": "e220u-35"}, "discharge": {"only": "chip-470k", "count": 2}})"});
  const auto bound = problem::bind(p);
  for (const int option : {0, 1}) {
    search::Choice choice = first(bound->space());
    choice[slot_named(bound->space(), "dropper")] = option;
    const auto real = bound->evaluate(choice, {});
    const auto relaxed = bound->relaxed(first(bound->space()), {static_cast<double>(option)});
    // exp(log(C)) may miss C by a few roundings; the engine carries that on about linearly.
    CHECK_THAT(relaxed.objectives[0], Catch::Matchers::WithinRel(real.objectives[0], 1e-9));
    CHECK_THAT(relaxed.objectives[1], Catch::Matchers::WithinRel(real.objectives[1], 1e-6));
    CHECK_THAT(relaxed.objectives[2], Catch::Matchers::WithinRel(real.objectives[2], 1e-9));
    CHECK_THAT(relaxed.objectives[3], Catch::Matchers::WithinRel(real.objectives[3], 1e-5));
  }
  // In between cost and standby lie in between: more capacitance draws more and costs more.
  const auto low = bound->relaxed(first(bound->space()), {0.0});
  const auto middle = bound->relaxed(first(bound->space()), {0.5});
  const auto high = bound->relaxed(first(bound->space()), {1.0});
  CHECK(low.objectives[0] < middle.objectives[0]);
  CHECK(middle.objectives[0] < high.objectives[0]);
  CHECK(low.objectives[3] > middle.objectives[3]);
  CHECK(middle.objectives[3] > high.objectives[3]);
}

TEST_CASE("relaxed designs are finite all over the cube, corners and outside included") {
  const Bench bench;
  const auto p = bench.problem({R"(slots={"discharge": {"optional": true}})"});
  const auto bound = problem::bind(p);
  search::Choice categories = first(bound->space());
  for (const double x : {0.0, 0.37, 0.5, 0.93, 1.0, -1.0, 2.0, std::nan("")}) {
    for (int arrangement = 0; arrangement < bound->space().slots[0].size; ++arrangement) {
      categories[0] = arrangement;
      const auto evaluation = bound->relaxed(categories, {x, 1 - x, x, 1 - x, x});
      CHECK(std::isfinite(evaluation.violation));
      CHECK(evaluation.violation >= 0);
      for (const double value : evaluation.objectives) CHECK(std::isfinite(value));
    }
  }
}

TEST_CASE("an optional varistor and fuse may stay away, and cost what they cost where they do not") {
  const Bench bench;
  bench.write("lists/varistors.csv",
              "part,continuous_voltage,clamp_voltage,clamp_current,price_1,length_mm,width_mm\n"
              "mov-275,275 V,710 V,50 A,0.07,15.5,5.2\n");
  bench.write("lists/fuses.csv",
              "part,rated_current,melting_i2t,price_1,length_mm,width_mm\nfuse-1A,1 A,12,0.08,8.4,4\n");
  const auto p =
      bench.problem({R"(slots={"arrangement": "half-wave-clamp-ahead", "output_stage": {"only": "lin-5"},
      "varistor": {"optional": true}, "fuse": {"optional": true}})"});
  const auto bound = problem::bind(p);
  const int varistor = slot_named(bound->space(), "varistor"), fuse = slot_named(bound->space(), "fuse");
  REQUIRE(varistor >= 0);
  REQUIRE(fuse >= 0);
  CHECK(bound->space().slots[varistor].size == 2);
  CHECK(bound->space().slots[fuse].size == 2);
  const auto cost = [&](int with_varistor, int with_fuse) {
    search::Choice choice = first(bound->space());
    choice[varistor] = with_varistor;
    choice[fuse] = with_fuse;
    return bound->look(choice).objectives[0];
  };
  // Sums of millionths: exact but for the last division.
  CHECK_THAT(cost(1, 0) - cost(0, 0), Catch::Matchers::WithinAbs(0.07, 1e-9));
  CHECK_THAT(cost(1, 1) - cost(0, 0), Catch::Matchers::WithinAbs(0.15, 1e-9));
}

TEST_CASE("the check names are the check table's") {
  const Bench bench;
  const auto p = small(bench);
  const auto names = problem::bind(p)->check_names();
  REQUIRE(names.size() == scoring::check_table().size());
  for (std::size_t i = 0; i < names.size(); ++i) CHECK(names[i] == scoring::check_table()[i].id);
}
