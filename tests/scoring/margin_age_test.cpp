#include "dropfront/scoring/margin_age.hpp"

#include "dropfront/scoring/score.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using namespace dropfront::scoring;

namespace {

/// A regulated half-wave supply well out of its knee, 20 % of the dropper lost over a life of ten years.
test::Example ageing(double load_A) {
  test::Example example("half-wave-clamp-across");
  example.linear(5, 0.04, 1.7, 1e-3);
  example.dropper.end_of_life_loss = 0.2;
  example.requirement.surroundings.life_years = 10;
  example.requirement.output.loads[1].current_A = load_A;
  return example;
}

double margin_at(const test::Example& example, double age) {
  Evidence evidence(example.design(), example.requirement, example.requirement.supplies[0]);
  return evidence.margin_at_A(age).value();
}

MarginAge age_of(const test::Example& example) {
  Evidence evidence(example.design(), example.requirement, example.requirement.supplies[0]);
  return margin_zero_age(evidence);
}

}  // namespace

TEST_CASE("The margin falls with age, from new past the end of life") {
  const auto example = ageing(10e-3);
  double last = 1;
  for (const double age : {0.0, 0.25, 0.5, 1.0, 1.5, 2.0}) {
    const double margin_A = margin_at(example, age);
    CHECK(margin_A < last);
    last = margin_A;
  }
}

TEST_CASE("In saturation the current goes straight with the capacitance, so the margin with time") {
  // Mean half-wave current f·C·(2·Vpk - Vo - 2·Vf): proportional to C, and C straight in time. The rail at
  // the knee moves a little with age (ESR and reservoir), hence the tolerance.
  const auto example = ageing(10e-3);
  const double new_A = margin_at(example, 0), half_A = margin_at(example, 0.5), old_A = margin_at(example, 1);
  CHECK_THAT(half_A, WithinAbs(0.5 * (new_A + old_A), 0.02 * (new_A - old_A)));
}

TEST_CASE("The year found is where the margin changes sign") {
  for (const double share : {0.3, 0.8, 1.2, 1.9}) {
    auto example = ageing(1e-3);
    const double left_A = margin_at(example, share);
    example.requirement.output.loads[1].current_A += left_A;  // so that nothing is left at that age
    const auto found = age_of(example);
    INFO(share);
    REQUIRE(found.known);
    REQUIRE(found.year);
    // Found to a hundredth of a year; the margin itself to about 1e-6 of 20 mA, 0.005 years at 0.4 mA a year.
    CHECK_THAT(*found.year, WithinAbs(10 * share, 0.02));
  }
}

TEST_CASE("No margin when new is year 0, a margin that outlasts the horizon is no year at all") {
  const auto starved = age_of(ageing(60e-3));
  CHECK(starved.known);
  CHECK(starved.year == 0.0);
  const auto idle = age_of(ageing(1e-3));
  CHECK(idle.known);
  CHECK_FALSE(idle.year);
}

TEST_CASE("Without a rail to reach there is no answer") {
  auto example = ageing(10e-3);
  example.stage.kind = dropfront::parts::StageKind::step_down;  // input_min not given
  CHECK_FALSE(age_of(example).known);
}

TEST_CASE("A whole score carries the year and how far it was looked for, the first of all supplies") {
  auto example = ageing(10e-3);
  example.requirement.output.loads[1].current_A += margin_at(example, 0.7);
  const auto one = score(example.design(), example.requirement, Depth::full);
  REQUIRE(one.current_margin_zero_year);
  CHECK_THAT(*one.current_margin_zero_year, WithinAbs(7, 0.02));
  CHECK(one.current_margin_horizon_years == 20.0);
  example.requirement.supplies.push_back({"strong", {240, 250, 253}, {50, 50, 50}, {}, false, false});
  const auto two = score(example.design(), example.requirement, Depth::full);
  CHECK(two.current_margin_zero_year == one.current_margin_zero_year);
  CHECK_FALSE(score(example.design(), example.requirement, Depth::screen).current_margin_horizon_years);
}
