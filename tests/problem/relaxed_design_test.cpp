#include "dropfront/problem/relaxed_design.hpp"

#include <cmath>

#include "problem/fixture.hpp"
#include "support/catch.hpp"

using namespace dropfront::problem::testing;
using namespace dropfront;
using Catch::Matchers::WithinRel;

namespace {
// exp and log each round once or twice.
constexpr double kRounding = 1e-12;
}  // namespace

TEST_CASE("a ladder lays any value between the two nearest rungs, log-log") {
  const Bench bench;
  const auto p = bench.problem();
  const problem::Ladder<parts::Dropper> ladder(p.offers.droppers, &parts::Dropper::capacitance_F, 1000);
  const auto any = [](const parts::Dropper&) { return true; };
  const auto none = [](const parts::Dropper&) { return 0.0; };
  CHECK(ladder.least() == 220e-9);
  CHECK(ladder.greatest() == 1e-6);
  CHECK_THAT(ladder.at(0.5, any, none).capacitance_F, WithinRel(std::sqrt(220e-9 * 1e-6), kRounding));
  CHECK_THAT(ladder.at(1.0, any, none).capacitance_F, WithinRel(1e-6, kRounding));
  // The cheapest at 470 nF for 1000 a year is the ordinary one; asked for a series-rated one, the other.
  const double at_470n = std::log(470.0 / 220) / std::log(1000.0 / 220);
  CHECK_THAT(ladder.at(at_470n, any, none).rated_voltage_Vrms, WithinRel(310.0, 1e-9));
  const auto rated = [](const parts::Dropper& part) { return part.series_rated; };
  CHECK_THAT(ladder.at(at_470n, rated, none).rated_voltage_Vrms, WithinRel(275.0, 1e-9));
}

TEST_CASE("a relaxed design takes parts that hold, and says so with its closed forms") {
  const Bench bench;
  const auto p =
      bench.problem({R"(slots={"arrangement": "half-wave-clamp-ahead", "output_stage": {"only": "lin-5"},
      "clamp": {"only": "z24"}})"});
  const auto slots = problem::make_space(p.offers);
  const problem::RelaxedDesigns designs(p, slots);
  problem::RelaxedParts made;
  const search::Choice categories(slots.ids.size(), 0);
  // Axes: dropper, series resistor, reservoir, discharge. 220 uF comes in 16 V and 35 V; a 24 V clamp with
  // its tolerance needs the 35 V one at 80 % derating.
  const double at_220u = std::log(220.0 / 100) / std::log(470.0 / 100);
  const auto d = designs.make(categories, {0, 0, at_220u, 0.5}, made);
  CHECK(d.clamp->voltage_V == 24);
  CHECK_THAT(d.reservoir->capacitance_F, WithinRel(220e-6, kRounding));
  CHECK_THAT(d.reservoir->rated_voltage_V, WithinRel(35.0, 1e-9));
  // Half way between the least and the greatest chain, each element within its 200 V at 253 V.
  REQUIRE(d.discharge);
  const double total = d.discharge->resistance_ohm * d.discharge_count;
  CHECK_THAT(total, WithinRel(std::sqrt(1e3 * 3 * 470e3), kRounding));
  CHECK(d.discharge->rated_voltage_Vrms.value() * d.discharge_count >= 253);
}

TEST_CASE("an optional chain is left out beyond half a step above the greatest") {
  const Bench bench;
  const auto p =
      bench.problem({R"(slots={"discharge": {"only": "chip-470k", "count": [1, 2], "optional": true}})"});
  const auto slots = problem::make_space(p.offers);
  const problem::RelaxedDesigns designs(p, slots);
  problem::RelaxedParts made;
  const search::Choice categories(slots.ids.size(), 0);
  const auto count = [&](double x) {
    return designs.make(categories, {0, 0, 0, 0, x}, made).discharge_count;
  };
  CHECK(count(0) > 0);
  CHECK(count(1) == 0);
  // The axis runs from ln(R) over ln(2R) to ln(2R) + 1.
  const double greatest = std::log(2) / (std::log(2) + 1);
  CHECK(count(greatest) == 2);
  CHECK(count(greatest + 0.4 / (std::log(2) + 1)) == 2);
  CHECK(count(greatest + 0.6 / (std::log(2) + 1)) == 0);
}
