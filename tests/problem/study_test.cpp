#include "dropfront/problem/study.hpp"

#include <set>

#include "problem/fixture.hpp"
#include "support/catch.hpp"

using namespace dropfront::problem::testing;
using namespace dropfront;

namespace {

std::string vary(const std::string& axes) {
  return with(kProblem, "[\"lists\"]", "[\"lists\"], \"vary\": " + axes);
}

}  // namespace

TEST_CASE("vary makes one problem a combination, the first key slowest") {
  const Bench bench;
  const auto file = bench.read(
      vary(R"({"output.voltage": ["3.3 V", 5], "limits.standby_power": ["0.5 W", "1 W", "2 W"]})"));
  CHECK(file.study);
  REQUIRE(file.problems.size() == 6);
  REQUIRE(file.variations.size() == 6);
  CHECK(file.variations[1] ==
        problem::Variation{{"output.voltage", "3.3 V"}, {"limits.standby_power", "1 W"}});
  CHECK(file.variations[3] == problem::Variation{{"output.voltage", "5"}, {"limits.standby_power", "0.5 W"}});
  CHECK(file.problems[2].requirement.output.voltage_V == 3.3);
  CHECK(file.problems[2].requirement.limits.standby_power_W.value() == 2);
  CHECK(names_of(file.problems[0].offers.output_stages) == std::vector<std::string>{"lin-3v3"});
  // The text of each is a problem of its own: reading it again gives the same text.
  for (const auto& one : file.problems) {
    const auto again = bench.read(one.text);
    CHECK_FALSE(again.study);
    CHECK(again.problems[0].text == one.text);
  }
}

TEST_CASE("a problem without vary is no study") {
  const Bench bench;
  const auto file = bench.read();
  CHECK_FALSE(file.study);
  CHECK(file.problems.size() == 1);
  CHECK(file.variations.empty());
}

TEST_CASE("mistakes of a study name the place in vary") {
  const Bench bench;
  const std::vector<std::pair<std::string, std::string>> table{
      {"[]", "bench.json:5:31: /vary: found an empty list; allowed: an object {}"},
      {"{}", "/vary: found an object; allowed: an object {} of dotted keys"},
      {R"({"output.voltage": "5 V"})",
       "bench.json:5:50: /vary/output.voltage: found the text \"5 V\"; allowed: a list of values"},
      {R"({"output.voltage": []})", "an empty list"},
      {R"({"output.voltage": [5, 5]})", "found twice"},
      {R"({"output.volts": [5]})", "bench.json:5:49: /output: unknown key \"volts\""},
      {R"({"output.voltage": ["5 A"]})", "bench.json:5:51: /output/voltage: "},
      {R"({"output.loads.9.current": [1]})", "output.loads has 2 entries and none is called \"9\""},
      {R"({"vary.volume": [1]})", "a study cannot vary itself"},
      {R"({"output..voltage": [1]})", "a part of the dotted key is empty"},
  };
  for (const auto& row : table) {
    const std::string message = bench.refusal(vary(row.first));
    INFO(row.first << " -> " << message);
    CHECK(message.find(row.second) != std::string::npos);
  }
}

TEST_CASE("--set replaces and adds keys, in objects, lists and derating") {
  const Bench bench;
  const auto p = bench.problem({"output.voltage=3.3 V", "limits.standby_power=0.3 W", "volume=50",
                                "output.loads.awake.current=5 mA", "output.loads.0.current=1e-4",
                                "derating.resistor.power=0.5",
                                "mains.voltage={\"low\": 110, \"nominal\": 120, \"high\": 127}",
                                "limits.series_rated=true", "title=\"7\""});
  CHECK(p.requirement.output.voltage_V == 3.3);
  CHECK(p.requirement.limits.standby_power_W.value() == 0.3);
  CHECK(p.requirement.volume == 50);
  CHECK(p.requirement.output.loads[1].current_A == 5e-3);
  CHECK(p.requirement.output.loads[0].current_A == 1e-4);
  CHECK(p.requirement.derating.resistor_power == 0.5);
  CHECK(p.requirement.supplies[0].voltage_Vrms.nominal == 120);
  CHECK(p.requirement.limits.series_rated);
  CHECK(p.title == "7");
  CHECK(p.text.find("\"standby_power\":\"0.3 W\"") != std::string::npos);
}

TEST_CASE("--set of a varied key ends its variation") {
  const Bench bench;
  const std::string text = vary(R"({"output.voltage": ["3.3 V", "5 V"], "volume": [100, 1000]})");
  CHECK(bench.read(text, {"output.voltage=5 V"}).problems.size() == 2);
  const auto one = bench.read(text, {"output.voltage=5 V", "volume=7"});
  CHECK_FALSE(one.study);
  CHECK(one.problems.at(0).requirement.volume == 7);
}

TEST_CASE("mistakes of --set say that they come from there") {
  const Bench bench;
  CHECK(bench.refusal(kProblem, {"volume"}) ==
        "bench.json:--set volume: allowed: key=value, such as output.voltage=5");
  CHECK(
      bench.refusal(kProblem, {"output.volts=5"}).find("bench.json:--set: /output: unknown key \"volts\"") ==
      0);
  CHECK(bench.refusal(kProblem, {"output.voltage=5 A"}).find("bench.json:--set: /output/voltage: ") == 0);
  CHECK(bench.refusal(kProblem, {"title.text=5"}).find("title is the text \"bench\", which holds no keys") !=
        std::string::npos);
  CHECK(bench.refusal(kProblem, {"limits={\"a\":}"}).find("a value belongs here") != std::string::npos);
}

TEST_CASE("the problem's name is its file's, made safe, and inputs carry hashes") {
  const Bench bench;
  bench.write("my problem (2).json", kProblem);
  const auto file = problem::read_problem_file(bench.path("my problem (2).json"));
  CHECK(file.name == "my-problem--2-");
  CHECK(file.title == "bench");
  const auto& inputs = file.problems[0].inputs;
  REQUIRE(inputs.size() == 7);
  CHECK(inputs[0].name == "my problem (2).json");
  CHECK(inputs[1].name == "lists/droppers.csv");
  std::set<std::string> hashes;
  for (const auto& input : inputs) {
    CHECK(input.hash.size() == 16);
    hashes.insert(input.hash);
  }
  CHECK(hashes.size() == inputs.size());
  bench.write("lists/clamps.csv",
              std::string(kClamps) + "z15,15 V,5 %,17 mA,14 R,1.3 W,60 W,1 ms,0.03,4.2,2.6,2.6\n");
  const auto changed = problem::read_problem_file(bench.path("my problem (2).json")).problems[0].inputs;
  for (std::size_t i = 0; i < inputs.size(); ++i) {
    CHECK((changed[i].hash == inputs[i].hash) == (inputs[i].name != "lists/clamps.csv"));
  }
}
