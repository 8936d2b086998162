#include "dropfront/scoring/check.hpp"

#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinRel;
constexpr double kRounding = 1e-12;

Check with(std::optional<double> value, std::optional<double> limit, bool at_most) {
  Check check;
  check.value = value;
  check.limit = limit;
  check.at_most = at_most;
  return check;
}

TEST_CASE("headroom is what is left of the limit, or what lies above it") {
  CHECK_THAT(with(8, 10, true).headroom().value(), WithinRel(0.2, kRounding));
  CHECK_THAT(with(12, 10, true).headroom().value(), WithinRel(-0.2, kRounding));
  CHECK_THAT(with(12, 10, false).headroom().value(), WithinRel(0.2, kRounding));
  CHECK_THAT(with(8, 10, false).headroom().value(), WithinRel(-0.2, kRounding));
}

TEST_CASE("there is no headroom against a limit of zero, nor with anything missing") {
  CHECK_FALSE(with(1, 0.0, false).headroom());
  CHECK_FALSE(with(1, std::nullopt, true).headroom());
  CHECK_FALSE(with(std::nullopt, 1, true).headroom());
}

}  // namespace
}  // namespace dropfront::scoring
