#include "dropfront/search/local_model.hpp"

#include <cmath>
#include <limits>

#include "search/toy_lists.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;
using Catch::Matchers::WithinAbs;

namespace {

double plane(const std::vector<double>& x) { return 2 + 3 * x[0] - x[1]; }
double bent(const std::vector<double>& x) { return std::exp(2 * x[0]) * (1 + x[1]); }

LocalModel taught(int samples) {
  LocalModel model(2, 2);
  toy::Random random{11};
  for (int i = 0; i < samples; ++i) {
    const std::vector<double> x{random.uniform(), random.uniform()};
    model.add(7, x, {plane(x), i % 2 ? bent(x) : std::numeric_limits<double>::quiet_NaN()});
  }
  return model;
}

}  // namespace

TEST_CASE("a plane is read back from its samples") {
  const LocalModel model = taught(400);
  const LocalFit fit = model.fit(7, {0.5, 0.5}, {0})[0];
  REQUIRE(fit.usable());
  // Slopes are damped by a part in a thousand of the weight: errors of a few thousandths of the slopes.
  CHECK_THAT(fit.value({0.5, 0.5}), WithinAbs(plane({0.5, 0.5}), 0.005));
  CHECK_THAT(fit.value({0.6, 0.4}), WithinAbs(plane({0.6, 0.4}), 0.005));
  CHECK(fit.spread() < 0.005);
}

TEST_CASE("a bent surface is followed near the centre, with an honest error") {
  const LocalModel model = taught(2000);
  const LocalFit fit = model.fit(7, {0.3, 0.7}, {1})[0];
  REQUIRE(fit.usable());
  for (double dx : {-0.1, 0.0, 0.1})
    for (double dy : {-0.1, 0.0, 0.1}) {
      const std::vector<double> x{0.3 + dx, 0.7 + dy};
      // The cross term exp(2x) y, which the model lacks, amounts to about 2 exp(0.6) dx dy = 0.04 here.
      CHECK_THAT(fit.value(x), WithinAbs(bent(x), 0.06));
    }
}

TEST_CASE("unknown quantities do not count, unknown regions have no fit") {
  LocalModel model(1, 2);
  const double nan = std::numeric_limits<double>::quiet_NaN();
  for (int i = 0; i < 10; ++i) model.add(0, {0.1 * i}, {1.0, i < 2 ? 5.0 : nan});
  const auto fits = model.fit(0, {0.5}, {0, 1});
  CHECK(fits[0].usable());
  CHECK_FALSE(fits[1].usable());
  CHECK_FALSE(model.fit(1, {0.5}, {0})[0].usable());
}

TEST_CASE("axes along which samples do not differ do not spoil a fit") {
  LocalModel model(3, 1);
  for (int i = 0; i <= 20; ++i) model.add(0, {0.05 * i, 0.5, 0.5}, {0.05 * i});
  const LocalFit fit = model.fit(0, {0.5, 0.5, 0.5}, {0})[0];
  REQUIRE(fit.usable());
  CHECK_THAT(fit.value({0.5, 0.5, 0.5}), WithinAbs(0.5, 0.01));
  CHECK_THAT(fit.value({0.5, 0.9, 0.1}), WithinAbs(0.5, 0.01));
}
