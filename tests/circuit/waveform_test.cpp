#include "dropfront/circuit/waveform.hpp"

#include <cmath>
#include <numbers>

#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using dropfront::circuit::Harmonic;
using dropfront::circuit::Waveform;

namespace {
// Rounding of a few dozen operations.
constexpr double kExact = 1e-12;
}  // namespace

TEST_CASE("A plain sine has the crest of its r.m.s. value and rises from trough to crest once") {
  const Waveform mains(230, 50);
  REQUIRE_THAT(mains.crest_V(), WithinRel(230 * std::numbers::sqrt2, kExact));
  REQUIRE_THAT(mains.sum_of_rises_V(), WithinRel(2 * mains.crest_V(), kExact));
  REQUIRE_THAT(mains.value_V(mains.crest_time_s()), WithinRel(mains.crest_V(), kExact));
  REQUIRE(mains.odd_only());
}

TEST_CASE("The total r.m.s. stays what was asked whatever harmonics are added") {
  const Waveform mains(120, 60, {{3, 0.05, 0.4}, {5, 0.06, 1.0}, {7, 0.05, -2.0}});
  const int steps = 4096;
  double square_sum = 0;
  for (int i = 0; i < steps; ++i) square_sum += std::pow(mains.value_V(mains.period_s() * i / steps), 2);
  // The mean over equal steps of a trigonometric polynomial is exact.
  REQUIRE_THAT(std::sqrt(square_sum / steps), WithinRel(120.0, 1e-11));
}

TEST_CASE("The slope is the derivative of the value") {
  const Waveform mains(230, 50, {{3, 0.03, 0.0}, {5, 0.03, 0.7}});
  const double h = 1e-7;
  for (const double t : {0.0, 1.3e-3, 4.9e-3, 11e-3}) {
    const double difference = (mains.value_V(t + h) - mains.value_V(t - h)) / (2 * h);
    // Central difference: error h^2·v'''/6 is below 1e-3 V/s here, of 1e5 V/s.
    REQUIRE_THAT(mains.slope_V_per_s(t), WithinAbs(difference, 0.05));
  }
}

TEST_CASE("Three per cent of third harmonic in phase flattens the crest, in opposition sharpens it") {
  const double plain = Waveform(230, 50).crest_V();
  const double flat = Waveform(230, 50, {{3, 0.03, 0.0}}).crest_V();
  const double peaked = Waveform(230, 50, {{3, 0.03, std::numbers::pi}}).crest_V();
  // sin + p·sin 3 at the crest is 1 - p; the fundamental shrinks by sqrt(1 + p^2), here 0.045 %.
  REQUIRE_THAT(flat / plain, WithinRel(0.97 / std::sqrt(1 + 0.0009), 1e-9));
  REQUIRE_THAT(peaked / plain, WithinRel(1.03 / std::sqrt(1 + 0.0009), 1e-9));
}

TEST_CASE("A dented crest counts its extra rise") {
  // 40 % of third harmonic in phase dents the crest: two humps a half period.
  const Waveform mains(100, 50, {{3, 0.4, 0.0}});
  double rises = 0;
  const int steps = 200000;
  double previous = mains.value_V(0);
  for (int i = 1; i <= steps; ++i) {
    const double v = mains.value_V(mains.period_s() * i / steps);
    rises += std::max(0.0, v - previous);
    previous = v;
  }
  REQUIRE(mains.sum_of_rises_V() > 2 * mains.crest_V() * 1.01);
  // Sampling misses the very tips: second order in the step.
  REQUIRE_THAT(mains.sum_of_rises_V(), WithinRel(rises, 1e-8));
}

TEST_CASE("Even harmonics break the half-wave symmetry") {
  REQUIRE_FALSE(Waveform(230, 50, {{2, 0.02, 0.0}}).odd_only());
}

TEST_CASE("A harmonic of zero share changes nothing") {
  const Waveform mains(230, 50, {{3, 0.0, 1.0}});
  REQUIRE(mains.tones().size() == 1);
}
