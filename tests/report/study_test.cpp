#include "dropfront/report/study.hpp"

#include <nlohmann/json.hpp>

#include "dropfront/report/outputs.hpp"
#include "report/sample.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

Entry entry(int number, std::int64_t cost_micro, double margin_A) {
  Entry e;
  e.number = number;
  e.objectives.cost_micro = cost_micro;
  e.objectives.current_margin_A = margin_A;
  return e;
}

struct Studied {
  Sample s = sample("towel-rail-timer", "towel-rail-timer");
  Study study;
  Studied() {
    Result result;
    result.problem = &s.problem();
    result.front = {entry(1, 700000, 0.002), entry(2, 500000, 0.001)};
    for (auto& e : result.front) e.design = s.design;
    result.ranked = {{"cheapest", {2, 1}}};
    study = {"family", "A family", "1.2.3", {}, {"a caution"}};
    study.combinations.push_back({"01-3.3-V", {{"output.voltage", "3.3 V"}}, result});
    study.combinations.push_back({"02-5-V", {{"output.voltage", "5 V"}}, std::nullopt});
  }
};

TEST_CASE("folders are numbered and hold safe characters only") {
  CHECK(combination_folder(1, {{"output.voltage", "3.3 V"}}) == "01-3.3-V");
  CHECK(combination_folder(12, {{"a", "5 %"}, {"b", "../x"}}) == "12-5---..-x");
}

TEST_CASE("the best of an objective is least, of the margin greatest") {
  const Studied t;
  const Result& result = *t.study.combinations[0].result;
  CHECK(best_on_front(result, scoring::Objective::cost) == 0.5);
  CHECK(best_on_front(result, scoring::Objective::current_margin) == 0.002);
  CHECK_FALSE(best_on_front(result, scoring::Objective::standby_loss));
}

TEST_CASE("a study's files say the same in JSON, CSV and text") {
  const Studied t;
  const auto document = nlohmann::json::parse(study_json(t.study));
  CHECK(document["combinations"][0]["values"]["output.voltage"] == "3.3 V");
  CHECK(document["combinations"][0]["best"]["cost"] == 0.5);
  CHECK(document["combinations"][0]["best"]["standby_loss_W"].is_null());
  CHECK(document["combinations"][1]["status"] == "not searched");
  CHECK(study_csv(t.study) ==
        "folder,output.voltage,status,front,currency,least_cost,least_standby_loss_W,least_board_area_mm2,"
        "most_current_margin_A\n"
        "01-3.3-V,3.3 V,done,2,EUR,0.5,,,0.002\n"
        "02-5-V,5 V,not searched,0,,,,,\n");
  const std::string text = study_text(t.study);
  CHECK(text.find("not searched") != std::string::npos);
  CHECK(text.find("a caution") != std::string::npos);
}

TEST_CASE("combinations that were not searched get no folder") {
  const Studied t;
  for (const auto& file : study_files(t.study)) CHECK_FALSE(file.path.starts_with("02-5-V"));
}

}  // namespace
}  // namespace dropfront::report
