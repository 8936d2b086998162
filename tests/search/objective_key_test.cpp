#include "dropfront/search/objective_key.hpp"

#include "support/catch.hpp"

using namespace dropfront::search;

TEST_CASE("a key is the nearest whole step, halves upwards, also below zero") {
  CHECK(objective_key(0.0014, 0.001) == 1);
  CHECK(objective_key(0.0016, 0.001) == 2);
  CHECK(objective_key(2.5, 1) == 3);
  CHECK(objective_key(-2.5, 1) == -2);  // floor(-2.5 + 0.5)
  CHECK(objective_key(-0.2, 1) == 0);
}

TEST_CASE("without a resolution the key is the value itself") {
  CHECK(objective_key(0.123456789, 0) == 0.123456789);
  CHECK(objective_key(0.123456789, -1) == 0.123456789);
}

TEST_CASE("an objective that is not a number sorts last and never dominates") {
  const double nan = std::nan("");
  CHECK(objective_key(nan, 0) > 1e308);
  CHECK(objective_key(nan, 0.1) > 1e308);
  CHECK_FALSE(dominates(objective_keys({1, nan}, {0, 0}), objective_keys({1, 5}, {0, 0})));
  CHECK(dominates(objective_keys({1, 5}, {0, 0}), objective_keys({1, nan}, {0, 0})));
}

TEST_CASE("dominance needs no worse anywhere and better somewhere") {
  CHECK(dominates({1, 2}, {1, 3}));
  CHECK_FALSE(dominates({1, 2}, {1, 2}));
  CHECK_FALSE(dominates({1, 3}, {2, 2}));
}
