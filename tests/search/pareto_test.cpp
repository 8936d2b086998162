#include "dropfront/search/pareto.hpp"

#include <algorithm>

#include "dropfront/search/objective_key.hpp"
#include "search/toy_lists.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;

namespace {

using Points = std::vector<std::vector<double>>;

Points random_points(int count, int objectives, std::uint64_t seed) {
  toy::Random random{seed};
  Points points;
  for (int i = 0; i < count; ++i) {
    std::vector<double> p(objectives);
    double length = 0;
    for (double& x : p) {
      x = random.uniform();
      length += x * x;
    }
    // Half of them near a sphere, so that fronts are large.
    if (i % 2)
      for (double& x : p) x = 1 - x / std::sqrt(length) * random.between(0.9, 1.0);
    points.push_back(p);
  }
  return points;
}

// The definition: least (raw, choice) of each set of equal keys, less what another key dominates.
Points by_definition(const Points& points, const std::vector<double>& resolution) {
  std::map<std::vector<double>, std::vector<double>> best;
  for (const auto& p : points) {
    auto keys = objective_keys(p, resolution);
    const auto found = best.find(keys);
    if (found == best.end() || p < found->second) best[keys] = p;
  }
  Points front;
  for (const auto& one : best)
    if (std::none_of(best.begin(), best.end(),
                     [&](const auto& other) { return dominates(other.first, one.first); }))
      front.push_back(one.second);
  std::sort(front.begin(), front.end());
  return front;
}

Points content(const ParetoArchive& archive) {
  Points result;
  for (const auto* member : archive.sorted()) result.push_back(member->objectives);
  return result;
}

}  // namespace

TEST_CASE("an archive holds the front by definition, at any resolution and in any order of insertion") {
  for (int objectives = 1; objectives <= 4; ++objectives)
    for (double step : {0.0, 0.02, 0.2}) {
      const std::vector<double> resolution(objectives, step);
      Points points = random_points(1500, objectives, 100 + objectives);
      const Points expected = by_definition(points, resolution);
      for (int order = 0; order < 3; ++order) {
        ParetoArchive archive(resolution);
        for (const auto& p : points) archive.insert(p, {0}, 0);
        CHECK(content(archive) == expected);
        CHECK(archive.size() == static_cast<int>(expected.size()));
        if (order == 0)
          std::reverse(points.begin(), points.end());
        else
          std::sort(points.begin(), points.end());
      }
    }
}

TEST_CASE("equal keys keep the least raw objectives in the problem's order, then the least choice") {
  ParetoArchive archive({1, 1});
  std::vector<std::int64_t> removed;
  CHECK(archive.insert({1.2, 3.0}, {5}, 1));
  CHECK(archive.insert({1.1, 3.4}, {9}, 2, &removed));
  CHECK(removed == std::vector<std::int64_t>{1});
  CHECK_FALSE(archive.insert({1.1, 3.4}, {9}, 3));
  CHECK_FALSE(archive.insert({1.1, 3.4}, {10}, 4));
  CHECK(archive.insert({1.1, 3.4}, {8}, 5));
  CHECK(archive.size() == 1);
  CHECK(archive.sorted().front()->tag == 5);
}

TEST_CASE("what an archive rejects it would not have entered, and the other way round") {
  const std::vector<double> resolution{0.05, 0.0, 0.05};
  ParetoArchive archive(resolution);
  for (const auto& p : random_points(600, 3, 7)) {
    const bool rejected = archive.rejects(p, {3});
    CHECK(archive.insert(p, {3}, 0) == !rejected);
  }
}

TEST_CASE("an unknown objective is taken at its best, so that such a design is never given up") {
  const double nan = std::nan("");
  ParetoArchive archive({0, 0});
  archive.insert({1, 1}, {0}, 0);
  CHECK_FALSE(archive.rejects({5, nan}, {1}));
  CHECK_FALSE(archive.rejects({nan, nan}, {1}));
  CHECK(archive.rejects({5, 1}, {1}));
  // A lower bound may stand for the unknown value.
  CHECK(archive.rejects({5, 1.5}, {1}));
  CHECK_FALSE(archive.rejects({5, 0.5}, {1}));
}

TEST_CASE("a design with an objective that is not a number has no place on a front") {
  ParetoArchive archive({0, 0});
  CHECK_FALSE(archive.insert({0, std::nan("")}, {0}, 0));
  CHECK(archive.size() == 0);
}
