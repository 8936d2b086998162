// What a JSON Schema cannot say: each rule listed in the schemas has one file here that the schema accepts
// and the reader refuses.
#include <fmt/format.h>

#include <map>
#include <set>

#include "problem/fixture.hpp"
#include "problem/schema_validator.hpp"
#include "support/catch.hpp"

using namespace dropfront::problem::testing;

namespace {

struct Broken {
  const char* rule;  ///< the words before the colon in the schema's list
  const char* from;
  const char* to;
  const char* fragment;
};

const char* const kLists = "[\"lists\"]";

/// The good problem with one key added at the end.
#define ADD(key) kLists, "[\"lists\"], " key

const std::vector<Broken> kProblemRules{
    {"quantity", "\"50 Hz\"", "\"50 V\"", "50 V"},
    {"quantity", "\"50 Hz\"", "\"0 Hz\"", "at least 10 Hz"},
    {"spread", "\"207 V\"", "\"231 V\"", "low <= nominal <= high"},
    {"spread", "\"50 Hz\"", "{\"low\": 50, \"nominal\": 51, \"high\": 50.5}", "low <= nominal <= high"},
    {"supply names",
     "{\"voltage\": {\"low\": \"207 V\", \"nominal\": \"230 V\", \"high\": \"253 V\"}, \"frequency\": \"50 "
     "Hz\"}",
     "[{\"name\": \"a\", \"voltage\": 230, \"frequency\": 50}, {\"name\": \"a\", \"voltage\": 120, "
     "\"frequency\": 60}]",
     "two supplies named \"a\""},
    {"harmonic orders", "\"50 Hz\"",
     "\"50 Hz\", \"harmonics\": [{\"order\": 3, \"percent\": 1}, {\"order\": 3, \"percent\": 2}]",
     "order 3 twice"},
    {"phases", "\"50 Hz\"", "\"50 Hz\", \"phases\": \"as given\"", "without harmonics"},
    {"waveform", "\"50 Hz\"",
     "\"50 Hz\", \"harmonics\": [{\"order\": 3, \"percent\": 33.3}, {\"order\": 5, \"percent\": 20}, "
     "{\"order\": 7, \"percent\": 14.3}]",
     "square or stepped wave"},
    {"load names", "\"awake\"", "\"asleep\"", "two loads named \"asleep\""},
    {"load above zero",
     "{\"name\": \"asleep\", \"current\": \"0.2 mA\"}, {\"name\": \"awake\", \"current\": \"8 mA\"}",
     "{\"name\": \"asleep\", \"current\": 0}, {\"name\": \"relay\", \"at\": \"rail\", \"current\": \"8 mA\"}",
     "at least one is needed"},
    {"burst", "\"8 mA\"}",
     "\"8 mA\"}, {\"name\": \"pulse\", \"current\": 1, \"for\": \"3 s\", \"every\": \"2 s\"}",
     "a burst not longer than its period"},
    {"standby load", "\"5 V\"", "\"5 V\", \"standby_load\": \"aslep\"", "did you mean 'asleep'?"},
    {"standby load", "\"8 mA\"}]",
     "\"8 mA\"}, {\"name\": \"fan\", \"at\": \"rail\", \"current\": 0.01}], "
     "\"standby_load\": \"fan\"",
     "a load at the output without \"for\""},
    {"ambient", ADD("\"surroundings\": {\"ambient\": {\"high\": \"20 °C\"}}"), "low <= nominal <= high"},
    {"mean over life", ADD("\"surroundings\": {\"ambient\": {\"mean_over_life\": \"70 °C\"}}"),
     "from low 0 °C to high 50 °C"},
    {"folders", kLists, "[\"lists\", \"lists/../lists\"]", "twice"},
    {"folders", kLists, "\"absent\"", "no such folder"},
    {"part names", ADD("\"slots\": {\"clamp\": {\"only\": \"z11\"}}"), "did you mean 'z12'?"},
    {"varistor",
     ADD("\"slots\": {\"varistor\": {\"only\": {\"continuous_voltage\": 130, \"clamp_voltage\": 340}}}"),
     "clamps at 340 V; allowed: above the crest of the highest line"},
    {"slots column", ADD("\"slots\": {\"discharge\": {\"only\": [\"fuse-47R\"]}}"), "column `slots`"},
    {"family range",
     ADD("\"slots\": {\"clamp\": {\"series\": \"E24\", \"from\": 9, \"to\": 5, \"like\": \"z12\"}}"),
     "from <= to"},
    {"where range", ADD("\"slots\": {\"clamp\": {\"where\": {\"voltage\": {\"min\": 9, \"max\": 8}}}}"),
     "min <= max"},
    {"inline part",
     ADD("\"slots\": {\"output_stage\": {\"only\": {\"kind\": \"step-down\", \"output_voltage\": 5, "
         "\"tolerance\": 0.01, \"efficiency\": 0.8, \"input_min\": 3}}}"),
     "input_min"},
    {"slot not empty", ADD("\"slots\": {\"reservoir\": {\"where\": {\"rated_voltage\": \"400 V\"}}}"),
     "no part of this slot"},
    {"yardstick alone", ADD("\"slots\": {\"arrangement\": [\"resistive\", \"bridge-clamp-across\"]}"),
     "searched alone"},
    {"output band", "\"5 V\"", "\"5.2 V\", \"tolerance\": \"1 %\"", "offered are stages of 3.3 V or 5 V"},
    {"study keys", ADD("\"vary\": {\"output.volts\": [3.3, 5]}"), "unknown key \"volts\""},
    {"study keys", ADD("\"vary\": {\"output.voltage.low\": [3.3, 5]}"), "holds no keys"},
};

const std::vector<Broken> kDesignRules{
    {"quantity", "\"z12\"",
     "{\"voltage\": \"12 A\", \"tolerance\": 0.05, \"test_current\": 0.02, \"slope_resistance\": 9}", "12 A"},
    {"part names", "\"z12\"", "\"z13\"", "did you mean 'z12'?"},
    {"inline part", "\"lin-5\"",
     "{\"kind\": \"step-down\", \"output_voltage\": 5, \"tolerance\": 0.01, \"efficiency\": "
     "0.8, \"input_min\": 3}",
     "input_min"},
    {"dropper", "\"dropper\": \"film-470n\",", "", "dropper"},
    {"unused slot", "half-wave-clamp-ahead", "resistive", "has no dropper"},
    {"varistor", "\"z12\"", "\"z12\", \"varistor\": {\"continuous_voltage\": 130, \"clamp_voltage\": 340}",
     "clamps at 340 V; allowed: above the crest of the highest line"},
    {"unused slot", "\"z12\"", "\"z12\", \"gate_resistor\": \"any-1k\"", "has no gate_resistor"},
};

const char* const kDesign = R"({"arrangement": "half-wave-clamp-ahead", "dropper": "film-470n",
  "series_resistor": "fuse-100R", "clamp": "z12", "reservoir": "e220u-35", "rectifier": "d1000",
  "output_stage": "lin-5"})";

