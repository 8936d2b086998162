#include <nlohmann/json.hpp>

#include "app/program.hpp"
#include "support/catch.hpp"

namespace dropfront::app {
namespace {

const std::string kAlarm = "problems/leak-alarm.json";
const std::string kBench = "problems/designs/bench-120v.json";

TEST_CASE("assess --json prints the document and nothing else; the status follows the verdict") {
  const Workshop shop;
  const auto finished = shop.run("assess " + kAlarm + " --design " + kBench + " --json");
  CHECK(finished.err.empty());
  const auto document = nlohmann::ordered_json::parse(finished.out);
  CHECK(document["verdict"] == "breaks limits");
  CHECK(finished.status == 1);
  CHECK_FALSE(document["cautions"].empty());
}

TEST_CASE("a shipped bill of materials by part names complies with its problem") {
  const Workshop shop;
  const auto finished =
      shop.run("assess problems/towel-rail-timer.json --design problems/designs/towel-rail-timer.json");
  CHECK(finished.status == 0);
  CHECK(finished.out.find("Verdict: compliant") != std::string::npos);
}

TEST_CASE("with several supplies the operation is told apart by their names") {
  const Workshop shop;
  const auto finished =
      shop.run("assess " + kAlarm + " --design " + kBench +
               " --json --set 'mains=[{\"name\": \"here\", \"voltage\": \"120 V\", \"frequency\": \"60 Hz\"},"
               " {\"name\": \"there\", \"voltage\": \"127 V\", \"frequency\": \"60 Hz\"}]'");
  INFO(finished.err);
  REQUIRE(finished.status <= 1);
  const auto operation = nlohmann::ordered_json::parse(finished.out)["operation"];
  REQUIRE(operation.size() == 2);
  CHECK(operation["here"].contains("lean_cold"));
  CHECK(operation["there"].contains("standby_worst"));
}

TEST_CASE("a mistake in the design file is status 2, named with file and place") {
  const Workshop shop;
  auto design = nlohmann::ordered_json::parse(shop.read(kBench), nullptr, true, true);
  design["arrangement"] = "half-wave-clamp-ahed";
  shop.write("design.json", design.dump());
  const auto finished = shop.run("assess " + kAlarm + " --design design.json");
  CHECK(finished.status == 2);
  CHECK(finished.out.empty());
  CHECK(finished.err.find("design.json:1:") != std::string::npos);
  CHECK(finished.err.find("half-wave-clamp-ahead") != std::string::npos);
}

TEST_CASE("a study asks which of its problems is meant") {
  const Workshop shop;
  const std::string study = "problems/sensor-family.json --design " + kBench;
  const auto asked = shop.run("assess " + study);
  CHECK(asked.status == 2);
  CHECK(asked.err.find("--combination") != std::string::npos);
  CHECK(shop.run("assess " + study + " --combination 2").status == 1);
  CHECK(shop.run("assess " + study + " --combination 5").status == 2);
}

}  // namespace
}  // namespace dropfront::app
