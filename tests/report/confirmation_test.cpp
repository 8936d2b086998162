#include <nlohmann/json.hpp>
#include <sstream>

#include "dropfront/report/candidates_json.hpp"
#include "dropfront/report/confirm_ranked.hpp"
#include "dropfront/report/confirmation_text.hpp"
#include "dropfront/report/prices_text.hpp"
#include "dropfront/report/summary_text.hpp"
#include "dropfront/report/text_table.hpp"
#include "report/sample.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

using Json = nlohmann::ordered_json;

/// One ranked design of the shipped timer.
struct Single {
  Sample s = sample("towel-rail-timer", "towel-rail-timer");
  Result result;
  Single() {
    Entry entry;
    entry.number = 1;
    entry.design = s.design;
    entry.evidence = scoring::score(s.design, s.problem().requirement, scoring::Depth::full);
    entry.objectives = entry.evidence->objectives;
    result.problem = &s.problem();
    result.front.push_back(std::move(entry));
    result.ranked.push_back({"balanced", {1}});
  }
};

/// A finding as a search would make it: 2 mA by the corner, `inside` within the tolerances, 1 mA asked.
problem::Confirmation found(double inside_A) {
  problem::Confirmation confirmation;
  for (int q = 0; q < scoring::kBoxQuantities; ++q) {
    problem::BoxFinding finding;
    finding.quantity = static_cast<scoring::BoxQuantity>(q);
    confirmation.box.push_back(finding);
  }
  auto& margin = confirmation.box.front();
  margin.corner = 2e-3;
  margin.inside = inside_A;
  margin.corner_exceeded = inside_A < 2e-3;
  margin.limit = 1e-3;
  margin.pass = inside_A >= 1e-3;
  margin.where = {{"dropper_F", 0.4e-6}, {"ambient_degC", 0.0}};
  confirmation.evaluations = 60;
  return confirmation;
}

TEST_CASE("the confirmation stands in the evidence, null where none was made") {
  Single one;
  CHECK(Json::parse(candidates_json(one.result))["evidence"]["1"]["confirmation"].is_null());
  one.result.front.front().confirmation = found(1.5e-3);
  const auto written = Json::parse(candidates_json(one.result))["evidence"]["1"]["confirmation"];
  CHECK(written["corners_hold"] == false);
  CHECK(written["limits_hold"] == true);
  CHECK(written["sample"].is_null());
  const auto& margin = written["tolerance_box"][0];
  CHECK(margin["quantity"] == "supply.margin");
  CHECK(margin["corner"] == 2e-3);
  CHECK(margin["inside"] == 1.5e-3);
  CHECK(margin["headroom"] == 0.5);
  CHECK(margin["at"]["dropper_F"] == 0.4e-6);
}

TEST_CASE("a corner that was not the worst is told, and a limit that breaks inside the tolerances too") {
  Single one;
  one.result.front.front().confirmation = found(2e-3);
  CHECK(confirmation_text(one.result).find("none was found") != std::string::npos);
  one.result.front.front().confirmation = found(1.5e-3);
  const std::string worse = confirmation_text(one.result);
  CHECK(worse.find("supply.margin") != std::string::npos);
  CHECK(worse.find("1.5 mA") != std::string::npos);
  CHECK(worse.find("breaks") == std::string::npos);
  one.result.front.front().confirmation = found(0.5e-3);
  CHECK(confirmation_text(one.result).find("Design 1 breaks supply.margin") != std::string::npos);
  std::istringstream lines(summary_text(one.result));
  for (std::string line; std::getline(lines, line);) CHECK(display_width(line) <= kTextWidth);
}

TEST_CASE("confirming a ranked design leaves it the tighter of its headrooms") {
  Single one;
  Entry& entry = one.result.front.front();
  entry.tightest_check = "standby.power";
  entry.tightest_headroom = 10;  // so far beyond that anything found inside is nearer
  search::SearchOptions options;
  options.effort = search::Effort::quick;
  options.threads = 1;
  confirm_ranked(one.result, options);
  REQUIRE(entry.confirmation);
  CHECK(entry.confirmation->box.size() == scoring::kBoxQuantities);
  CHECK_FALSE(entry.confirmation->sample);  // not at this effort
  CHECK(entry.tightest_inside == !entry.confirmation->corners_hold());
  for (const auto& finding : entry.confirmation->box) {
    if (!finding.corner_exceeded || !finding.headroom()) continue;
    CHECK(*entry.tightest_headroom <= *finding.headroom());
  }
}

TEST_CASE("prices stand in the file and in the text, and say whether the front is proven") {
  Single one;
  Entry second = one.result.front.front();
  second.number = 2;
  second.objectives.cost_micro = *second.objectives.cost_micro + 50'000;
  second.objectives.current_margin_A = *second.objectives.current_margin_A + 2e-3;
  one.result.front.push_back(std::move(second));
  const std::string text = prices_text(one.result);
  // 0.05 for 2 mA, by construction.
  CHECK(text.find("0.0250") != std::string::npos);
  CHECK(text.find("not proven") != std::string::npos);
  const auto prices = Json::parse(candidates_json(one.result))["prices"];
  REQUIRE(prices.size() == 1);
  CHECK(prices[0]["objective"] == "current_margin");
  CHECK(prices[0]["steps"][0]["from"] == 1);
  CHECK_THAT(prices[0]["steps"][0]["price"].get<double>(), Catch::Matchers::WithinAbs(0.025, 1e-9));
  one.result.front.pop_back();
  CHECK(prices_text(one.result).empty());
}

TEST_CASE("a conflict names its limits with what each would take, in the file and in the text") {
  Single one;
  one.result.front.clear();
  one.result.ranked.clear();
  one.result.status = Status::none_found;
  Result::Explained explained;
  problem::ConflictLimit limit;
  for (const auto& knob : problem::limit_knobs())
    if (knob.key == "limits.standby_power") limit.knob = &knob;
  REQUIRE(limit.knob);
  limit.asked = 0.25;
  limit.needed = 0.371;
  limit.droppable = limit.proven = true;
  explained.set.limits.push_back(limit);
  explained.set.proven = true;
  explained.designs.push_back(one.s.design);
  one.result.explained = explained;
  const std::string text = summary_text(one.result);
  CHECK(text.find("One limit alone cannot be kept") != std::string::npos);
  CHECK(text.find("0.371 W") != std::string::npos);
  const auto conflict = Json::parse(candidates_json(one.result))["conflict"];
  CHECK(conflict["proven"] == true);
  CHECK(conflict["limits"][0]["limit"] == "limits.standby_power");
  CHECK(conflict["limits"][0]["needed"] == 0.371);
  CHECK(conflict["limits"][0]["design"].is_object());
  CHECK(Json::parse(candidates_json(Single().result))["conflict"].is_null());
}

}  // namespace
}  // namespace dropfront::report
