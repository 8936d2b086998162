#include "dropfront/values/sobol.hpp"

#include <boost/random/sobol.hpp>
#include <set>

#include "support/catch.hpp"

namespace dropfront::values {
namespace {

TEST_CASE("an aligned block of a Sobol set fills every cell of every axis once, shifted or not") {
  const Sobol sobol(Sobol::kMostDimensions);
  const ShiftedSobol shifted(sobol, RandomStream(7));
  for (int d = 0; d < sobol.dimensions(); ++d) {
    std::set<std::uint32_t> plain;
    std::set<int> moved;
    for (std::uint32_t i = 0; i < 256; ++i) {
      plain.insert(sobol.bits(i)[d] >> 24);
      moved.insert(static_cast<int>(shifted.point(i)[d] * 256));
    }
    INFO("dimension " << d);
    CHECK(plain.size() == 256);
    CHECK(moved.size() == 256);
  }
}

TEST_CASE("the first two dimensions are even in every elementary rectangle") {
  // A (0, m, 2)-net in base 2: of 2^m points exactly one lies in each box of 2^-a by 2^-(m-a).
  const Sobol sobol(2);
  for (int a = 0; a <= 8; ++a) {
    std::set<std::pair<std::uint64_t, std::uint64_t>> boxes;
    for (std::uint32_t i = 0; i < 256; ++i) {
      const auto bits = sobol.bits(i);
      boxes.insert({std::uint64_t{bits[0]} >> (32 - a), std::uint64_t{bits[1]} >> (24 + a)});
    }
    CHECK(boxes.size() == 256);
  }
}

TEST_CASE("the points are those of Boost's Sobol engine") {
  // Boost.Random's engine walks the same points in Gray-code order and leaves the origin out.
  boost::random::sobol engine(Sobol::kMostDimensions);
  const Sobol sobol(Sobol::kMostDimensions);
  for (std::uint32_t n = 1; n < 600; ++n) {
    const auto ours = sobol.bits(n ^ (n >> 1));
    for (int d = 0; d < sobol.dimensions(); ++d)
      REQUIRE(ours[d] == static_cast<std::uint32_t>(engine() >> 32));
  }
}

TEST_CASE("shifted points lie inside the cube, differ by stream and repeat by stream") {
  const Sobol sobol(3);
  const ShiftedSobol one(sobol, RandomStream(1)), same(sobol, RandomStream(1)), other(sobol, RandomStream(2));
  for (std::uint32_t i = 0; i < 64; ++i) {
    for (const double x : one.point(i)) CHECK((x > 0 && x < 1));
    CHECK(one.point(i) == same.point(i));
    CHECK(one.point(i) != other.point(i));
  }
}

TEST_CASE("the mean of a smooth function over shifted sets closes in far faster than chance") {
  // Product of (1 + (x_d - 1/2)/2): mean 1. Plain random points of that number would miss by about 0.02.
  const Sobol sobol(6);
  for (std::uint64_t seed = 1; seed <= 4; ++seed) {
    const ShiftedSobol shifted(sobol, RandomStream(seed));
    double sum = 0;
    for (std::uint32_t i = 0; i < 256; ++i) {
      double product = 1;
      for (const double x : shifted.point(i)) product *= 1 + 0.5 * (x - 0.5);
      sum += product;
    }
    CHECK_THAT(sum / 256, Catch::Matchers::WithinAbs(1, 0.004));
  }
}

}  // namespace
}  // namespace dropfront::values
