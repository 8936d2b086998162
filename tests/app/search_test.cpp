#include <algorithm>
#include <filesystem>
#include <nlohmann/json.hpp>
#include <sstream>

#include "app/program.hpp"
#include "dropfront/report/text_table.hpp"
#include "support/catch.hpp"

namespace dropfront::app {
namespace {

const std::string kSmall = "small.json";
const std::vector<std::string> kResultFiles{"bom.csv", "candidates.csv", "candidates.json", "summary.txt"};

TEST_CASE("search prints ranked sets that fit the terminal and says where the files are") {
  const Workshop shop;
  const auto finished = shop.run("search " + kSmall);
  INFO(finished.err);
  CHECK(finished.status == 0);
  CHECK(finished.err.empty());
  CHECK(finished.out.find("Files: results/small/") != std::string::npos);
  CHECK(finished.out.find("mains potential") != std::string::npos);
  CHECK(finished.out.find('\x1b') == std::string::npos);
  std::istringstream lines(finished.out);
  for (std::string line; std::getline(lines, line);) CHECK(report::display_width(line) <= report::kTextWidth);
  CHECK(shop.files_below("results/small") == kResultFiles);
}

TEST_CASE("the same bytes with one thread and with two") {
  const Workshop shop;
  const std::string timer =
      "problems/towel-rail-timer.json --effort quick --budget 100 --quiet";  // relaxations too
  for (const std::string threads : {"1", "2"})
    REQUIRE(shop.run("search " + timer + " --out out" + threads + " --threads " + threads).status == 0);
  for (const auto& file : kResultFiles) {
    INFO(file);
    const auto first = shop.read("out1/towel-rail-timer/" + file);
    CHECK_FALSE(first.empty());
    CHECK(first == shop.read("out2/towel-rail-timer/" + file));
  }
}

TEST_CASE("no times, paths or thread counts stand in the files") {
  const Workshop shop;
  REQUIRE(shop.run("search " + kSmall + " --threads 2").status == 0);
  for (const auto& file : kResultFiles) {
    INFO(file);
    const auto content = shop.read("results/small/" + file);
    CHECK(content.find(shop.path("")) == std::string::npos);
    CHECK(content.find(DROPFRONT_SOURCE_DIR) == std::string::npos);
    CHECK(content.find("thread") == std::string::npos);
  }
}

TEST_CASE("--json prints one document, the same as the file, and nothing else") {
  const Workshop shop;
  const auto finished = shop.run("search " + kSmall + " --json");
  REQUIRE(finished.status == 0);
  CHECK(finished.err.empty());
  const auto printed = nlohmann::ordered_json::parse(finished.out);
  REQUIRE(printed["problems"].size() == 1);
  CHECK(printed["problems"][0] == nlohmann::ordered_json::parse(shop.read("results/small/candidates.json")));
}

TEST_CASE("a design of the result, read back by assess, gives the figures the search gave") {
  const Workshop shop;
  REQUIRE(shop.run("search " + kSmall).status == 0);
  const auto result = nlohmann::ordered_json::parse(shop.read("results/small/candidates.json"));
  const int number = result["ranked"]["cheapest"][0];
  auto evidence = result["evidence"][std::to_string(number)];
  evidence.erase("confirmation");  // what the search adds
  shop.write("design.json", evidence["design"].dump());
  const auto assessed = shop.run("assess " + kSmall + " --design design.json --json");
  INFO(assessed.err);
  CHECK(assessed.status == 0);
  CHECK(nlohmann::ordered_json::parse(assessed.out) == evidence);
}

TEST_CASE("a problem without a compliant design is status 1 and names what stands in the way") {
  const Workshop shop;
  const auto finished = shop.run("search " + kSmall + " --set 'limits.standby_power=50 mW'");
  CHECK(finished.status == 1);
  // The conflict speaks in the check's own unit: what the best design reaches, and what is asked.
  CHECK(finished.out.find("Failed most often: standby.power, by ") != std::string::npos);
  CHECK(finished.out.find(" where <= 50 mW is") != std::string::npos);
  const auto result = nlohmann::json::parse(shop.read("results/small/candidates.json"));
  CHECK(result["front"].empty());
  CHECK((result["status"] == "none found" || result["status"] == "proven none"));
  REQUIRE_FALSE(result["conflict"]["checks"].empty());
  const auto& worst = result["conflict"]["checks"][0];
  CHECK(worst["limit"] == 0.05);
  CHECK(worst["unit"] == "W");
  CHECK_THAT(worst["value"].get<double>() / 0.05 - 1,
             Catch::Matchers::WithinRel(worst["least_shortfall"].get<double>(), 1e-12));  // by definition
}

TEST_CASE("a place that cannot be written to is refused before the search") {
  const Workshop shop;
  shop.write("taken", "a file");
  const auto finished = shop.run("search " + kSmall + " --out taken/results");
  CHECK(finished.status == 3);
  CHECK(finished.out.empty());
  CHECK(finished.err.find("taken is a file, a folder is wanted") != std::string::npos);
}

TEST_CASE("one bad file among good ones: status 2, each mistake named, nothing written") {
  const Workshop shop;
  shop.write("bad.json", "{\"title\": \"x\", \"mians\": {}}");
  shop.write("worse.json", "{");
  const auto finished = shop.run("search " + kSmall + " bad.json worse.json missing.json");
  CHECK(finished.status == 2);
  CHECK(finished.out.empty());
  CHECK(std::count(finished.err.begin(), finished.err.end(), '\n') == 3);
  for (const char* word : {"bad.json", "mians", "mains", "worse.json", "missing.json"})
    CHECK(finished.err.find(word) != std::string::npos);
  CHECK_FALSE(shop.exists("results"));
}

TEST_CASE("two problems of one name would share a folder: status 2, nothing written") {
  const Workshop shop;
  const auto finished = shop.run("search " + kSmall + " ./" + kSmall);
  CHECK(finished.status == 2);
  CHECK(finished.err.find("small") != std::string::npos);
  CHECK_FALSE(shop.exists("results"));
}

TEST_CASE("a folder that holds something else is never replaced") {
  const Workshop shop;
  std::filesystem::create_directories(shop.path("out/small"));
  shop.write("out/small/notes.txt", "mine");
  const auto finished = shop.run("search " + kSmall + " --out out");
  CHECK(finished.status == 2);
  CHECK(finished.err.find("out/small") != std::string::npos);
  CHECK(shop.files_below("out") == std::vector<std::string>{"small/notes.txt"});
}

TEST_CASE("a disk that refuses is status 3") {
  const Workshop shop;
  shop.write("results", "a file where the folder should be");
  const auto finished = shop.run("search " + kSmall);
  CHECK(finished.status == 3);
  CHECK(finished.err.starts_with("error: "));
  CHECK(shop.read("results") == "a file where the folder should be");
}

TEST_CASE("an interrupted run ends with status 130 and what it found is written") {
  const Workshop shop;
  const auto finished = shop.run_interrupted({"search", kSmall, "problems/sensor-family.json"}, "Files: ");
  CHECK(finished.status == 130);
  CHECK(shop.exists("results/small/candidates.json"));
  for (const auto& file : shop.files_below("results")) {
    INFO(file);
    CHECK(file.find(".partial") == std::string::npos);
    if (!file.ends_with(".json")) continue;
    CHECK_FALSE(nlohmann::json::parse(shop.read("results/" + file)).empty());
  }
}

}  // namespace
}  // namespace dropfront::app
