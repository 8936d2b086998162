#include "dropfront/scoring/verdict.hpp"

#include <cmath>

#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront::scoring;

namespace {

Check check(std::optional<double> value, std::optional<double> limit, std::optional<bool> pass) {
  Check c;
  c.id = "some.check";
  c.value = value;
  c.limit = limit;
  c.pass = pass;
  return c;
}

Score with(std::vector<Check> checks) {
  Score score;
  score.objectives = {1'000'000, 0.3, 500'000'000, 5e-3};
  score.checks = std::move(checks);
  return score;
}

}  // namespace

TEST_CASE("All passed and all objectives known is compliant, with nothing violated") {
  const Requirement requirement;
  const auto score = with({check(1, 2, true)});
  REQUIRE(verdict_of(score, requirement) == Verdict::compliant);
  REQUIRE(violation_of(score, requirement) == 0);
}

TEST_CASE("A missing rating refuses the design, unless missing ratings are accepted") {
  Requirement requirement;
  const auto score = with({check(1, 2, true), check(1, std::nullopt, std::nullopt)});
  REQUIRE(verdict_of(score, requirement) == Verdict::undefined);
  REQUIRE(violation_of(score, requirement) == 1);
  requirement.accept_missing_ratings = true;
  REQUIRE(verdict_of(score, requirement) == Verdict::compliant);
  REQUIRE(violation_of(score, requirement) == 0);
  REQUIRE(cautions_of({}, score, requirement).size() == 1);
}

TEST_CASE("A failed check always wins over a missing rating") {
  Requirement requirement;
  const auto score = with({check(1, std::nullopt, std::nullopt), check(3, 2, false)});
  REQUIRE(verdict_of(score, requirement) == Verdict::breaks_limits);
  requirement.accept_missing_ratings = true;
  REQUIRE(verdict_of(score, requirement) == Verdict::breaks_limits);
}

TEST_CASE("What could not be solved is undefined, whether missing ratings are accepted or not") {
  Requirement requirement;
  requirement.accept_missing_ratings = true;
  auto open = check(std::nullopt, 2, std::nullopt);
  open.unsolved = true;
  REQUIRE(verdict_of(with({open}), requirement) == Verdict::undefined);
}

TEST_CASE("A price or size that is not given makes the design undefined only where it is asked for") {
  Requirement requirement;
  auto score = with({check(1, 2, true)});
  score.objectives.cost_micro.reset();
  REQUIRE(verdict_of(score, requirement) == Verdict::undefined);
  requirement.objectives = {Objective::standby_loss, Objective::current_margin};
  REQUIRE(verdict_of(score, requirement) == Verdict::compliant);
}

TEST_CASE("Violation is the relative shortfall, adds up, and is finite whatever the figures") {
  test::Example example;
  REQUIRE_THAT(violation_of(with({check(3, 2, false)}), example.requirement), WithinRel(0.5, 1e-12));
  auto floor_check = check(1.5, 2, false);
  floor_check.at_most = false;
  REQUIRE_THAT(violation_of(with({check(3, 2, false), floor_check}), example.requirement),
               WithinRel(0.75, 1e-12));
  for (const double value : {1e300, -1e300, 0.0}) {
    for (const double limit : {0.0, 1e-300, -1.0}) {
      const double v = violation_of(with({check(value, limit, false)}), example.requirement);
      REQUIRE(std::isfinite(v));
      REQUIRE(v > 0);
    }
  }
}

TEST_CASE("A margin below zero is measured against the heaviest load when the limit is zero") {
  test::Example example;  // heaviest 10 mA
  auto margin = check(-2e-3, 0, false);
  margin.id = "supply.margin";
  margin.at_most = false;
  REQUIRE_THAT(shortfall_of(margin, example.requirement), WithinRel(0.2, 1e-12));
}

TEST_CASE("A dropper not stated for series use is a caution") {
  test::Example example;
  const auto score = with({});
  REQUIRE(cautions_of(example.design(), score, example.requirement).empty());
  example.dropper.series_rated = false;
  REQUIRE(cautions_of(example.design(), score, example.requirement).size() == 1);
}

TEST_CASE("A checked chain carries the remark that one open element leaves the whole crest") {
  test::Example example;
  const auto cautions = [&](Depth depth) {
    return score(example.design(), example.requirement, depth).cautions;
  };
  REQUIRE(cautions(Depth::full).empty());  // no rule, nothing to say
  example.requirement.limits.discharge = DischargeRule{};
  const auto said = cautions(Depth::full);
  REQUIRE(said.size() == 1);
  // 253 V peaked by 3 % third harmonic: a crest of about 1.414·253·1.03 = 369 V.
  REQUIRE(said[0].find("one element of the chain open") != std::string::npos);
  REQUIRE(said[0].find("368 V") != std::string::npos);
  REQUIRE(said[0].find("34 V") != std::string::npos);
  example.discharge_count = 0;
  REQUIRE(cautions(Depth::full).empty());
}
