#include "dropfront/problem/document.hpp"

#include <nlohmann/json.hpp>
#include <string>
#include <vector>

#include "dropfront/values/input_error.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using problem::canonical_json;
using problem::Node;
using problem::parse_document;

namespace {

std::string refusal(const std::string& text) {
  try {
    parse_document(text, "f.json");
  } catch (const values::InputError& error) {
    return error.what();
  }
  return "accepted";
}

}  // namespace

TEST_CASE("every value knows the line and column it begins at, columns counted in characters") {
  const Node root = parse_document("{\n  \"µ\": 1, \"b\": [\n 2, \"x\"]\n}", "f.json");
  CHECK(root.place.line == 1);
  CHECK(root.keys[0].place.column == 3);
  CHECK(root.items[0].place.column == 8);  // µ is two bytes and one character
  CHECK(root.keys[1].place.column == 11);
  CHECK(root.items[1].items[1].place.line == 3);
  CHECK(root.items[1].items[1].place.column == 5);
}

TEST_CASE("comments run from // to the end of the line and nowhere else") {
  CHECK(canonical_json(parse_document("// head\n[1, // one\n\"a//b\"]// end", "f")) == "[1,\"a//b\"]");
  CHECK(refusal("[1 /* no */]").find("f.json:1:4: found '/*'; comments start with //") == 0);
}

TEST_CASE("what the grammar of RFC 8259 forbids is refused with its place") {
  const std::vector<std::pair<std::string, std::string>> table{
      {"", "f.json:1:1: found the end of the file; a value belongs here"},
      {"[1,]", "f.json:1:4: found ']' after a comma"},
      {"{\"a\": 1,}", "f.json:1:9: found '}' after a comma"},
      {"{\"a\" 1}", "f.json:1:6: found '1' after the key \"a\"; ':' belongs here"},
      {"{a: 1}", "f.json:1:2: found 'a'; a key in double quotes belongs here"},
      {"[1 2]", "f.json:1:4: found '2'; ',' or ']' belongs here, for the '[' opened at 1:1"},
      {"{\"a\": 1\n",
       "f.json:2:1: found the end of the file; ',' or '}' belongs here, for the '{' opened at 1:1"},
      {"[01]", "f.json:1:2: a number must not begin with a further 0"},
      {"[1.]", "f.json:1:4: found ']'; a digit belongs here"},
      {"[-]", "a digit belongs here"},
      {"[+1]", "f.json:1:2: found '+'; a value belongs here"},
      {"[1e999]", "f.json:1:2: the number 1e999 is out of range"},
      {"[NaN]", "f.json:1:2: found 'N'; a value belongs here"},
      {"['a']", "a value belongs here (texts take double quotes)"},
      {"\"abc", "f.json:1:1: this text has no closing double quote on its line"},
      {"\"a\nb\"", "f.json:1:1: this text has no closing double quote on its line"},
      {"\"a\tb\"", "f.json:1:3: a control character stands in a text"},
      {"\"\\q\"", "f.json:1:2: unknown escape"},
      {"\"\\u12x4\"", "f.json:1:2: \\u needs four hexadecimal digits"},
      {"\"\\ud800\"", "f.json:1:2: half of a surrogate pair"},
      {"\"\xC3\x28\"", "f.json:1:2: these bytes are not valid UTF-8"},
      {"{} {}", "f.json:1:4: found '{' after the end of the value"},
  };
  for (const auto& row : table) {
    INFO(row.first);
    CHECK(refusal(row.first).find(row.second) != std::string::npos);
  }
}

TEST_CASE("a key that stands twice in one object is refused, both places named") {
  CHECK(refusal("{\"a\": 1,\n \"b\": 2, \"a\": 3}") ==
        "f.json:2:10: the key \"a\" stands twice in this object, first at 1:2");
  CHECK(refusal("{\"a\": {\"a\": 1}}") == "accepted");
}

TEST_CASE("nesting has an end before the stack has") {
  CHECK(refusal(std::string(64, '[') + std::string(64, ']')) == "accepted");
  CHECK(refusal(std::string(100000, '[')).find("nested deeper than 64 levels") != std::string::npos);
}

// Outside reference: nlohmann-json, an independent parser of the same standard.
TEST_CASE("an independent JSON parser agrees on what is valid and what it says") {
  const std::vector<std::string> texts{"null",
                                       "true",
                                       "false",
                                       "0",
                                       "-0",
                                       "-0.0",
                                       "1e5",
                                       "1E+2",
                                       "12.5e-3",
                                       "\"\"",
                                       "\"\\u00e9\\n\\\"\\\\\\/\"",
                                       "\"\\ud83d\\ude00\"",
                                       "[]",
                                       "{}",
                                       "[1,[2,[3]]]",
                                       "{\"a\":{\"b\":[true,null]}}",
                                       " [ 1 , 2 ] ",
                                       "\"\xC3\xA9\"",
                                       "tru",
                                       "nul",
                                       "falsey",
                                       "[",
                                       "]",
                                       "{",
                                       "\"",
                                       "1.",
                                       ".5",
                                       "1e",
                                       "--1",
                                       "[1,,2]",
                                       "{\"a\"}",
                                       "{\"a\":}",
                                       "{1:2}",
                                       "[\"\\x\"]",
                                       "\"\\ud83d\"",
                                       "\"\\ude00\"",
                                       "\"\xFF\"",
                                       "\"\xED\xA0\x80\"",
                                       "\"\xC0\xAF\"",
                                       "4.9e-324",
                                       "1.7976931348623157e308",
                                       "0.1",
                                       "123456789012345678"};
  for (const std::string& text : texts) {
    INFO(text);
    const auto theirs = nlohmann::ordered_json::parse(text, nullptr, false);
    CHECK(theirs.is_discarded() == (refusal(text) != "accepted"));
    if (theirs.is_discarded()) continue;
    const auto ours = nlohmann::ordered_json::parse(canonical_json(parse_document(text, "f")));
    CHECK(ours == theirs);
  }
}

TEST_CASE("canonical text keeps the order of keys and drops spelling") {
  CHECK(canonical_json(parse_document("{ \"b\" : 1.0e0, // x\n \"a\" : [ 0.10, \"\\u0041\" ] }", "f")) ==
        "{\"b\":1,\"a\":[0.1,\"A\"]}");
  const std::string once = canonical_json(parse_document("{\"t\":\"\\u0001\\t\\\"\",\"n\":1e-7}", "f"));
  CHECK(canonical_json(parse_document(once, "f")) == once);
}
