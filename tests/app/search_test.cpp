#include <algorithm>
#include <filesystem>
#include <nlohmann/json.hpp>
#include <sstream>

#include "app/program.hpp"
#include "dropfront/report/text_table.hpp"
#include "support/catch.hpp"

namespace dropfront::app {
namespace {

const std::string kTimer = "problems/towel-rail-timer.json";
const std::vector<std::string> kResultFiles{"bom.csv", "candidates.csv", "candidates.json", "summary.txt"};

TEST_CASE("search prints ranked sets that fit the terminal and says where the files are") {
  const Workshop shop;
  const auto finished = shop.run("search " + kTimer + " --effort quick");
  INFO(finished.err);
  CHECK(finished.status == 0);
  CHECK(finished.err.empty());
  CHECK(finished.out.find("Files: results/towel-rail-timer/") != std::string::npos);
  CHECK(finished.out.find("mains potential") != std::string::npos);
  CHECK(finished.out.find('\x1b') == std::string::npos);
  std::istringstream lines(finished.out);
  for (std::string line; std::getline(lines, line);) CHECK(report::display_width(line) <= report::kTextWidth);
  CHECK(shop.files_below("results/towel-rail-timer") == kResultFiles);
}

TEST_CASE("the same bytes with one thread and with two") {
  const Workshop shop;
  for (const std::string problem : {"towel-rail-timer", "leak-alarm"}) {
    for (const std::string threads : {"1", "2"}) {
      const auto finished =
          shop.run("search problems/" + problem + ".json --effort quick --budget 3000 --quiet --out out" +
                   threads + " --threads " + threads);
      REQUIRE(finished.status <= 1);
    }
    for (const auto& file : kResultFiles) {
      INFO(file);
      const auto first = shop.read("out1/" + problem + "/" + file);
      CHECK_FALSE(first.empty());
      CHECK(first == shop.read("out2/" + problem + "/" + file));
    }
  }
}

TEST_CASE("no times, paths or thread counts stand in the files") {
  const Workshop shop;
  REQUIRE(shop.run("search " + kTimer + " --effort quick --threads 2").status == 0);
  for (const auto& file : kResultFiles) {
    INFO(file);
    const auto content = shop.read("results/towel-rail-timer/" + file);
    CHECK(content.find(shop.path("")) == std::string::npos);
    CHECK(content.find("problems/") == std::string::npos);
    CHECK(content.find("thread") == std::string::npos);
  }
}

TEST_CASE("--json prints one document, the same as the file, and nothing else") {
  const Workshop shop;
  const auto finished = shop.run("search " + kTimer + " --effort quick --json");
  REQUIRE(finished.status == 0);
  CHECK(finished.err.empty());
  const auto printed = nlohmann::ordered_json::parse(finished.out);
  REQUIRE(printed["problems"].size() == 1);
  CHECK(printed["problems"][0] ==
        nlohmann::ordered_json::parse(shop.read("results/towel-rail-timer/candidates.json")));
}

TEST_CASE("a design of the result, read back by assess, gives the figures the search gave") {
  const Workshop shop;
  REQUIRE(shop.run("search " + kTimer + " --effort quick").status == 0);
  const auto result = nlohmann::ordered_json::parse(shop.read("results/towel-rail-timer/candidates.json"));
  const int number = result["ranked"]["cheapest"][0];
  const auto& evidence = result["evidence"][std::to_string(number)];
  shop.write("design.json", evidence["design"].dump());
  const auto assessed = shop.run("assess " + kTimer + " --design design.json --json");
  INFO(assessed.err);
  CHECK(assessed.status == 0);
  CHECK(nlohmann::ordered_json::parse(assessed.out) == evidence);
}

TEST_CASE("a problem without a compliant design is status 1 and names what stands in the way") {
  const Workshop shop;
  const auto finished = shop.run("search " + kTimer + " --effort quick --set 'limits.standby_power=50 mW'");
  CHECK(finished.status == 1);
  CHECK(finished.out.find("Failed most often: ") != std::string::npos);
  const auto result = nlohmann::json::parse(shop.read("results/towel-rail-timer/candidates.json"));
  CHECK(result["front"].empty());
  CHECK((result["status"] == "none found" || result["status"] == "proven none"));
  CHECK_FALSE(result["conflict"].empty());
}

TEST_CASE("one bad file among good ones: status 2, each mistake named, nothing written") {
  const Workshop shop;
  shop.write("bad.json", "{\"title\": \"x\", \"mians\": {}}");
  shop.write("worse.json", "{");
  const auto finished = shop.run("search " + kTimer + " bad.json worse.json missing.json");
  CHECK(finished.status == 2);
  CHECK(finished.out.empty());
  CHECK(std::count(finished.err.begin(), finished.err.end(), '\n') == 3);
  for (const char* word : {"bad.json", "mians", "mains", "worse.json", "missing.json"})
    CHECK(finished.err.find(word) != std::string::npos);
  CHECK_FALSE(shop.exists("results"));
}

TEST_CASE("two problems of one name would share a folder: status 2, nothing written") {
  const Workshop shop;
  const auto finished = shop.run("search " + kTimer + " ./" + kTimer);
  CHECK(finished.status == 2);
  CHECK(finished.err.find("towel-rail-timer") != std::string::npos);
  CHECK_FALSE(shop.exists("results"));
}

TEST_CASE("a folder that holds something else is never replaced") {
  const Workshop shop;
  std::filesystem::create_directories(shop.path("out/towel-rail-timer"));
  shop.write("out/towel-rail-timer/notes.txt", "mine");
  const auto finished = shop.run("search " + kTimer + " --out out");
  CHECK(finished.status == 2);
  CHECK(finished.err.find("out/towel-rail-timer") != std::string::npos);
  CHECK(shop.files_below("out") == std::vector<std::string>{"towel-rail-timer/notes.txt"});
}

TEST_CASE("a disk that refuses is status 3") {
  const Workshop shop;
  shop.write("results", "a file where the folder should be");
  const auto finished = shop.run("search " + kTimer + " --effort quick --budget 50");
  CHECK(finished.status == 3);
  CHECK(finished.err.starts_with("error: "));
  CHECK(shop.read("results") == "a file where the folder should be");
}

TEST_CASE("an interrupted run ends with status 130 and what it found is written") {
  const Workshop shop;
  const auto finished =
      shop.run_interrupted({"search", kTimer, "problems/sensor-family.json", "--effort", "deep"}, "Files: ");
  CHECK(finished.status == 130);
  CHECK(shop.exists("results/towel-rail-timer/candidates.json"));
  for (const auto& file : shop.files_below("results")) {
    INFO(file);
    CHECK(file.find(".partial") == std::string::npos);
    if (!file.ends_with(".json")) continue;
    CHECK_FALSE(nlohmann::json::parse(shop.read("results/" + file)).empty());
  }
}

}  // namespace
}  // namespace dropfront::app
