#include "dropfront/scoring/corners/mains_shape.hpp"

#include <cmath>
#include <numbers>

#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront::scoring;

namespace {
Supply european() { return test::Example().supply(); }
}  // namespace

TEST_CASE("Whatever the shape, the r.m.s. voltage is the one asked for") {
  auto supply = european();
  for (const bool given : {false, true}) {
    supply.harmonics_given = given;
    supply.harmonics = {{3, 0.04, 0.3}, {5, 0.03, 1.0}, {7, 0.02, 2.0}};
    const auto shapes = mains_shapes(supply);
    for (const auto* wave : {&shapes.lean, &shapes.rich, &shapes.nominal}) {
      double squares = 0;
      const int steps = 1000;  // far above the highest order: the sum of squares is then exact
      for (int i = 0; i < steps; ++i) {
        const double v = wave->value_V(i * wave->period_s() / steps);
        squares += v * v / steps;
      }
      REQUIRE_THAT(std::sqrt(squares), WithinRel(wave->voltage_Vrms(), 1e-9));
    }
    REQUIRE(shapes.lean.voltage_Vrms() == 207);
    REQUIRE(shapes.rich.voltage_Vrms() == 253);
    REQUIRE(shapes.lean.frequency_Hz() == 49.5);
    REQUIRE(shapes.rich.frequency_Hz() == 50.5);
  }
}

TEST_CASE(
    "With no harmonics given the crest is 3.0 % lower lean and 3.0 % higher rich, nominal a pure sine") {
  const auto shapes = mains_shapes(european());
  // By arithmetic: sin x ± 0.03 sin 3x at x = 90 degrees over sqrt(1 + 0.03²).
  const double keep = std::sqrt(1 + 0.03 * 0.03);
  const double sine = std::numbers::sqrt2;
  REQUIRE_THAT(shapes.lean.crest_V(), WithinRel(207 * sine * 0.97 / keep, 1e-9));
  REQUIRE_THAT(shapes.rich.crest_V(), WithinRel(253 * sine * 1.03 / keep, 1e-9));
  REQUIRE_THAT(shapes.lean.crest_V() / (207 * sine) - 1, WithinAbs(-0.030, 5e-4));
  REQUIRE_THAT(shapes.rich.crest_V() / (253 * sine) - 1, WithinAbs(+0.030, 5e-4));
  REQUIRE_THAT(shapes.nominal.crest_V(), WithinRel(230 * sine, 1e-12));
  REQUIRE(shapes.nominal.tones().size() == 1);
}

TEST_CASE("Third 4 % and fifth 3 % against the crest lower it by 7 %") {
  auto supply = european();
  supply.harmonics_given = true;
  supply.harmonics = {{3, 0.04, std::numbers::pi}, {5, 0.03, 0}};  // as given both raise the crest
  const auto shapes = mains_shapes(supply);
  // Every sign turned by us: both lower it at 90 degrees, (1 - 0.07)/sqrt(1 + 0.04² + 0.03²).
  REQUIRE_THAT(shapes.lean.crest_V() / (207 * std::numbers::sqrt2),
               WithinAbs(0.93 / std::sqrt(1.0025), 2e-3));
  REQUIRE_THAT(shapes.rich.crest_V() / (253 * std::numbers::sqrt2),
               WithinAbs(1.07 / std::sqrt(1.0025), 1e-6));
}

TEST_CASE("The chosen set is the extreme of all sets of half-turns") {
  auto supply = european();
  supply.harmonics_given = true;
  supply.harmonics = {{3, 0.05, 0.4}, {5, 0.06, 2.1}, {7, 0.05, 1.3}};
  const auto shapes = mains_shapes(supply);
  for (unsigned turned = 0; turned < 8; ++turned) {
    auto set = supply.harmonics;
    for (unsigned i = 0; i < 3; ++i) {
      if ((turned >> i & 1U) != 0) set[i].phase_rad += std::numbers::pi;
    }
    // Crests are found by bisection to rounding.
    REQUIRE(shapes.lean.crest_V() <= dropfront::circuit::Waveform(207, 49.5, set).crest_V() * (1 + 1e-12));
    REQUIRE(shapes.rich.crest_V() >= dropfront::circuit::Waveform(253, 50.5, set).crest_V() * (1 - 1e-12));
  }
}

TEST_CASE("Phases stated to be as given are left alone in every corner") {
  auto supply = european();
  supply.harmonics_given = supply.phases_as_given = true;
  supply.harmonics = {{3, 0.05, 0.4}};
  const auto shapes = mains_shapes(supply);
  for (const auto* wave : {&shapes.lean, &shapes.rich, &shapes.nominal}) {
    REQUIRE(wave->tones().size() == 2);
    REQUIRE(wave->tones()[1].phase_rad == 0.4);
  }
}
