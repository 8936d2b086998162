#include "dropfront/search/non_dominated_sort.hpp"

#include <algorithm>
#include <pagmo/utils/multi_objective.hpp>

#include "search/toy_lists.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;

TEST_CASE("fronts equal those of libpagmo's fast non-dominated sorting") {
  for (int objectives = 2; objectives <= 5; ++objectives) {
    toy::Random random{static_cast<std::uint64_t>(40 + objectives)};
    std::vector<std::vector<double>> points(300, std::vector<double>(objectives));
    for (auto& p : points)
      // Few levels, so that ties and equal points occur.
      for (double& x : p) x = std::floor(8 * random.uniform());
    std::vector<std::vector<int>> expected;
    const auto sorted = pagmo::fast_non_dominated_sorting(points);
    for (const auto& front : std::get<0>(sorted)) {
      expected.emplace_back(front.begin(), front.end());
      std::sort(expected.back().begin(), expected.back().end());
    }
    CHECK(non_dominated_sort(points) == expected);
  }
}

TEST_CASE("no points make no fronts, one point makes one") {
  CHECK(non_dominated_sort({}).empty());
  CHECK(non_dominated_sort({{1, 2}}) == std::vector<std::vector<int>>{{0}});
}
