// One mistake a row: the expected place and a fragment of the message.
#include <algorithm>
#include <string>
#include <vector>

#include "problem/fixture.hpp"
#include "problem/schema_validator.hpp"
#include "support/catch.hpp"

using namespace dropfront::problem::testing;

namespace {

struct Mistake {
  const char* from;     ///< text of the good problem
  const char* to;       ///< what stands there instead; an @ (taken out) marks where the message must point
  const char* pointer;  ///< the JSON pointer it must name
  const char* fragment;
  bool reader_only = false;  ///< the JSON Schema lets it pass (the cross-field rules it lists)
};

/// "line:column" of the @ in `text`, which is taken out; "1:1" where there is none.
std::string take_mark(std::string& text) {
  const std::size_t at = text.find('@');
  if (at == std::string::npos) return "1:1";
  text.erase(at, 1);
  const std::string before = text.substr(0, at);
  const auto line = 1 + std::count(before.begin(), before.end(), '\n');
  return std::to_string(line) + ":" + std::to_string(at - before.rfind('\n'));
}

void expect_refusals(const std::vector<Mistake>& mistakes) {
  const Schemas schemas(std::string(DROPFRONT_SOURCE_DIR) + "/docs");
  const Bench bench;
  REQUIRE(bench.refusal(kProblem) == "accepted");
  for (const Mistake& mistake : mistakes) {
    std::string text = with(kProblem, mistake.from, mistake.to);
    std::string place = "bench.json:" + take_mark(text) + ": ";
    if (*mistake.pointer) place += std::string(mistake.pointer) + ": ";
    const std::string message = bench.refusal(text);
    INFO(mistake.to << " -> " << message);
    CHECK(message.substr(0, place.size()) == place);
    CHECK(message.find(mistake.fragment) != std::string::npos);
    CHECK(message.find('\n') == std::string::npos);
    CHECK(schemas.accepts("problem.schema.json", Json::parse(text, nullptr, true, true)) ==
          mistake.reader_only);
  }
}

}  // namespace

