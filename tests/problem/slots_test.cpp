#include <algorithm>

#include "dropfront/problem/slot_space.hpp"
#include "dropfront/problem/support.hpp"
#include "problem/fixture.hpp"
#include "support/catch.hpp"

using namespace dropfront::problem::testing;
using namespace dropfront;
using Names = std::vector<std::string>;

namespace {

/// Offers of the bench problem with these slots.
problem::Problem slots(const Bench& bench, const std::string& json) {
  return bench.problem({"slots=" + json});
}

}  // namespace

TEST_CASE("without slots every usable row is offered, in the order of the lists") {
  const Bench bench;
  const problem::Problem p = bench.problem();
  CHECK(names_of(p.offers.droppers) == Names{"film-220n", "film-470n", "film-470n-b", "film-1u"});
  CHECK(names_of(p.offers.series_resistors) == Names{"fuse-47R", "fuse-100R", "fuse-220R", "any-1k"});
  // Shunts are offered where the problem names a thyristor.
  for (const circuit::Arrangement* arrangement : p.offers.arrangements)
    CHECK_FALSE(arrangement->thyristor_shunt);
  CHECK(p.offers.arrangements.size() == 4);
  REQUIRE(p.offers.discharges.size() ==
          9);  // chip-220k, chip-470k, any-1k, each one, two and three in series
  CHECK(p.offers.discharges[1].element->info.name == "chip-220k");
  CHECK(p.offers.discharges[1].count == 2);
  CHECK(p.offers.varistors.empty());
  CHECK(p.offers.fuses.empty());
  CHECK(p.offers.ceramics.empty());
}

TEST_CASE("a stage is offered when its whole band lies inside the wanted band") {
  const Bench bench;
  // 5 V +/- 2 % and +/- 5 % lie inside 5 V +/- 5 %, 5 V +/- 6 % does not.
  CHECK(names_of(bench.problem().offers.output_stages) == Names{"lin-5", "zener-only-5"});
  CHECK(names_of(bench.problem({"output.tolerance=2 %"}).offers.output_stages) == Names{"lin-5"});
  CHECK(names_of(bench.problem({"output.tolerance=6 %"}).offers.output_stages) ==
        Names{"lin-5", "lin-5-coarse", "zener-only-5"});
}

TEST_CASE("where takes equality and ranges on any column, ends included") {
  const Bench bench;
  CHECK(names_of(slots(bench, R"({"dropper": {"where": {"series_rated": true}}})").offers.droppers) ==
        Names{"film-220n", "film-470n", "film-1u"});
  CHECK(names_of(slots(bench, R"({"dropper": {"where": {"capacitance": "0.47 uF"}}})").offers.droppers) ==
        Names{"film-470n", "film-470n-b"});
  CHECK(
      names_of(
          slots(
              bench,
              R"({"dropper": {"where": {"capacitance": {"min": "470n", "max": "1u"}, "tolerance": "10 %"}}})")
              .offers.droppers) == Names{"film-470n", "film-1u"});
  CHECK(names_of(slots(bench, R"({"dropper": {"where": {"price_1000": {"max": 0.2}}}})").offers.droppers) ==
        Names{"film-220n", "film-470n-b"});
  CHECK(names_of(slots(bench, R"({"dropper": {"where": {"length_mm": {"min": 20}}}})").offers.droppers) ==
        Names{"film-1u"});
  CHECK(names_of(slots(bench, R"({"series_resistor": {"where": {"construction": "film"}}})")
                     .offers.series_resistors) == Names{"any-1k"});
  CHECK(names_of(slots(bench, R"({"output_stage": {"where": {"kind": "direct"}}})").offers.output_stages) ==
        Names{"zener-only-5"});
}

TEST_CASE("a column that is not given meets no condition") {
  const Bench bench;
  // No row states an impulse voltage, so even a floor of nearly nothing leaves none.
  CHECK(bench.refusal(kProblem, {R"(slots={"dropper": {"where": {"impulse": {"min": "1 mV"}}}})"})
            .find("no part of this slot meets these conditions") != std::string::npos);
}

TEST_CASE("only takes names and inline objects, except takes rows away") {
  const Bench bench;
  const auto p =
      slots(bench, R"({"clamp": {"only": ["z24", {"part": "mine", "voltage": "9.1 V", "tolerance": "5 %",
      "test_current": "28 mA", "slope_resistance": "5 R", "price": 0.07, "length_mm": 4, "width_mm": 2}, "z12"]}})");
  CHECK(names_of(p.offers.clamps) == Names{"z12", "z24", "mine"});  // rows as read, then inline ones
  CHECK(p.offers.clamps[2]->voltage_V == 9.1);
  CHECK(parts::price_micro_at(p.offers.clamps[2]->info, 5).value() == 70000);
  CHECK(p.offers.clamps[2]->info.length_um.value() == 4000);
  CHECK(names_of(slots(bench, R"({"clamp": {"except": "z12"}})").offers.clamps) == Names{"z6v8", "z24"});
  CHECK(names_of(slots(bench, R"({"clamp": {"only": "z12"}})").offers.clamps) == Names{"z12"});
}

