#include "dropfront/report/assess_text.hpp"

#include <sstream>

#include "dropfront/report/text_table.hpp"
#include "report/sample.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

std::string text_of(const AssessTextOptions& options) {
  const auto s = sample("leak-alarm", "bench-120v");
  const auto& need = s.problem().requirement;
  return assess_text(s.problem().title, s.design, need, scoring::score(s.design, need, scoring::Depth::full),
                     options);
}

TEST_CASE("the text fits its width with and without reasons, and always warns") {
  for (const bool explain : {false, true}) {
    std::istringstream stream(text_of({explain, false}));
    for (std::string line; std::getline(stream, line);) {
      INFO(line);
      CHECK(display_width(line) <= kTextWidth);
    }
    CHECK(text_of({explain, false}).find("mains potential") != std::string::npos);
  }
}

TEST_CASE("reasons come only when asked for") {
  CHECK(text_of({true, false}).size() > text_of({false, false}).size());
}

TEST_CASE("colour marks what fails and changes nothing else") {
  const std::string plain = text_of({false, false});
  std::string coloured = text_of({false, true});
  CHECK(plain.find('\x1b') == std::string::npos);
  CHECK(plain.find("FAILS") != std::string::npos);  // this bench supply misses the standby limit
  CHECK(coloured.find("\x1b[31mFAILS\x1b[0m") != std::string::npos);
  for (const std::string code : {"\x1b[31m", "\x1b[0m"})
    for (auto at = coloured.find(code); at != std::string::npos; at = coloured.find(code))
      coloured.erase(at, code.size());
  CHECK(coloured == plain);
}

TEST_CASE("a missing rating is 'not given', never a pass") {
  const auto s = sample("leak-alarm", "bench-120v");
  scoring::Score score;
  scoring::Check check;
  check.id = "clamp.pulse";
  check.value = 0.5;
  score.checks.push_back(check);
  const std::string text = assess_text("t", s.design, s.problem().requirement, score);
  CHECK(text.find("not given") != std::string::npos);
  CHECK(text.find("holds") == std::string::npos);
}

}  // namespace
}  // namespace dropfront::report
