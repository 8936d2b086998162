#include "dropfront/scoring/checks/make_check.hpp"

#include <limits>

#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

constexpr double kInfinity = std::numeric_limits<double>::infinity();
constexpr double kNaN = std::numeric_limits<double>::quiet_NaN();

TEST_CASE("a value on its limit passes on either side") {
  CHECK(at_most("x", 5, 5, "V", {}, "").pass == true);
  CHECK(at_least("x", 5, 5, "V", {}, "").pass == true);
  CHECK(at_most("x", 5.1, 5, "V", {}, "").pass == false);
  CHECK(at_least("x", 4.9, 5, "V", {}, "").pass == false);
}

TEST_CASE("without a limit nothing passes") {
  for (const Check& check : {at_most("x", 5, std::nullopt, "V", {}, ""), at_least("x", 5, {}, "V", {}, ""),
                             must_be("x", std::nullopt, {}, "")}) {
    CHECK_FALSE(check.limit);
    CHECK_FALSE(check.pass);
    CHECK_FALSE(check.unsolved);
  }
}

TEST_CASE("a value that is no number is unsolved and one beyond all numbers fails") {
  const Check lost = at_most("x", kNaN, 5, "V", {}, "");
  CHECK(lost.unsolved);
  CHECK_FALSE(lost.pass);
  CHECK_FALSE(lost.value);
  CHECK(at_most("x", 1, kNaN, "V", {}, "").unsolved);
  const Check beyond = at_most("x", kInfinity, 5, "V", {}, "");
  CHECK(beyond.pass == false);
  CHECK_FALSE(beyond.value);
  CHECK(at_least("x", -kInfinity, 5, "V", {}, "").pass == false);
}

TEST_CASE("of several limits the least counts, and one not given lets nothing pass") {
  CHECK(at_most_each("x", 5, {9.0, 6.0}, "V", {}, "").limit == 6.0);
  const Check open = at_most_each("x", 5, {6.0, std::nullopt}, "V", {}, "");
  CHECK_FALSE(open.pass);
  CHECK_FALSE(open.limit);
  const Check broken = at_most_each("x", 7, {6.0, std::nullopt}, "V", {}, "");
  CHECK(broken.pass == false);
  CHECK(broken.limit == 6.0);
  CHECK_FALSE(at_most_each("x", 7, {std::nullopt}, "V", {}, "").pass);
}

TEST_CASE("yes is 1 and no is 0, against 1") {
  CHECK(must_be("x", true, {}, "").pass == true);
  const Check no = must_be("x", false, {}, "");
  CHECK(no.pass == false);
  CHECK(no.value == 0.0);
  CHECK(no.limit == 1.0);
  CHECK(no.yes_or_no());
}

TEST_CASE("failed is worse than unsolved, unsolved than not given, not given than passed") {
  const Check failed = at_most("x", 6, 5, "V", {}, "failed");
  const Check lost = unsolved(at_most("x", 1, 5, "V", {}, ""), "lost");
  const Check open = at_most("x", 1, std::nullopt, "V", {}, "open");
  const Check passed = at_most("x", 1, 5, "V", {}, "passed");
  const std::vector<Check> order{failed, lost, open, passed};
  for (std::size_t i = 0; i < order.size(); ++i)
    for (std::size_t j = i; j < order.size(); ++j) {
      CHECK(worse(order[i], order[j]).basis == order[i].basis);
      CHECK(worse(order[j], order[i]).basis == order[i].basis);
    }
}

TEST_CASE("of two alike the lesser headroom is worse, even when the limits differ") {
  const Check near = at_most("x", 4, 5, "V", {}, "near");
  const Check far = at_most("x", 6, 10, "V", {}, "far");
  CHECK(worse(near, far).basis == "near");
  CHECK(worse(far, near).basis == "near");
  const Check little = at_least("x", 4, std::nullopt, "V", {}, "little");
  const Check much = at_least("x", 6, std::nullopt, "V", {}, "much");
  CHECK(worse(much, little).basis == "little");
  const Check beyond = at_most("x", kInfinity, 5, "V", {}, "beyond");
  CHECK(worse(at_most("x", 6, 5, "V", {}, "over"), beyond).basis == "beyond");
}

TEST_CASE("a point without a steady state leaves the check unsolved unless another point breaks it") {
  OperatingPoint good, bad;
  good.state.status = circuit::SteadyStatus::converged;
  bad.state.reason = "lost";
  const auto judge = [](double value) {
    return [value](const OperatingPoint&) { return at_most("x", value, 5, "V", {}, "judged"); };
  };
  const Check open = worst_over({&good, &bad}, judge(1));
  CHECK(open.unsolved);
  CHECK(open.basis == "no answer: lost");
  CHECK(worst_over({&bad, &good}, judge(6)).pass == false);
}

}  // namespace
}  // namespace dropfront::scoring
