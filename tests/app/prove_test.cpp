#include <nlohmann/json.hpp>

#include "app/program.hpp"
#include "support/catch.hpp"

namespace dropfront::app {
namespace {

nlohmann::json result(const Workshop& shop, const std::string& arguments, int status) {
  const auto finished = shop.run("search problems/towel-rail-timer.json --json " + arguments);
  INFO(finished.err);
  REQUIRE(finished.status == status);
  return nlohmann::json::parse(finished.out)["problems"][0];
}

nlohmann::json front(const nlohmann::json& result) {
  auto list = nlohmann::json::array();
  for (const auto& entry : result["front"]) list.push_back({entry["design"], entry["objectives"]});
  return list;
}

TEST_CASE("a proof by boxes finds the front that enumeration finds, on a shipped problem") {
  const Workshop shop;
  // 7,367 designs: too many for a quick enumeration, few enough for a normal one.
  const auto enumerated = result(shop, "--out a", 0);
  const auto proven = result(shop, "--effort quick --prove --out b", 0);
  CHECK(enumerated["proof"]["method"] == "enumeration");
  CHECK(enumerated["proof"]["complete"] == true);
  CHECK(proven["proof"]["method"] == "branch and bound");
  CHECK(proven["proof"]["complete"] == true);
  CHECK(proven["status"] == "done");
  CHECK(front(proven) == front(enumerated));
  CHECK(proven["proof"]["scored"].get<double>() < proven["proof"]["space"].get<double>() / 2);
}

TEST_CASE("a proof cut short by its budget says what is left") {
  const Workshop shop;
  const auto cut = result(shop, "--effort quick --prove --budget 40", 0);
  CHECK(cut["status"] == "cut short");
  CHECK(cut["proof"]["complete"] == false);
  CHECK(cut["proof"]["open"]["designs"].get<double>() > 0);
  CHECK(shop.read("results/towel-rail-timer/summary.txt").find("Not proven") != std::string::npos);
}

TEST_CASE("limits that no part can keep are proven to leave nothing") {
  const Workshop shop;
  const auto none = result(shop, "--effort quick --prove --set limits.standby_power=\"0.1 W\"", 1);
  CHECK(none["status"] == "proven none");
  CHECK(none["front"].empty());
}

}  // namespace
}  // namespace dropfront::app
