#include "dropfront/problem/cost_area.hpp"

#include "dropfront/scoring/board_area.hpp"
#include "dropfront/scoring/cost.hpp"
#include "problem/random_box.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::problem;
using namespace dropfront::problem::testing;

TEST_CASE("every member of a box costs and covers at least as much as one of its steps") {
  const Problem problem =
      read_problem_file(std::string(DROPFRONT_SOURCE_DIR) + "/problems/leak-alarm.json").problems.front();
  const SlotSpace slots = make_space(problem.offers);
  const CostArea cost_area(problem, slots);
  values::RandomStream random(5);
  std::size_t several = 0;
  for (int n = 0; n < 40; ++n) {
    const search::Box box = random_box(slots.space, n < 30 ? 2 : 4, random);
    const auto steps = cost_area.steps(box);
    REQUIRE_FALSE(steps.empty());
    CHECK(steps.size() <= CostArea::kMostSteps);
    several += steps.size() > 1;
    for (std::size_t i = 1; i < steps.size(); ++i) {
      CHECK(steps[i - 1].cost_micro < steps[i].cost_micro);
      CHECK(steps[i - 1].area_um2 > steps[i].area_um2);
    }
    std::vector<bool> reached(steps.size(), false);
    const auto members = members_of(box);
    for (std::size_t m = 0; m < members.size(); m += 1 + members.size() / 500) {
      const scoring::Design design = design_of(problem.offers, slots.ids, members[m]);
      const auto cost = scoring::cost_micro(design, problem.requirement);
      const auto area = scoring::board_area_um2(design, problem.requirement);
      REQUIRE(cost);
      REQUIRE(area);
      bool above_one = false;
      for (const auto& step : steps)
        above_one = above_one || (*cost >= step.cost_micro && *area >= step.area_um2);
      CHECK(above_one);
    }
  }
  CHECK(several > 10);
}