TEST_CASE("unknown and missing keys are refused with their place and the nearest known name") {
  expect_refusals({
      {"\"title\"", "@\"titel\"", "", "unknown key \"titel\" in problem (did you mean 'title'?)"},
      {"\"frequency\"", "@\"frequncy\"", "/mains", "did you mean 'frequency'?"},
      {"\"low\"", "@\"lo\"", "/mains/voltage", "allowed: low, nominal or high"},
      {"{\"low\": \"207 V\", ", "@{", "/mains/voltage", "the key \"low\" is missing in spread"},
      {"\"mains\": {\"voltage\": {\"low\": \"207 V\", \"nominal\": \"230 V\", \"high\": \"253 V\"}, "
       "\"frequency\": \"50 Hz\"}",
       "\"mains\": @{\"voltage\": \"230 V\"}", "/mains", "\"frequency\" is missing"},
      {"\"current\": \"8 mA\"", "@\"curent\": \"8 mA\"", "/output/loads/1", "did you mean 'current'?"},
      {"\"title\": \"bench\", // a comment", "", "", "the key \"title\" is missing in problem"},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {@\"standby\": 1}", "/limits",
       "did you mean 'standby_power'?"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {@\"zener\": {}}", "/slots", "unknown key \"zener\""},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {@\"count\": 2}}", "/slots/clamp",
       "unknown key \"count\""},
      {"[\"lists\"]", "[\"lists\"], \"derating\": {@\"resistor\": 0.6}", "/derating",
       "did you mean 'resistor.power'?"},
  });
}

TEST_CASE("values of the wrong type or kind are refused with what is allowed") {
  expect_refusals({
      {"\"bench\"", "@5", "/title", "found the number 5; allowed: a text in double quotes"},
      {"\"bench\"", "@\"\"", "/title", "found an empty text"},
      {"\"207 V\"", "@\"207 A\"", "/mains/voltage/low", "207 A", true},
      {"\"207 V\"", "@true", "/mains/voltage/low", "found true; allowed: a voltage such as"},
      {"\"207 V\"", "@[207]", "/mains/voltage/low", "found a list"},
      {"\"207 V\"", "@null", "/mains/voltage/low", "found null"},
      {"\"207 V\"", "@\"-207 V\"", "/mains/voltage/low", "above 0 V", true},
      {"\"50 Hz\"", "@\"50 kHz\"", "/mains/frequency", "at most 1 kHz", true},
      {"\"8 mA\"", "@\"8 mV\"", "/output/loads/1/current", "8 mV", true},
      {"\"8 mA\"", "@\"-8 mA\"", "/output/loads/1/current", "at least 0 A", true},
      {"\"5 V\"", "\"5 V\", \"tolerance\": @5", "/output/tolerance", "at most 50 %"},
      {"[\"lists\"]", "@7", "/parts", "a text in double quotes"},
      {"[\"lists\"]", "@[]", "/parts", "found an empty list; allowed: a list of folders"},
      {"[\"lists\"]", "[\"lists\"], \"volume\": @3.7", "/volume",
       "found the number 3.7; allowed: a whole number from 1"},
      {"[\"lists\"]", "[\"lists\"], \"volume\": @\"many\"", "/volume", "a whole number"},
      {"[\"lists\"]", "[\"lists\"], \"seed\": @-1", "/seed", "a whole number from 0"},
      {"[\"lists\"]", "[\"lists\"], \"effort\": @\"deeep\"", "/effort", "did you mean 'deep'?"},
      {"[\"lists\"]", "[\"lists\"], \"limits\": @[]", "/limits",
       "found an empty list; allowed: an object {} with standby_power"},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"series_rated\": @1}", "/limits/series_rated",
       "true or false"},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"dips\": [{\"residual\": @\"120 %\", \"cycles\": 1}]}",
       "/limits/dips/0/residual", "at most 100 %", true},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"surge\": {\"voltage\": @\"0 V\"}}",
       "/limits/surge/voltage", "above 0 V", true},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"surge\": {\"voltage\": @\"-1 kV\"}}",
       "/limits/surge/voltage", "above 0 V", true},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"surge\": {\"voltage\": 1000, \"source\": @0}}",
       "/limits/surge/source", "at least 1 mohm"},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"fast_burst\": @0}", "/limits/fast_burst", "above 0 V"},
      {"[\"lists\"]", "[\"lists\"], \"connection\": {\"chatter\": @0}", "/connection/chatter",
       "from 1 to 20"},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"dips\": [{\"residual\": @-0.1, \"cycles\": 1}]}",
       "/limits/dips/0/residual", "at least 0 %"},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"dips\": [{\"residual\": 0, \"cycles\": @0}]}",
       "/limits/dips/0/cycles", "above 0"},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"dips\": @[]}", "/limits/dips", "found an empty list"},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"start_time\": @0}", "/limits/start_time", "above 0 s"},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"start_time\": @\"-1 s\"}", "/limits/start_time",
       "above 0 s", true},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"start_time\": @\"1 h\"}", "/limits/start_time",
       "at most 10 min", true},
      {"\"8 mA\"", "\"8 mA\", \"for\": @0", "/output/loads/1/for", "above 0 s"},
      {"\"8 mA\"", "\"8 mA\", \"every\": @\"1 s\"", "/output/loads/1/every", "without \"for\""},
      {"\"8 mA\"", "\"8 mA\", \"min_voltage\": @\"9 V\"", "/output/loads/1/min_voltage", "at the output"},
      {"\"8 mA\"", "\"8 mA\", \"for\": \"3 s\", \"every\": @\"2 s\"", "/output/loads/1/every",
       "a burst not longer than its period", true},
      {"[\"lists\"]", "[\"lists\"], \"limits\": {\"discharge\": @{\"voltage\": \"34 V\"}}",
       "/limits/discharge", "\"after\" is missing"},
      {"[\"lists\"]", "[\"lists\"], \"surroundings\": {\"life\": @\"10 V\"}", "/surroundings/life", "10 V",
       true},
      {"[\"lists\"]", "[\"lists\"], \"surroundings\": {\"material_group\": @\"IIIA\"}",
       "/surroundings/material_group", "did you mean 'IIIa'?"},
      {"[\"lists\"]", "[\"lists\"], \"surroundings\": {\"pollution_degree\": @4}",
       "/surroundings/pollution_degree", "from 1 to 3"},
      {"[\"lists\"]", "[\"lists\"], \"connection\": {\"kind\": @\"plugged\"}", "/connection/kind",
       "did you mean 'plug'?"},
      {"[\"lists\"]", "[\"lists\"], \"objectives\": [@\"price\"]", "/objectives/0",
       "allowed: cost, standby_loss, board_area or current_margin"},
      {"[\"lists\"]", "[\"lists\"], \"missing_ratings\": @\"ignore\"", "/missing_ratings",
       "allowed: refuse or accept"},
      {"[\"lists\"]", "[@\"list\"]", "/parts/0", "there is no such folder", true},
  });
}

