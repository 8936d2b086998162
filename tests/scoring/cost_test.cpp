#include "dropfront/scoring/cost.hpp"

#include "dropfront/scoring/board_area.hpp"
#include "dropfront/scoring/part_counts.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using namespace dropfront::scoring;

TEST_CASE("Cost is the sum of count times price, with the arrangement's counts") {
  // Film 0.30, resistor 0.05, zener 0.04, can 0.06, two chips 0.004, diodes 0.02 each; direct places nothing.
  const std::int64_t fixed = 300'000 + 50'000 + 60'000 + 2 * 4'000;
  struct Case {
    const char* name;
    int clamps, rectifiers;
  };
  for (const auto& c : {Case{"half-wave-clamp-ahead", 1, 1}, Case{"half-wave-clamp-across", 1, 2},
                        Case{"bridge-clamp-across", 1, 4}, Case{"bridge-clamp-ahead", 2, 4}}) {
    test::Example example(c.name);
    const auto placed = 6 + c.clamps + c.rectifiers - 1;
    REQUIRE(*cost_micro(example.design(), example.requirement) ==
            fixed + c.clamps * 40'000 + c.rectifiers * 20'000);
    example.requirement.placement_cost_micro = 4'000;
    REQUIRE(*cost_micro(example.design(), example.requirement) ==
            fixed + c.clamps * 40'000 + c.rectifiers * 20'000 + placed * 4'000);
  }
}

TEST_CASE("Cost adds up: swapping one part changes the cost by the price difference, whatever the others") {
  test::Example example;
  const auto before = *cost_micro(example.design(), example.requirement);
  example.dropper.info.price_breaks = {{1, 123'456}};
  REQUIRE(*cost_micro(example.design(), example.requirement) - before == 123'456 - 300'000);
}

TEST_CASE("The price is that of the greatest break not above the volume") {
  test::Example example;
  example.dropper.info.price_breaks = {{1, 500'000}, {1000, 300'000}, {10'000, 200'000}};
  example.requirement.volume = 10'000;
  const auto at_ten_thousand = *cost_micro(example.design(), example.requirement);
  example.requirement.volume = 9'999;
  REQUIRE(*cost_micro(example.design(), example.requirement) - at_ten_thousand == 100'000);
}

TEST_CASE("A part without price or size leaves the sum unknown, unless it places nothing") {
  test::Example example;
  example.stage.info = {};  // direct: no price, no size, not placed
  REQUIRE(cost_micro(example.design(), example.requirement).has_value());
  REQUIRE(board_area_um2(example.design(), example.requirement).has_value());
  example.linear(5, 0.04, 1.7, 3e-3);
  example.stage.info.price_breaks.clear();
  REQUIRE_FALSE(cost_micro(example.design(), example.requirement).has_value());
  REQUIRE(board_area_um2(example.design(), example.requirement).has_value());
  example.reservoir.info.width_um.reset();
  REQUIRE_FALSE(board_area_um2(example.design(), example.requirement).has_value());
}

TEST_CASE("Board area by hand: mains-side parts keep half the creepage, the others 0.5 mm") {
  test::Example example;  // 253 V, degree 2, group IIIa: 3.2 mm, so 1.6 mm around
  REQUIRE(mains_margin_um(example.requirement) == 1'600);
  const double by_hand_mm2 = (26.5 + 3.2) * (8.5 + 3.2) + (12 + 3.2) * (5 + 3.2) +
                             2 * (3.1 + 3.2) * (1.55 + 3.2) + (5.2 + 1) * (2.7 + 1) + 9.0 * 9.0 +
                             (5.2 + 1) * (2.7 + 1);
  const double area = static_cast<double>(*board_area_um2(example.design(), example.requirement));
  REQUIRE_THAT(area * 1e-6, Catch::Matchers::WithinRel(by_hand_mm2, 1e-12));  // rounding of the hand sum
}

TEST_CASE("The highest line of all supplies sets the creepage; clean surroundings fall back on the margin") {
  test::Example example;
  example.supply().voltage_Vrms = {108, 120, 132};
  REQUIRE(mains_margin_um(example.requirement) == 800);
  example.requirement.supplies.push_back({"other", {207, 230, 253}, {50, 50, 50}, {}, false, false});
  REQUIRE(mains_margin_um(example.requirement) == 1'600);
  example.requirement.surroundings.pollution_degree = 1;
  REQUIRE(mains_margin_um(example.requirement) == kBoardMargin_um);
}

TEST_CASE("Optional parts are placed only when the design has them") {
  test::Example example;
  auto design = example.design();
  const auto before = placed_parts(design).size();
  dropfront::parts::Varistor varistor;
  design.varistor = &varistor;
  REQUIRE(placed_parts(design).size() == before + 1);
}
