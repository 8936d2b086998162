#include "dropfront/report/json_writer.hpp"

#include <cstdint>
#include <limits>
#include <nlohmann/json.hpp>

#include "dropfront/values/random.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

std::string sample() {
  JsonWriter json;
  json.begin_object();
  json.member("text", "a \"quoted\" \\ path\n\ttab \x01 µ");
  json.key("flat");
  json.begin_array(JsonWriter::Layout::flat);
  for (int i = 0; i < 3; ++i) json.value(i);
  json.begin_object();
  json.member("inner", true);
  json.end_object();
  json.end_array();
  json.key("empty");
  json.begin_object();
  json.end_object();
  json.member("absent", std::optional<double>{});
  json.member("not a number", std::numeric_limits<double>::quiet_NaN());
  json.key("document");
  json.document("{\n  \"x\": [1,\n 2]\n}\n");
  json.end_object();
  return json.take();
}

TEST_CASE("what is written parses, with keys in the order they were told") {
  const auto parsed = nlohmann::ordered_json::parse(sample());
  std::vector<std::string> keys;
  for (const auto& [key, value] : parsed.items()) keys.push_back(key);
  CHECK(keys == std::vector<std::string>{"text", "flat", "empty", "absent", "not a number", "document"});
  CHECK(parsed["text"] == "a \"quoted\" \\ path\n\ttab \x01 µ");
  CHECK(parsed["flat"][3]["inner"] == true);
  CHECK(parsed["empty"].is_object());
  CHECK(parsed["document"]["x"][1] == 2);
}

TEST_CASE("an absent number and one that is not finite are null") {
  const auto parsed = nlohmann::ordered_json::parse(sample());
  CHECK(parsed["absent"].is_null());
  CHECK(parsed["not a number"].is_null());
}

TEST_CASE("a flat container stays on one line") {
  CHECK(sample().find("\"flat\": [0, 1, 2, {\"inner\": true}],\n") != std::string::npos);
}

TEST_CASE("every finite double reads back as the same bits") {
  values::RandomStream random(7);
  for (int i = 0; i < 2000; ++i) {
    const double mantissa = 2 * random.uniform01() - 1;
    const double value = std::ldexp(mantissa, static_cast<int>(600 * random.uniform01()) - 300);
    const double back = nlohmann::json::parse(exact_text(value)).get<double>();
    REQUIRE(back == value);
  }
}

}  // namespace
}  // namespace dropfront::report
