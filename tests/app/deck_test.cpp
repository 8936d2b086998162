#include <nlohmann/json.hpp>

#include "app/program.hpp"
#include "support/catch.hpp"
#include "support/ngspice.hpp"

namespace dropfront::app {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;

// Reference: ngspice on the deck as printed, smooth diodes. Tolerances as for all comparisons with it: smooth
// junctions against piecewise-linear ones, rail 0.2 V, power 3 %, current 1 %.
TEST_CASE("the deck of a candidate runs as it is, and ngspice finds the figures of the result") {
  const Workshop shop;
  REQUIRE(shop.run("search small.json --quiet").status == 0);
  const auto result = nlohmann::json::parse(shop.read("results/small/candidates.json"));
  const int number = result["ranked"]["cheapest"][0];
  for (const std::string corner : {"lean_cold", "standby_worst"}) {
    INFO(corner);
    const auto deck =
        shop.run("deck results/small --candidate " + std::to_string(number) + " --corner " + corner);
    INFO(deck.err);
    REQUIRE(deck.status == 0);
    const auto theirs = support::run_ngspice(deck.out);
    const auto& ours = result["evidence"][std::to_string(number)]["operation"][corner];
    CHECK_THAT(theirs.at("rail_min"), WithinAbs(ours["rail_min_V"].get<double>(), 0.2));
    CHECK_THAT(theirs.at("rail_mean"), WithinAbs(ours["rail_mean_V"].get<double>(), 0.2));
    CHECK_THAT(theirs.at("input_power"), WithinRel(ours["input_power_W"].get<double>(), 0.03));
    CHECK_THAT(theirs.at("input_current"), WithinRel(ours["input_current_Arms"].get<double>(), 0.01));
  }
}

TEST_CASE("a deck of what is not there is status 2 with what there is") {
  const Workshop shop;
  REQUIRE(shop.run("search small.json --quiet").status == 0);
  CHECK(shop.run("deck results/small --candidate 100000").err.find("the numbers go from 1 to") !=
        std::string::npos);
  CHECK(
      shop.run("deck results/small --candidate 1 --corner lean_cool").err.find("did you mean 'lean_cold'") !=
      std::string::npos);
  CHECK(shop.run("deck results --candidate 1").err.find("not a result folder") != std::string::npos);
  shop.write("results/study.json", "{}");
  const auto study = shop.run("deck results --candidate 1");
  CHECK(study.status == 2);
  CHECK(study.err.find("name one of its folders: small") != std::string::npos);
}

}  // namespace
}  // namespace dropfront::app
