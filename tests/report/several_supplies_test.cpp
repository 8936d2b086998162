// One design on several supplies, as the writers show it.
#include <nlohmann/json.hpp>

#include "dropfront/report/assess_text.hpp"
#include "dropfront/report/candidates_csv.hpp"
#include "dropfront/report/candidates_json.hpp"
#include "dropfront/report/score_json.hpp"
#include "dropfront/report/text_table.hpp"
#include "report/sample.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

using Json = nlohmann::ordered_json;

Sample on_three_supplies() {
  auto s = sample("leak-alarm", "bench-120v");
  s.file.problems.front().requirement.supplies = {
      {"japan", {95, 100, 107}, {49.8, 50, 50.2}, {}, false, false},
      {"america", {110, 120, 127}, {59.9, 60, 60.1}, {}, false, false},
      {"europe", {207, 230, 253}, {49.5, 50, 50.5}, {}, false, false}};
  return s;
}

scoring::Score whole_score(const Sample& s) {
  return scoring::score(s.design, s.problem().requirement, scoring::Depth::full);
}

TEST_CASE(
    "the assess document keys operating points by supply and says on which a check and an objective stand") {
  const auto s = on_three_supplies();
  const auto score = whole_score(s);
  const auto document = Json::parse(score_document(s.design, s.problem().requirement, score));
  for (const char* name : {"japan", "america", "europe"}) {
    REQUIRE(document["operation"].contains(name));
    CHECK(document["operation"][name].contains("standby_worst"));
  }
  CHECK(document["operation"].size() == 3);
  CHECK(document["decided_by"]["standby_loss_W"] == "europe");
  CHECK(document["decided_by"]["current_margin_A"] == "japan");
  for (const auto& check : document["checks"]) {
    INFO(check["id"]);
    CHECK(document["operation"].contains(check["at"]["supply"].get<std::string>()));
  }
}

TEST_CASE("the text names the supply that decides, and each check its own") {
  const auto s = on_three_supplies();
  std::string text = assess_text("t", s.design, s.problem().requirement, whole_score(s), {true, false});
  for (char& c : text)
    if (c == '\n') c = ' ';
  for (auto at = text.find("  "); at != std::string::npos; at = text.find("  ", at)) text.erase(at, 1);
  CHECK(text.find("on europe") != std::string::npos);
  CHECK(text.find("on japan") != std::string::npos);
  CHECK(text.find("at europe unplug") != std::string::npos);
}

TEST_CASE(
    "with several supplies candidates.csv and candidates.json name the ones that decide, with one they do "
    "not") {
  for (const bool several : {true, false}) {
    const auto s = several ? on_three_supplies() : sample("leak-alarm", "bench-120v");
    Result result;
    result.problem = &s.problem();
    Entry entry;
    entry.number = 1;
    entry.design = s.design;
    entry.tightest_check = "supply.margin";
    if (several) {
      entry.tightest_supply = entry.margin_supply = "japan";
      entry.standby_supply = "europe";
    }
    result.front.push_back(entry);
    const auto csv = candidates_csv(result);
    CHECK((csv.find("tightest_headroom,tightest_supply,standby_supply,margin_supply") != std::string::npos) ==
          several);
    CHECK((csv.find(",japan,europe,japan") != std::string::npos) == several);
    const auto document = Json::parse(candidates_json(result));
    CHECK(document["front"][0]["tightest"].contains("supply") == several);
  }
}

}  // namespace
}  // namespace dropfront::report
