#include "dropfront/search/aims.hpp"

#include <algorithm>
#include <set>

#include "support/catch.hpp"

using namespace dropfront::search;

TEST_CASE("aims are distinct, lie on the simplex and are as many as the lattice has") {
  // Counts are binomial coefficients: C(h + m - 1, m - 1) with the least h that suffices.
  CHECK(spread_aims(1, 20).size() == 1);
  CHECK(spread_aims(2, 20).size() == 20);
  CHECK(spread_aims(3, 20).size() == 21);
  CHECK(spread_aims(4, 20).size() == 20);
  CHECK(spread_aims(4, 21).size() == 35);
  for (int m = 1; m <= 4; ++m) {
    const auto aims = spread_aims(m, 30);
    CHECK(std::set<std::vector<double>>(aims.begin(), aims.end()).size() == aims.size());
    for (const auto& w : aims) {
      double sum = 0;
      for (double x : w) sum += x;
      // At most four multiples of 1/h: a few units in the last place.
      CHECK_THAT(sum, Catch::Matchers::WithinAbs(1, 1e-14));
      CHECK(*std::min_element(w.begin(), w.end()) >= 0);
    }
  }
}

TEST_CASE("aims begin with the single objectives") {
  const auto aims = spread_aims(3, 15);
  for (int k = 0; k < 3; ++k) CHECK(*std::max_element(aims[k].begin(), aims[k].end()) == 1);
}