TEST_CASE("inline parts without a name get one each") {
  const Bench bench;
  const auto p =
      slots(bench, R"({"reservoir": {"only": [{"capacitance": 1e-4, "tolerance": 0.2, "rated_voltage": 35},
                                                         {"capacitance": 2e-4, "tolerance": 0.2, "rated_voltage": 35}]}})");
  const Names names = names_of(p.offers.reservoirs);
  REQUIRE(names.size() == 2);
  CHECK_FALSE(names[0].empty());
  CHECK(names[0] != names[1]);
}

TEST_CASE("a family has every value of the series in the range, copied from one row") {
  const Bench bench;
  const auto p = slots(
      bench, R"({"series_resistor": {"series": "E12", "from": "47R", "to": "120R", "like": "fuse-100R"}})");
  const auto& family = p.offers.series_resistors;
  std::vector<double> values;
  for (const auto* part : family) values.push_back(part->resistance_ohm);
  CHECK(values == std::vector<double>{47, 56, 68, 82, 100, 120});  // IEC 60063, E12
  CHECK(family[0]->rated_power_W.value() == 2);
  CHECK(family[0]->info.name.rfind("fuse-100R ", 0) == 0);
}

TEST_CASE("a family and named rows may stand side by side") {
  const Bench bench;
  const auto p = slots(
      bench, R"({"clamp": {"series": "E24", "from": 10, "to": 11, "like": ["z6v8", "z12"], "only": "z24"}})");
  const Names names = names_of(p.offers.clamps);
  REQUIRE(names.size() == 3);
  CHECK(names[0] == "z24");
  CHECK(p.offers.clamps[1]->voltage_V == 10);
  CHECK(p.offers.clamps[2]->voltage_V == 11);
}

TEST_CASE("an optional slot offers to stay empty, and its count is the user's") {
  const Bench bench;
  const auto p = slots(bench, R"({"discharge": {"only": "chip-470k", "count": [2, 3], "optional": true}})");
  REQUIRE(p.offers.discharges.size() == 3);
  CHECK(p.offers.discharges[0].element == nullptr);
  CHECK(p.offers.discharges[1].count == 2);
  CHECK(p.offers.discharges[2].count == 3);
}

TEST_CASE("protective parts come in only where asked for, with a caution while no check looks at them") {
  const Bench bench;
  bench.write("lists/varistors.csv",
              "part,continuous_voltage,clamp_voltage,clamp_current,energy,surge_current\n"
              "mov-275,275 V,710 V,50 A,40 J,2500 A\n");
  CHECK(bench.problem().offers.varistors.empty());
  const auto p = slots(bench, R"({"varistor": {"optional": true, "place": "after"}})");
  CHECK(names_of(p.offers.varistors) == Names{"none", "mov-275"});
  CHECK_FALSE(p.offers.varistor_before_resistor);
  const bool cautioned = std::any_of(p.cautions.begin(), p.cautions.end(), [](const std::string& text) {
    return text.rfind("slots.varistor", 0) == 0;
  });
  CHECK(cautioned == !problem::checks("varistor."));
}

TEST_CASE("varistors for another mains are left out and said so, the others carry their place into designs") {
  const Bench bench;
  bench.write("lists/varistors.csv",
              "part,continuous_voltage,clamp_voltage,clamp_current\n"
              "mov-130,130 V,340 V,50 A\n"
              "mov-275,275 V,710 V,50 A\n");
  const auto p = slots(bench, R"({"varistor": {"place": "after"}})");
  CHECK(names_of(p.offers.varistors) == Names{"mov-275"});
  CHECK(std::any_of(p.cautions.begin(), p.cautions.end(), [](const std::string& text) {
    return text.find("mov-130 clamp below the crest of the highest line") != std::string::npos;
  }));
  const auto space = problem::make_space(p.offers);
  CHECK_FALSE(problem::design_of(p.offers, space.ids, search::Choice(space.ids.size(), 0)).varistor_before);
}

TEST_CASE("arrangements are offered in their own order, one name or several") {
  const Bench bench;
  const auto p = slots(bench, R"({"arrangement": ["bridge-clamp-across", "half-wave-clamp-ahead"]})");
  REQUIRE(p.offers.arrangements.size() == 2);
  CHECK(p.offers.arrangements[0]->name == "half-wave-clamp-ahead");
  CHECK(slots(bench, R"({"arrangement": "bridge-clamp-across"})").offers.arrangements.size() == 1);
}

TEST_CASE("split and parallel put every design's series resistor and dropper there twice") {
  const Bench bench;
  const auto p = slots(bench, R"({"series_resistor": {"split": 2}, "dropper": {"parallel": 2}})");
  CHECK(p.offers.series_resistor_split == 2);
  CHECK(p.offers.dropper_parallel == 2);
  const auto space = problem::make_space(p.offers);
  const auto d = problem::design_of(p.offers, space.ids, search::Choice(space.ids.size(), 0));
  CHECK(d.series_resistor_count == 2);
  CHECK(d.dropper_count == 2);
  const auto plain = slots(bench, "{}");
  CHECK(plain.offers.series_resistor_split == 1);
  CHECK(plain.offers.dropper_parallel == 1);
}
