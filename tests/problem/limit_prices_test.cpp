#include "dropfront/problem/limit_prices.hpp"

#include "dropfront/values/random.hpp"
#include "support/catch.hpp"

namespace dropfront::problem {
namespace {

using Catch::Matchers::WithinAbs;
using scoring::Objective;

const std::vector<Objective> kAll{Objective::cost, Objective::standby_loss, Objective::board_area,
                                  Objective::current_margin};

PricedMember member(int number, double cost, double margin_mA, double standby_W, double area_mm2) {
  scoring::Objectives of;
  of.cost_micro = static_cast<std::int64_t>(cost * 1e6 + 0.5);
  of.current_margin_A = margin_mA / 1e3;
  of.standby_loss_W = standby_W;
  of.board_area_um2 = static_cast<std::int64_t>(area_mm2 * 1e6 + 0.5);
  return {number, of};
}

TEST_CASE("a front whose cost goes straight with the margin has one price") {
  // 0.02 a milliampere, by construction; standby and area the same for all, so without a price.
  std::vector<PricedMember> front;
  for (int i = 0; i < 5; ++i) front.push_back(member(i + 1, 0.30 + 0.02 * i, 2.0 + i, 0.3, 700));
  const auto prices = limit_prices(kAll, front);
  REQUIRE(prices.size() == 1);
  CHECK(prices.front().objective == Objective::current_margin);
  for (const auto& step : prices.front().steps) CHECK_THAT(step.per(1e-3), WithinAbs(0.02, 1e-9));
}

TEST_CASE("a member above the line between two others is no step, nor is one that another beats") {
  const std::vector<PricedMember> front{member(1, 0.30, 1, 0.3, 700),  // cheapest
                                        member(2, 0.39, 2, 0.3, 700),  // above the line from 1 to 3
                                        member(3, 0.40, 5, 0.3, 700),
                                        member(4, 0.45, 4.9, 0.3, 700),  // dearer than 3 and less
                                        member(5, 0.50, 6, 0.3, 700)};
  const auto prices = limit_prices(kAll, front);
  REQUIRE(prices.size() == 1);
  const auto& steps = prices.front().steps;
  REQUIRE(steps.size() == 2);
  CHECK((steps[0].from == 1 && steps[0].to == 3));
  CHECK((steps[1].from == 3 && steps[1].to == 5));
  CHECK_THAT(steps[0].per(1e-3), WithinAbs(0.025, 1e-9));
  CHECK_THAT(steps[1].per(1e-3), WithinAbs(0.1, 1e-9));
}

TEST_CASE("along any front prices are positive and never fall, and no member lies below its steps") {
  values::RandomStream random(3);
  for (int trial = 0; trial < 20; ++trial) {
    std::vector<PricedMember> front;
    for (int i = 0; i < 40; ++i)
      front.push_back(member(i + 1, random.uniform(0.2, 1), random.uniform(0, 20), random.uniform(0.1, 0.5),
                             random.uniform(500, 1000)));
    for (const auto& price : limit_prices(kAll, front)) {
      double before = 0;
      for (const auto& step : price.steps) {
        CHECK(step.gain > 0);
        CHECK(step.extra > 0);
        CHECK(step.per(1) > before);
        before = step.per(1);
      }
      if (price.objective != Objective::standby_loss) continue;
      for (const auto& step : price.steps) {
        const auto& from = front[step.from - 1].objectives;
        for (const auto& m : front) {
          // Cost and standby weighed at this step's price: nobody is better than its two ends.
          const auto weighed = [&](const scoring::Objectives& of) {
            return static_cast<double>(*of.cost_micro) / 1e6 + step.per(1) * *of.standby_loss_W;
          };
          CHECK(weighed(m.objectives) >= weighed(from) - 1e-9);
        }
      }
    }
  }
}

TEST_CASE("without the cost asked for, or with a single member, there is no price") {
  const std::vector<PricedMember> front{member(1, 0.3, 1, 0.3, 700), member(2, 0.4, 2, 0.2, 600)};
  CHECK(limit_prices({Objective::current_margin, Objective::standby_loss}, front).empty());
  CHECK(limit_prices(kAll, {front.front()}).empty());
  CHECK(limit_prices({Objective::cost, Objective::board_area}, front).size() == 1);
}

}  // namespace
}  // namespace dropfront::problem
