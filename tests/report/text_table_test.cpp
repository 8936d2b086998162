#include "dropfront/report/text_table.hpp"

#include <sstream>

#include "dropfront/values/random.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

std::vector<std::string> lines_of(const std::string& text) {
  std::istringstream stream(text);
  std::vector<std::string> lines;
  for (std::string line; std::getline(stream, line);) lines.push_back(line);
  return lines;
}

/// Words of random lengths, some longer than a line, with letters of two bytes among them.
std::string random_words(values::RandomStream& random, int count) {
  std::string text;
  for (int i = 0; i < count; ++i) {
    if (i > 0) text += ' ';
    const int length = 1 + static_cast<int>(random.uniform01() * (i % 7 == 0 ? 140 : 14));
    for (int k = 0; k < length; ++k) text += k % 3 == 0 ? "µ" : "x";
  }
  return text;
}

TEST_CASE("wrapped lines are never wider than a text may be, and no letter is lost") {
  values::RandomStream random(3);
  for (int i = 0; i < 50; ++i) {
    const std::string words = random_words(random, 1 + i);
    std::string joined;
    for (const auto& line : lines_of(wrapped(words, "  - "))) {
      CHECK(display_width(line) <= kTextWidth);
      joined += line.substr(4);
    }
    const auto without_spaces = [](std::string text) {
      text.erase(std::remove(text.begin(), text.end(), ' '), text.end());
      return text;
    };
    CHECK(without_spaces(joined) == without_spaces(words));
  }
}

TEST_CASE("a cell too wide for its text goes on below itself, broken between words") {
  TextTable table({"name", ">value", "remark"});
  std::string remark = "begin";
  for (int i = 0; i < 30; ++i) remark += " word" + std::to_string(i);
  table.row({"part", "12", remark});
  table.row({std::string(150, 'n'), "12", "short"});
  table.note(std::string(300, 'z'), 6);
  const std::string text = table.text();
  for (const auto& line : lines_of(text)) CHECK(display_width(line) <= kTextWidth);
  std::istringstream words(remark);
  for (std::string word; words >> word;) CHECK(text.find(word) != std::string::npos);
  CHECK(std::count(text.begin(), text.end(), 'n') >= 150);
}

TEST_CASE("columns line up under their headings, flush right where asked") {
  TextTable table({"slot", ">mA"}, 0);
  table.row({"µ", "1.5"});
  table.row({"dropper", "10"});
  CHECK(table.text() == "slot      mA\nµ        1.5\ndropper   10\n");
}

TEST_CASE("clipping counts characters, not bytes") {
  CHECK(clipped("µµµµ", 4) == "µµµµ");
  CHECK(clipped("µµµµµ", 4) == "µµ..");
}

}  // namespace
}  // namespace dropfront::report
