#include "dropfront/scoring/ripple_life.hpp"

#include <cmath>

#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinRel;

constexpr double kRounding = 1e-12;

TEST_CASE("every ripple term has a name of its own, in the order of the choice, and says how it is known") {
  const auto& laws = ripple_life_laws();
  REQUIRE(laws.size() == 5);
  for (std::size_t i = 0; i < laws.size(); ++i) {
    CHECK(static_cast<std::size_t>(laws[i].law) == i);
    CHECK_FALSE(laws[i].name.empty());
    CHECK_FALSE(laws[i].basis.empty());
  }
  CHECK(laws[0].basis.find("as restated") != std::string_view::npos);
  for (std::size_t i = 1; i < 4; ++i) CHECK(laws[i].basis.find("from memory") != std::string_view::npos);
}

TEST_CASE("every term falls with the current, and the excess terms are 1 at the rating") {
  for (const auto& law : ripple_life_laws()) {
    INFO(law.name);
    double last = 1e9;
    for (double current_A = 0; current_A < 0.5; current_A += 0.05) {
      const double factor = ripple_life_factor(law.law, current_A, 0.2, 105);
      CHECK(factor > 0);
      if (law.law == RippleLife::none)
        CHECK(factor == 1);
      else
        CHECK(factor < last);
      last = factor;
    }
    const bool excess = law.law != RippleLife::none && law.law != RippleLife::halves_each_5_K;
    if (excess) CHECK_THAT(ripple_life_factor(law.law, 0.2, 0.2, 105), WithinRel(1.0, kRounding));
  }
}

TEST_CASE("a higher rated temperature never shortens a life, whatever the term") {
  for (const auto& law : ripple_life_laws())
    for (const double share : {0.0, 0.7, 1.0, 1.5, 2.5}) {
      double last = 0;
      for (double rated_degC = 70; rated_degC <= 125; rated_degC += 0.5) {
        const double life = std::exp2(rated_degC / 10) * ripple_life_factor(law.law, share, 1, rated_degC);
        INFO(law.name << " " << share << " " << rated_degC);
        CHECK(life > last);
        last = life;
      }
    }
}

TEST_CASE("the terms give their published values at rest, at the rating and at twice the rating") {
  using enum RippleLife;
  const auto at = [](RippleLife law, double share, double rated_degC = 105) {
    return ripple_life_factor(law, share, 1, rated_degC);
  };
  // 2000 h at 105 degC, 65 degC, 5 K of rise: 16 000 h of the 32 000 h without ripple (worked example of the
  // restated formula).
  CHECK_THAT(at(halves_each_5_K, 1), WithinRel(0.5, kRounding));
  CHECK_THAT(at(halves_each_5_K, 0), WithinRel(1.0, kRounding));
  // Shapes from memory, worked by hand with dT0 = 5 K (10 K for an 85 degC type) and dT = dT0·x².
  CHECK_THAT(at(excess_over_5_K, 0), WithinRel(2.0, kRounding));
  CHECK_THAT(at(excess_over_5_K, 2), WithinRel(1.0 / 8, kRounding));
  CHECK_THAT(at(excess_over_10_K, 0, 85), WithinRel(2.0, kRounding));
  CHECK_THAT(at(excess_over_10_K, 2, 85), WithinRel(1.0 / 8, kRounding));
  CHECK_THAT(at(two_or_four, 0, 85), WithinRel(2.0, kRounding));
  CHECK_THAT(at(two_or_four, 2, 85), WithinRel(1.0 / 64, kRounding));
}

TEST_CASE("the reservoir's life takes the term the problem names and says so") {
  test::Example example;
  const double plain = [&] {
    example.requirement.surroundings.ripple_life = RippleLife::none;
    return test::value_of(example, reservoir_life);
  }();
  for (const auto& law : ripple_life_laws()) {
    example.requirement.surroundings.ripple_life = law.law;
    const auto check = test::judge(example, reservoir_life).value();
    INFO(law.name);
    CHECK(check.basis.find(law.name) != std::string::npos);
    if (law.law == RippleLife::halves_each_5_K) CHECK(*check.value < plain);
    if (law.law == RippleLife::excess_over_5_K) CHECK(*check.value > plain);  // far below the rating: credit
  }
}

}  // namespace
}  // namespace dropfront::scoring
