// The order in which designs are taken up: gauge, queue, spread order, elites, record, achievement.
#include <limits>

#include "dropfront/search/achievement.hpp"
#include "dropfront/search/candidate_queue.hpp"
#include "dropfront/search/elites.hpp"
#include "dropfront/search/front_gauge.hpp"
#include "dropfront/search/option_record.hpp"
#include "dropfront/search/shortlist.hpp"
#include "dropfront/search/spread_order.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;
using Catch::Matchers::WithinAbs;

namespace {

const double unknown = std::numeric_limits<double>::quiet_NaN();

Space line(int size) {
  Space space;
  Slot slot;
  slot.size = size;
  space.slots.push_back(slot);
  return space;
}

Guess guess(std::vector<double> objectives, double chance, double gain) {
  Guess g;
  g.objectives = std::move(objectives);
  g.chance = chance;
  g.gain = gain;
  return g;
}

}  // namespace

TEST_CASE("the gauge measures in extents of the front how far a point is before or behind it") {
  ParetoArchive front({0, 0});
  front.insert({0, 10}, {0}, 0);
  front.insert({2, 0}, {1}, 1);
  const FrontGauge gauge(front, {0, 0});
  // Extents 2 and 10. Against (0, 10): better by 5/10; against (2, 0): better by 1/2.
  CHECK_THAT(gauge.gain({1, 5}, -1), WithinAbs(0.5, 1e-15));
  CHECK_THAT(gauge.gain({2, 10}, -1), WithinAbs(0, 1e-15));
  CHECK_THAT(gauge.gain({3, 11}, -1), WithinAbs(-0.5, 1e-15));
  CHECK(gauge.gain({9, 99}, -1) <= -1);
  // Half an extent better than the best of the first objective counts twice on top.
  CHECK_THAT(gauge.gain({-1, 10}, -1), WithinAbs(0.5 + 2 * 0.5, 1e-15));
  CHECK(FrontGauge(ParetoArchive({0, 0}), {0, 0}).gain({5, 5}, -1) == 1);
}

TEST_CASE("the queue gives the most promising first and lays aside what misses the front") {
  const Space space = line(10);
  const ChoiceCodec codec(space);
  CandidateQueue queue(codec, 2);
  ParetoArchive front({0, 0});
  front.insert({0, 1}, {9}, 0);
  front.insert({1, 0}, {8}, 1);
  const FrontGauge gauge(front, {0, 0});
  queue.push({0}, {0.5, unknown}, 0, guess({0.5, 0.4}, 0.2, 0.5), 0.1);
  queue.push({1}, {0.5, unknown}, 0, guess({0.5, 0.4}, 0.9, 0.5), 0.1);
  queue.push({2}, {0.9, unknown}, 0, guess({0.9, 2.0}, 0.9, -0.9), 0.1);
  queue.push({3}, {2, 2}, 0, guess({2, 2}, 0.9, 0.5), 0.1);  // the front rejects it by what is known
  CHECK(queue.promising() == 3);
  CHECK(queue.aside() == 1);
  CHECK(queue.pop(9, front, gauge, 0.1) == std::vector<Choice>{{1}, {0}});
  CHECK(queue.empty());
  CHECK(queue.take_rejected().size() == 1);
  queue.recall();
  REQUIRE(queue.waiting(5).size() == 1);
  queue.reguess({guess({0.9, 0.05}, 0.5, 0.05)}, 0.1);
  CHECK(queue.pop(9, front, gauge, 0.1) == std::vector<Choice>{{2}});
}

TEST_CASE("spread order takes the best of each objective first, then the loneliest") {
  SpreadOrder order(2);
  order.add(0, {0.0, 1.0});
  order.add(1, {1.0, 0.0});
  order.add(2, {0.9, 0.05});
  order.add(3, {0.5, 0.5});
  order.add(4, {0.1, 0.9});
  CHECK(order.pick() == 0);
  CHECK(order.pick() == 1);
  CHECK(order.pick() == 3);
  order.remove(2);
  CHECK(order.pick() == 4);
  CHECK(order.pick() == -1);
  CHECK(order.empty());
}

TEST_CASE("elites keep the front of each region, whatever other regions hold") {
  Elites elites({0, 0});
  elites.add(1, {5, 5}, {0}, 0);
  elites.add(2, {1, 1}, {1}, 1);  // dominates region 1's
  elites.add(1, {4, 4}, {2}, 2);  // displaces it within its region
  dropfront::values::RandomStream random(1);
  bool seen[3] = {false, false, false};
  for (int n = 0; n < 50; ++n) seen[elites.draw(random)] = true;
  CHECK_FALSE(seen[0]);
  CHECK(seen[1]);
  CHECK(seen[2]);
}

TEST_CASE("an option that keeps breaking checks loses its chance, one that holds gains") {
  OptionRecord record(line(3));
  CHECK(record.chance({0}, {0}) == 1);
  CHECK(record.chance({0}, {1}) == 0.5);
  for (int i = 0; i < 8; ++i) record.note({1}, true);
  for (int i = 0; i < 8; ++i) record.note({2}, false);
  CHECK_THAT(record.chance({0}, {1}), WithinAbs(0.1, 1e-15));
  CHECK_THAT(record.chance({0}, {2}), WithinAbs(0.9, 1e-15));
}

TEST_CASE("the achievement is least for the design that serves the aim") {
  ObjectiveRange range(2);
  range.take({0, 10});
  range.take({1, unknown});
  range.take({unknown, 30});
  CHECK(range.scaled(0, 0.5) == 0.5);
  CHECK(range.scaled(1, 20) == 0.5);
  CHECK(achievement({0, 30}, 0, {1, 0}, range) < achievement({1, 10}, 0, {1, 0}, range));
  CHECK(achievement({1, 10}, 0, {0, 1}, range) < achievement({0, 30}, 0, {0, 1}, range));
  // A broken limit outweighs any gain within the extents.
  CHECK(achievement({0, 10}, 0.2, {0.5, 0.5}, range) > achievement({1, 30}, 0, {0.5, 0.5}, range));
}

TEST_CASE("a shortlist holds the least, ties by choice, in any order of arrival") {
  for (int order = 0; order < 2; ++order) {
    Shortlist list(3);
    for (int i = 0; i < 10; ++i) {
      const int k = order ? 9 - i : i;
      list.offer({static_cast<double>(k / 2)}, {static_cast<std::int32_t>(k)});
    }
    std::vector<std::int32_t> held;
    for (const auto& entry : list.entries()) held.push_back(entry.second[0]);
    CHECK(held == std::vector<std::int32_t>{0, 1, 2});
  }
}
