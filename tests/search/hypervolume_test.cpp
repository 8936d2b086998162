#include "dropfront/search/hypervolume.hpp"

#include <pagmo/utils/hypervolume.hpp>

#include "search/toy_lists.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;
using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;

namespace {

using Points = std::vector<std::vector<double>>;

// n points of a curve f2(f1) on [from, 1].
template <class Curve>
Points sampled(int n, double from, const Curve& curve) {
  Points points;
  for (int i = 0; i < n; ++i) {
    const double x = from + (1 - from) * i / (n - 1);
    points.push_back({x, curve(x)});
  }
  return points;
}

}  // namespace

TEST_CASE("hypervolume of fine samples of the ZDT fronts comes to the exact values") {
  // Integrals of the published front shapes (Zitzler, Deb and Thiele 2000): ZDT1 f2 = 1 - sqrt f1,
  // ZDT2 f2 = 1 - f1^2, ZDT6 the same from f1 = 0.2807753191. A staircase of n points falls short by about
  // (extent of f1)(extent of f2) / (2 n): 5e-5 at n = 10,000; ZDT1 is steep at 0 and needs twice that.
  const int n = 10000;
  const Points zdt1 = sampled(n, 0, [](double x) { return 1 - std::sqrt(x); });
  const Points zdt2 = sampled(n, 0, [](double x) { return 1 - x * x; });
  const Points zdt6 = sampled(n, 0.2807753191, [](double x) { return 1 - x * x; });
  CHECK_THAT(hypervolume(zdt1, {1, 1}), WithinAbs(2.0 / 3, 1e-4));
  CHECK_THAT(hypervolume(zdt1, {1.1, 1.1}), WithinAbs(0.8766667, 1e-4));
  CHECK_THAT(hypervolume(zdt1, {11, 11}), WithinAbs(120.6666667, 1e-4));
  CHECK_THAT(hypervolume(zdt2, {1, 1}), WithinAbs(1.0 / 3, 1e-4));
  CHECK_THAT(hypervolume(zdt2, {1.1, 1.1}), WithinAbs(0.5433333, 1e-4));
  CHECK_THAT(hypervolume(zdt6, {1, 1}), WithinAbs(0.3259550, 1e-4));
  CHECK_THAT(hypervolume(zdt6, {1.1, 1.1}), WithinAbs(0.5078775, 1e-4));
}

TEST_CASE("hypervolume of the DTLZ sphere in three objectives comes to the exact value") {
  // DTLZ2 (Deb et al. 2001): unit sphere, reference r: r^3 - pi/6. Sampled on a 200 x 200 grid of angles the
  // covered volume falls short by about half a cell's solid angle each way: below 1 %.
  Points sphere;
  const int n = 200;
  const double right_angle = 1.5707963267948966;
  for (int i = 0; i <= n; ++i)
    for (int j = 0; j <= n; ++j) {
      const double a = right_angle * i / n;
      const double b = right_angle * j / n;
      sphere.push_back({std::cos(a) * std::cos(b), std::cos(a) * std::sin(b), std::sin(a)});
    }
  CHECK_THAT(hypervolume(sphere, {1.1, 1.1, 1.1}), WithinAbs(0.8074012, 0.008));
  CHECK(hypervolume(sphere, {1.1, 1.1, 1.1}) < 0.8074012);
  CHECK_THAT(hypervolume(sphere, {2, 2, 2}), WithinAbs(7.4764012, 0.008));
}

TEST_CASE("hypervolume of the DTLZ1 plane in two objectives comes to the exact value") {
  // f1 + f2 = 0.5, reference 1: 1 - 0.5^2 / 2 = 0.875; the staircase of 5,001 points lacks 0.125 / 5,000.
  Points plane;
  for (int i = 0; i <= 5000; ++i) plane.push_back({0.5 * i / 5000, 0.5 - 0.5 * i / 5000});
  CHECK_THAT(hypervolume(plane, {1, 1}), WithinAbs(0.875 - 0.125 / 5000, 1e-12));
}

TEST_CASE("hypervolume equals libpagmo's on random points in two to five objectives") {
  for (int objectives = 2; objectives <= 5; ++objectives)
    for (std::uint64_t seed = 1; seed <= 3; ++seed) {
      toy::Random random{seed * 31 + static_cast<std::uint64_t>(objectives)};
      Points points(60, std::vector<double>(objectives));
      for (auto& p : points)
        for (double& x : p) x = random.uniform();
      const std::vector<double> reference(objectives, 1.25);
      const double expected = pagmo::hypervolume(points, true).compute(reference);
      // The same sums in another order: a few hundred roundings.
      CHECK_THAT(hypervolume(points, reference), WithinRel(expected, 1e-12));
    }
}

TEST_CASE("hypervolume follows its laws: boxes, copies, points outside, dominated points") {
  CHECK(hypervolume({}, {1, 1}) == 0);
  CHECK_THAT(hypervolume({{0.25}}, {1}), WithinAbs(0.75, 1e-15));
  CHECK_THAT(hypervolume({{0, 0, 0, 0}}, {1, 2, 3, 4}), WithinAbs(24, 1e-12));
  CHECK_THAT(hypervolume({{0, 0, 0}, {0, 0, 0}, {0.5, 0.5, 0.5}}, {1, 1, 1}), WithinAbs(1, 1e-15));
  CHECK(hypervolume({{0, 1}, {2, 0}}, {1, 1}) == 0);
}
