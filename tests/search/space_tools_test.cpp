// Axes, packed choices, neighbours, mixtures and even sequences.
#include <algorithm>
#include <set>

#include "dropfront/search/axis.hpp"
#include "dropfront/search/choice_codec.hpp"
#include "dropfront/search/mixture.hpp"
#include "dropfront/search/neighbours.hpp"
#include "dropfront/search/relax.hpp"
#include "dropfront/search/sequence.hpp"
#include "search/toy_lists.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;

namespace {

Slot slot(int size, std::vector<double> coordinate = {}, bool category = false) {
  Slot s;
  s.size = size;
  s.coordinate = std::move(coordinate);
  s.category = category;
  return s;
}

}  // namespace

TEST_CASE("an axis sorts distinct coordinates and finds the neighbours on both sides") {
  Space space;
  space.slots = {slot(3), slot(5, {2, 0, 4, 2, 1})};
  const std::vector<Axis> axes = axes_of(space);
  REQUIRE(axes.size() == 1);
  const Axis& axis = axes[0];
  CHECK(axis.slot == 1);
  CHECK(axis.position == std::vector<double>{0, 0.25, 0.5, 1});
  CHECK(axis.options == std::vector<std::vector<int>>{{1}, {4}, {0, 3}, {2}});
  CHECK(axis.step_of == std::vector<int>{2, 0, 3, 2, 1});
  CHECK(axis.around(0.3) == std::vector<int>{1, 2});
  CHECK(axis.around(0.4) == std::vector<int>{2, 1});
  CHECK(axis.around(0.5) == std::vector<int>{2});
  CHECK(axis.around(0) == std::vector<int>{0});
  CHECK(axis.around(1) == std::vector<int>{3});
}

TEST_CASE("an axis of one coordinate has all its options at 0") {
  Space space;
  space.slots = {slot(2, {7, 7})};
  CHECK(axes_of(space)[0].position == std::vector<double>{0});
  CHECK(axes_of(space)[0].around(0.6) == std::vector<int>{0});
}

TEST_CASE("packing a choice and unpacking it gives it back, also beyond 64 bits") {
  toy::Random random{4};
  for (int slots : {1, 6, 13}) {
    Space space;
    for (int s = 0; s < slots; ++s) space.slots.push_back(slot(1 + 997 * s));
    const ChoiceCodec codec(space);
    CHECK((codec.words() == 1) == (space.size() < 1.8e19));
    std::vector<std::uint64_t> words(codec.words());
    for (int n = 0; n < 200; ++n) {
      Choice c;
      for (const Slot& s : space.slots)
        c.push_back(n == 0 ? s.size - 1 : static_cast<std::int32_t>(random.uniform() * s.size));
      codec.encode(c, words.data());
      CHECK(codec.decode(words.data()) == c);
    }
  }
}

TEST_CASE("a choice set tells new from old over several enlargements") {
  Space space;
  space.slots = {slot(100), slot(100), slot(3)};
  const ChoiceCodec codec(space);
  ChoiceSet set(codec);
  for (int pass = 0; pass < 2; ++pass) {
    bool all = true;
    for (std::int32_t i = 0; i < 100; ++i)
      for (std::int32_t j = 0; j < 100; ++j) all = (set.insert({i, j, 1}) == (pass == 0)) && all;
    CHECK(all);
  }
  CHECK(set.size() == 10000);
}

TEST_CASE("one-part changes are all designs at one slot's distance, each once") {
  Space space;
  space.slots = {slot(3), slot(1), slot(4)};
  const auto changes = one_part_changes(space, {1, 0, 2});
  CHECK(changes.size() == 2 + 0 + 3);
  CHECK(std::set<Choice>(changes.begin(), changes.end()).size() == changes.size());
  for (const Choice& c : changes) CHECK((c[0] != 1) + (c[1] != 0) + (c[2] != 2) == 1);
}

TEST_CASE("two-part changes touch both slots of a coupled pair, near by on axes") {
  Space space;
  space.slots = {slot(5, {0, 1, 2, 3, 4}), slot(3), slot(9)};
  space.coupled = {{0, 1}};
  const auto changes = two_part_changes(space, axes_of(space), {2, 0, 5}, 1);
  CHECK(changes.size() == 2 * 2);
  for (const Choice& c : changes) {
    CHECK((c[0] == 1 || c[0] == 3));
    CHECK(c[1] != 0);
    CHECK(c[2] == 5);
  }
}

TEST_CASE(
    "mixtures lie in the space, repeat with the seed and differ from their first parent where possible") {
  const toy::Lists lists(toy::Shape{});
  const auto axes = axes_of(lists.space());
  dropfront::values::RandomStream random(3), again(3);
  const Choice first{0, 3, 2, 1, 4, 0}, second{1, 5, 2, 0, 4, 1};
  int differing = 0;
  for (int n = 0; n < 300; ++n) {
    const Choice c = mix(lists.space(), axes, first, second, random);
    CHECK(c == mix(lists.space(), axes, first, second, again));
    for (std::size_t s = 0; s < c.size(); ++s) {
      CHECK(c[s] >= 0);
      CHECK(c[s] < lists.space().slots[s].size);
    }
    differing += c != first;
  }
  CHECK(differing > 270);  // a change may hit the option already there
}

TEST_CASE("the even sequence fills every part of the cube better than chance does") {
  // 400 points on a 20 x 20 grid: chance fills 400 (1 - 1/e) = 253 cells give or take 10; held to five of
  // those more.
  std::set<std::pair<int, int>> cells;
  for (int n = 0; n < 400; ++n) {
    const auto p = spread_point(n, 2, 9);
    cells.insert({static_cast<int>(20 * p[0]), static_cast<int>(20 * p[1])});
    CHECK(p[0] >= 0);
    CHECK(p[0] < 1);
  }
  CHECK(cells.size() > 303);
  CHECK(spread_point(0, 3, 0) == std::vector<double>{0.5, 0.5, 0.5});
}

TEST_CASE("regions are all combinations of category options, evenly thinned beyond the limit") {
  Space space;
  space.slots = {slot(4, {}, true), slot(10), slot(6, {}, true)};
  const auto all = regions_of(space, 100);
  CHECK(all.size() == 24);
  CHECK(std::set<Choice>(all.begin(), all.end()).size() == 24);
  const auto some = regions_of(space, 8);
  CHECK(some.size() == 8);
  CHECK(std::set<Choice>(some.begin(), some.end()).size() == 8);
}
