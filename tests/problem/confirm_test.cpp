#include "dropfront/problem/confirm.hpp"

#include <algorithm>

#include "dropfront/problem/binding.hpp"
#include "dropfront/problem/box_search.hpp"
#include "problem/fixture.hpp"
#include "support/catch.hpp"

namespace dropfront::problem {
namespace {

using Catch::Matchers::WithinAbs;
using scoring::BoxQuantity;

/// A problem of small lists and one ordinary design of it: 1 uF, 47 ohm, 12 V, 220 uF, linear 5 V.
struct Small {
  testing::Bench bench;
  Problem problem = bench.problem({"output.loads=[{\"name\":\"awake\",\"current\":\"8 mA\"}]"});
  scoring::Design design;
  parts::Dropper dropper;
  parts::Clamp clamp;
  parts::Reservoir reservoir;
  parts::Resistor series_resistor;
  parts::OutputStage stage;

  Small() {
    dropper = *problem.offers.droppers.back();
    series_resistor = *problem.offers.series_resistors.front();
    clamp = problem.catalogue->clamps[1];
    reservoir = problem.catalogue->reservoirs[2];
    stage = problem.catalogue->output_stages[1];
    design.arrangement = circuit::find_arrangement("half-wave-clamp-ahead");
    design.dropper = &dropper;
    design.series_resistor = &series_resistor;
    design.clamp = &clamp;
    design.reservoir = &reservoir;
    design.rectifier = &problem.catalogue->rectifiers.front();
    design.output_stage = &stage;
  }
  Small(const Small&) = delete;
  /// Only the dropper's capacitance is left free.
  void fix_all_but_the_dropper() {
    series_resistor.tolerance = reservoir.tolerance = stage.tolerance = 0;
    clamp.voltage_min_V = clamp.voltage_max_V = clamp.voltage_V;
    clamp.slope_min_ohm = clamp.slope_resistance_ohm;
    reservoir.esr_ohm = reservoir.esr_cold_ohm = 0;
  }
  double heaviest_A() const { return scoring::load_profile(problem.requirement.output).heaviest_output_A(); }
};

const Yield& yield_named(const BuildSample& sample, const std::string& check) {
  return *std::find_if(sample.yields.begin(), sample.yields.end(),
                       [&](const Yield& yield) { return yield.check == check; });
}

TEST_CASE("with only the capacitance free, the yield is the share of capacitances above the threshold") {
  Small small;
  small.fix_all_but_the_dropper();
  REQUIRE(scoring::build_axes(small.design) == std::vector{scoring::BuildAxis::dropper});
  // The margin rises with C: halving finds where it meets a limit put in the middle.
  const auto& supply = small.problem.requirement.supplies.front();
  const scoring::ToleranceBox box(small.design, small.problem.requirement, supply, BoxQuantity::margin);
  auto position = box.corner();
  position[0] = 0.37;
  const auto wanted = box.at(position);
  REQUIRE(wanted);
  small.problem.requirement.limits.current_margin = *wanted / small.heaviest_A();
  ConfirmPlan plan;
  plan.margin_evaluations = plan.other_evaluations = 1;
  plan.sample_units = 1;
  const auto confirmed = confirm(small.problem, {small.design}, {0}, plan, 2);
  REQUIRE((confirmed.front() && confirmed.front()->sample));
  const BuildSample& sample = *confirmed.front()->sample;
  const Yield& yield = yield_named(sample, "supply.margin");
  CHECK(yield.builds == 4096);
  // Each scramble has one point in each of 256 equal cells: it misses by less than one of them.
  CHECK_THAT(yield.share, WithinAbs(1 - 0.37, 1.0 / 256));
  CHECK(yield.low <= 1 - 0.37);
  CHECK(yield.high >= 1 - 0.37);
  // One scramble alone, in this thread, is one of the sixteen.
  const ScrambleTally alone = try_scramble(small.problem, small.design, 5);
  CHECK(alone == try_scramble(small.problem, small.design, 5));
  CHECK(*std::min_element(alone.margins_A.begin(), alone.margins_A.end()) >= sample.margin_A->least);
}

TEST_CASE("a design with much to spare yields all, and the interval says how sure that is") {
  Small small;
  small.problem.requirement.output.loads.front().current_A = 0.5e-3;
  // One scramble is like another here; the full count is only counted.
  const std::vector<ScrambleTally> tallies(kScrambles, try_scramble(small.problem, small.design, 3));
  const BuildSample sample = summed(small.problem, small.design, tallies);
  const Yield& yield = yield_named(sample, "supply.margin");
  CHECK(yield.passed == 4096);
  CHECK(yield.high == 1);
  // Clopper and Pearson: (1 - 0.95)/2 = low^4096.
  CHECK_THAT(yield.low, WithinAbs(0.99909981, 1e-7));
  REQUIRE(sample.margin_A);
  CHECK(sample.margin_A->least <= sample.margin_A->one_percent);
  CHECK(sample.margin_A->one_percent <= sample.margin_A->median);
}

TEST_CASE("the interval of a yield is Student's over the scrambles") {
  // Two values, 0.4 and 0.6, eight times each: s = 0.1033, t(15) = 2.131, reach 0.0550.
  std::vector<int> passed;
  for (int i = 0; i < 8; ++i) passed.insert(passed.end(), {40, 60});
  const Yield yield = yield_of("x", passed, 100);
  CHECK_THAT(yield.share, WithinAbs(0.5, 1e-12));
  CHECK_THAT(yield.low, WithinAbs(0.5 - 0.05503, 1e-4));
  CHECK_THAT(yield.high, WithinAbs(0.5 + 0.05503, 1e-4));
  CHECK(yield_of("x", std::vector<int>(16, 0), 256).high < 0.001);
}

TEST_CASE("a wider tolerance never leaves more in the worst case") {
  Small small;
  double before = 1;
  for (const double tolerance : {0.0, 0.05, 0.1, 0.2}) {
    small.dropper.tolerance = tolerance;
    const scoring::ToleranceBox box(small.design, small.problem.requirement,
                                    small.problem.requirement.supplies.front(), BoxQuantity::margin);
    const BoxWorst worst = search_box(box, BoxQuantity::margin, 60, 1);
    REQUIRE(worst.value);
    CHECK(*worst.value <= before);
    before = *worst.value;
  }
}

TEST_CASE("a search keeps inside the box and to what it may spend") {
  Small small;
  for (int q = 0; q < scoring::kBoxQuantities; ++q) {
    const auto quantity = static_cast<BoxQuantity>(q);
    const scoring::ToleranceBox box(small.design, small.problem.requirement,
                                    small.problem.requirement.supplies.front(), quantity);
    for (const int most : {1, 5, 40}) {
      const BoxWorst worst = search_box(box, quantity, most, 1);
      CHECK(worst.evaluations <= most);
      REQUIRE(worst.value);
      for (const double u : worst.position) CHECK((u >= 0 && u <= 1));
      // The point is what it is said to be.
      CHECK(*worst.value == *box.at(worst.position));
    }
  }
}

TEST_CASE("more evaluations never find less") {
  Small small;
  const scoring::ToleranceBox box(small.design, small.problem.requirement,
                                  small.problem.requirement.supplies.front(), BoxQuantity::resistor_power);
  const BoxWorst few = search_box(box, BoxQuantity::resistor_power, 15, 1);
  const BoxWorst many = search_box(box, BoxQuantity::resistor_power, 120, 1);
  REQUIRE((few.value && many.value));
  CHECK(*many.value >= *few.value);
}

TEST_CASE("confirming gives the same with one thread and with two, and stops when told") {
  Small small;
  const std::vector<scoring::Design> designs{small.design, small.design};
  ConfirmPlan plan;
  plan.margin_evaluations = plan.other_evaluations = 20;
  plan.sample_units = 0;
  const auto one = confirm(small.problem, designs, {1}, plan, 1);
  const auto two = confirm(small.problem, designs, {1}, plan, 2);
  for (std::size_t i = 0; i < designs.size(); ++i) {
    REQUIRE((one[i] && two[i]));
    CHECK_FALSE(one[i]->sample);
    CHECK(one[i]->costs.size() == two[i]->costs.size());
    for (int q = 0; q < scoring::kBoxQuantities; ++q) {
      CHECK(one[i]->box[q].corner == two[i]->box[q].corner);
      CHECK(one[i]->box[q].inside == two[i]->box[q].inside);
    }
  }
  const std::atomic<bool> stop{true};
  for (const auto& none : confirm(small.problem, designs, {1}, plan, 1, &stop)) CHECK_FALSE(none);
}

TEST_CASE("a finding is judged by the worse of corner and inside") {
  BoxFinding finding;
  finding.quantity = BoxQuantity::margin;
  finding.corner = 2e-3;
  finding.inside = 1.5e-3;
  finding.limit = 1e-3;
  CHECK(*finding.worst() == 1.5e-3);
  CHECK_THAT(*finding.headroom(), WithinAbs(0.5, 1e-12));
  finding.quantity = BoxQuantity::rail;
  CHECK(*finding.worst() == 2e-3);
  CHECK_THAT(*finding.headroom(), WithinAbs(-1, 1e-12));
  finding.corner.reset();
  CHECK(*finding.worst() == 1.5e-3);
}

}  // namespace
}  // namespace dropfront::problem