std::set<std::string> listed(const Schemas& schemas, const char* file) {
  std::set<std::string> rules;
  for (const auto& rule : schemas.document(file).at("x-cross-field-rules")) {
    const std::string text = rule;
    rules.insert(text.substr(0, text.find(':')));
  }
  return rules;
}

}  // namespace

TEST_CASE("every listed rule of the problem's schema refuses a file that the schema accepts") {
  const Schemas schemas(std::string(DROPFRONT_SOURCE_DIR) + "/docs");
  const Bench bench;
  std::set<std::string> tested{"duplicate keys", "study size"};  // their own cases below
  for (const Broken& broken : kProblemRules) {
    const std::string text = with(kProblem, broken.from, broken.to);
    INFO(broken.rule << ": " << text);
    CHECK(schemas.accepts("problem.schema.json", Json::parse(text, nullptr, true, true)));
    const std::string message = bench.refusal(text);
    INFO(message);
    CHECK(message.find(broken.fragment) != std::string::npos);
    tested.insert(broken.rule);
  }
  CHECK(tested == listed(schemas, "problem.schema.json"));
}

TEST_CASE("every listed rule of the design's schema refuses a file that the schema accepts") {
  const Schemas schemas(std::string(DROPFRONT_SOURCE_DIR) + "/docs");
  const Bench bench;
  auto problem = bench.problem();
  std::set<std::string> tested{"duplicate keys"};
  for (const Broken& broken : kDesignRules) {
    const std::string text = with(kDesign, broken.from, broken.to);
    INFO(broken.rule << ": " << text);
    CHECK(schemas.accepts("design.schema.json", Json::parse(text)));
    bench.write("design.json", text);
    std::string message = "accepted";
    try {
      dropfront::problem::read_design_file(bench.path("design.json"), problem);
    } catch (const dropfront::values::InputError& error) {
      message = error.what();
    }
    INFO(message);
    CHECK(message.find(broken.fragment) != std::string::npos);
    tested.insert(broken.rule);
  }
  CHECK(tested == listed(schemas, "design.schema.json"));
}

TEST_CASE("a study of more than a thousand combinations is refused before it is made") {
  std::string values = "[1";
  for (int i = 2; i <= 40; ++i) values += ", " + std::to_string(i);
  values += "]";
  const Bench bench;
  const std::string vary = fmt::format("[\"lists\"], \"vary\": {{\"volume\": {0}, \"seed\": {0}}}", values);
  CHECK(bench.refusal(with(kProblem, kLists, vary)).find("more than 1000 combinations") != std::string::npos);
}

TEST_CASE("a key that stands twice in a problem is refused, never the last one taken") {
  const Bench bench;
  CHECK(bench.refusal(with(kProblem, kLists, "[\"lists\"], \"title\": \"again\"")) ==
        "bench.json:5:23: the key \"title\" stands twice in this object, first at 2:3");
}

TEST_CASE("good files of every section are accepted by reader and schema alike") {
  const Schemas schemas(std::string(DROPFRONT_SOURCE_DIR) + "/docs");
  const Bench bench;
  for (const std::string& text : {std::string(kProblem), with(kProblem, kLists, kEverySection)}) {
    CHECK(bench.refusal(text) == "accepted");
    CHECK(schemas.accepts("problem.schema.json", Json::parse(text, nullptr, true, true)));
  }
}