TEST_CASE("mistakes in slots are refused with their place") {
  expect_refusals({
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {\"only\": [@\"z13\"]}}", "/slots/clamp/only/0",
       "did you mean 'z12'?", true},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {\"only\": [@7]}}", "/slots/clamp/only/0",
       "a part's name or an object"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {\"only\": [@{\"voltage\": \"12 V\"}]}}",
       "/slots/clamp/only/0", "missing"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {\"only\": [{\"voltage\": @\"12 A\"}]}}",
       "/slots/clamp/only/0/voltage", "12 A"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {\"only\": [{\"voltge\": @12}]}}",
       "/slots/clamp/only/0/voltge", "did you mean 'voltage'?"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {\"except\": [@\"z99\"]}}",
       "/slots/clamp/except/0", "found \"z99\"", true},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {\"except\": @[\"z6v8\", \"z12\", \"z24\"]}}",
       "/slots/clamp/except", "no part of this slot is left", true},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {\"where\": {@\"volts\": 12}}}",
       "/slots/clamp/where/volts", "clamps.csv has no column \"volts\""},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {\"where\": @{\"voltage\": \"99 V\"}}}",
       "/slots/clamp/where", "no part of this slot meets these conditions", true},
      {"[\"lists\"]",
       "[\"lists\"], \"slots\": {\"clamp\": {\"where\": {\"voltage\": @{\"min\": 9, \"max\": 8}}}}",
       "/slots/clamp/where/voltage", "min <= max", true},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": {\"where\": {\"voltage\": {@\"least\": 9}}}}",
       "/slots/clamp/where/voltage", "allowed: min or max"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"dropper\": {\"where\": {\"series_rated\": @\"yes\"}}}",
       "/slots/dropper/where/series_rated", "true or false"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"clamp\": @{\"series\": \"E24\"}}", "/slots/clamp",
       "\"series\", \"from\", \"to\" and \"like\" together"},
      {"[\"lists\"]",
       "[\"lists\"], \"slots\": {\"clamp\": {\"series\": @\"E25\", \"from\": 5, \"to\": 9, \"like\": "
       "\"z12\"}}",
       "/slots/clamp/series", "did you mean 'E24'?"},
      {"[\"lists\"]",
       "[\"lists\"], \"slots\": {\"clamp\": {\"series\": \"E24\", \"from\": 9, \"to\": @5, \"like\": "
       "\"z12\"}}",
       "/slots/clamp/to", "from <= to", true},
      {"[\"lists\"]",
       "[\"lists\"], \"slots\": {\"clamp\": {\"series\": @\"E3\", \"from\": 5, \"to\": 9, \"like\": "
       "\"z12\"}}",
       "/slots/clamp/series", "no value of this series", true},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"series_resistor\": {\"only\": @\"chip-220k\"}}",
       "/slots/series_resistor/only", "does not name this slot", true},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"discharge\": {\"count\": [1, @1]}}",
       "/slots/discharge/count/1", "found twice"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"discharge\": {\"count\": @0}}", "/slots/discharge/count",
       "from 1 to 20"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"series_resistor\": {\"split\": @3}}",
       "/slots/series_resistor/split", "from 1 to 2"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"dropper\": {\"parallel\": @0}}", "/slots/dropper/parallel",
       "from 1 to 2"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"arrangement\": @[\"resistive\", \"bridge-clamp-across\"]}",
       "/slots/arrangement", "is searched alone", true},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"arrangement\": @\"bridge-clamp-acros\"}",
       "/slots/arrangement", "did you mean 'bridge-clamp-across'?"},
      {"[\"lists\"]", "[\"lists\"], \"slots\": {\"varistor\": @{}}", "/slots/varistor",
       "varistors.csv is empty or not there", true},
      {"\"5 V\"", "\"9 V\"", "/slots", "no output stage stays with its tolerance inside 9 V +/- 5 %", true},
  });
}

TEST_CASE("a mistake in a parts list names its file, line, column and value") {
  const Bench bench;
  bench.write("lists/clamps.csv",
              "part,voltage,tolerance,test_current,slope_resistance\nz1,12 W,5 %,21 mA,9 R\n");
  const std::string message = bench.refusal(kProblem);
  INFO(message);
  CHECK(message.find("clamps.csv:2") != std::string::npos);
  CHECK(message.find("12 W") != std::string::npos);
}

TEST_CASE("a problem that is no object, or not there, is refused") {
  const Bench bench;
  CHECK(bench.refusal("[]").find("bench.json:1:1: found an empty list; allowed: an object {} with title") ==
        0);
  CHECK_THROWS_AS(dropfront::problem::read_problem_file(bench.path("absent.json")),
                  dropfront::values::InputError);
}
