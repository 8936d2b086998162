#include <nlohmann/json.hpp>
#include <sstream>

#include "dropfront/report/candidates_csv.hpp"
#include "dropfront/report/candidates_json.hpp"
#include "dropfront/report/make_result.hpp"
#include "dropfront/report/outputs.hpp"
#include "dropfront/report/summary_text.hpp"
#include "dropfront/report/text_table.hpp"
#include "report/sample.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

using Json = nlohmann::ordered_json;

std::vector<std::string> keys_of(const Json& object) {
  std::vector<std::string> keys;
  for (const auto& [key, value] : object.items()) keys.push_back(key);
  return keys;
}

std::vector<std::string> lines_of(const std::string& text) {
  std::istringstream stream(text);
  std::vector<std::string> lines;
  for (std::string line; std::getline(stream, line);) lines.push_back(line);
  return lines;
}

/// A result as a search of three choices would give it: one on the front, one off it, a limit that conflicts.
struct Made {
  Sample s;
  std::unique_ptr<problem::BoundProblem> bound;
  Result result;
};

Made made(bool nothing_complies) {
  Made m{sample("towel-rail-timer", "towel-rail-timer"), nullptr, {}};
  m.bound = problem::bind(m.s.problem());
  const auto slots = m.bound->space().slots.size();
  search::Choice first(slots, 0), second(slots, 0);
  for (std::size_t i = 0; i < slots; ++i)
    if (m.bound->space().slots[i].size > 1) second[i] = 1;
  search::SearchOutcome outcome;
  outcome.counts = {3600, 10, 400, 20, 2};
  outcome.tallies.resize(m.bound->check_names().size());
  outcome.tallies[0] = {7, 0.25, first};
  outcome.tallies[1] = {9, 0.5, second};
  outcome.near_misses.push_back({second, 1, 0.03});
  if (!nothing_complies) {
    outcome.front.push_back({first, {}, true});
    outcome.ranked.push_back({"objective 0", {{first, {}, true}, {second, {}, false}}});
    outcome.ranked.push_back({"objective 2", {{first, {}, true}}});
    outcome.ranked.push_back({"balanced", {{first, {}, true}}});
  }
  m.result = make_result(*m.bound, outcome, {}, "9.8.7");
  return m;
}

TEST_CASE("candidates.json has the promised keys in their order") {
  const auto m = made(false);
  const auto document = Json::parse(candidates_json(m.result));
  CHECK(keys_of(document) == std::vector<std::string>{"format", "title", "name", "status", "problem",
                                                      "provenance", "counts", "proof", "front", "ranked",
                                                      "extras", "arrangements", "evidence", "near_misses",
                                                      "prices", "conflict", "cautions"});
  CHECK(document["name"] == "towel-rail-timer");
  CHECK(document["status"] == "done");
  CHECK(document["problem"]["title"] == document["title"]);
  CHECK(document["provenance"]["version"] == "9.8.7");
  CHECK(keys_of(document["front"][0]) ==
        std::vector<std::string>{"number", "on_front", "design", "objectives", "tightest", "alternatives"});
  CHECK(keys_of(document["front"][0]["objectives"]) ==
        std::vector<std::string>{"cost", "standby_loss_W", "board_area_mm2", "current_margin_A"});
}

TEST_CASE("ranked sets are named by their objective and point at entries with evidence") {
  const auto m = made(false);
  const auto document = Json::parse(candidates_json(m.result));
  // The problem's objectives are cost, standby loss and current margin, in that order.
  CHECK(keys_of(document["ranked"]) == std::vector<std::string>{"cheapest", "most_margin", "balanced"});
  CHECK(document["ranked"]["cheapest"] == Json({1, 2}));
  CHECK(document["extras"][0]["number"] == 2);
  CHECK(document["extras"][0]["on_front"] == false);
  for (const auto& [set, numbers] : document["ranked"].items())
    for (const int number : numbers) {
      const auto& evidence = document["evidence"][std::to_string(number)];
      CHECK(keys_of(evidence) == std::vector<std::string>{"design", "verdict", "objectives",
                                                          "current_margin_new_A", "current_margin_zero_year",
                                                          "current_margin_horizon_years", "operation",
                                                          "checks", "faults", "cautions", "confirmation"});
    }
}

TEST_CASE("the evidence of a check holds what the interface promises") {
  const auto m = made(false);
  const auto document = Json::parse(candidates_json(m.result));
  const auto& checks = document["evidence"]["1"]["checks"];
  REQUIRE(checks.size() > 10);
  for (const auto& check : checks) {
    auto keys = keys_of(check);
    if (!keys.empty() && keys.back() == "figures") keys.pop_back();  // a yes or no takes none
    CHECK(keys == std::vector<std::string>{"id", "value", "limit", "unit", "side", "headroom", "pass", "at",
                                           "basis", "formula"});
    CHECK_FALSE(check["formula"].get<std::string>().empty());
    CHECK((check["side"] == "<=" || check["side"] == ">="));
  }
  const auto& operation = document["evidence"]["1"]["operation"];
  CHECK(keys_of(operation) == std::vector<std::string>{"nominal", "lean_cold", "lean_hot", "rich_empty",
                                                       "rich_loaded", "standby", "standby_worst"});
  for (const char* key : {"load_current_A", "rail_current_A", "ends", "rail_min_V", "rail_max_V",
                          "rail_mean_V", "ripple_Vpp", "input_power_W", "input_current_Arms",
                          "apparent_power_VA", "power_factor", "available_current_A", "losses_W"})
    CHECK(operation["nominal"].contains(key));
}

TEST_CASE("the losses of an operating point add up to its input power") {
  const auto m = made(false);
  const auto document = Json::parse(candidates_json(m.result));
  for (const auto& [corner, point] : document["evidence"]["1"]["operation"].items()) {
    INFO(corner);
    double sum_W = 0;
    for (const auto& [slot, loss] : point["losses_W"].items()) sum_W += loss.get<double>();
    // The engine's energy law holds to 1e-6 of the input power.
    CHECK_THAT(sum_W, Catch::Matchers::WithinRel(point["input_power_W"].get<double>(), 2e-6));
  }
}

TEST_CASE("a row of candidates.csv a design, as many cells as headings") {
  const auto m = made(false);
  const auto lines = lines_of(candidates_csv(m.result));
  REQUIRE(lines.size() == 3);
  CHECK(lines[0] ==
        "number,on_front,arrangement,dropper,series_resistor,clamp,reservoir,discharge,discharge_count,"
        "rectifier,"
        "output_stage,varistor,fuse,ceramic,thyristor,gate_resistor,cost_EUR,standby_loss_W,board_area_mm2,"
        "current_margin_A,tightest_check,tightest_headroom");
  const auto commas = [](const std::string& line) { return std::count(line.begin(), line.end(), ','); };
  CHECK(commas(lines[1]) == commas(lines[0]));  // no part of these lists has a comma in its name
  CHECK(lines[1].starts_with("1,true,half-wave-clamp-ahead,"));
  CHECK(lines[2].starts_with("2,false,half-wave-clamp-ahead,"));
}

TEST_CASE("a bill lists the pieces of each set's first design, and they cost what the score says") {
  auto m = made(false);
  const auto lines = lines_of(bom_csv(m.result));
  REQUIRE(lines.size() > 1);
  CHECK(lines[0] ==
        "set,number,slot,part,value,quantity,unit_price_EUR,price_EUR,length_mm,width_mm,height_mm,source");
  double sum = 0;
  int pieces = 0;
  for (const auto& line : lines) {
    if (!line.starts_with("cheapest,")) continue;
    std::istringstream cells(line);
    std::vector<std::string> cell;
    for (std::string text; std::getline(cells, text, ',');) cell.push_back(text);
    pieces += std::stoi(cell[5]);
    sum += std::stod(cell[7]);
  }
  const auto& entry = m.result.front.front();
  const double placing = 0.004 * pieces;  // placement_cost of the problem, every piece placed once
  // Prices are whole millionths; twenty sums of doubles stay within 1e-12.
  CHECK_THAT(sum + placing,
             Catch::Matchers::WithinAbs(static_cast<double>(*entry.objectives.cost_micro) / 1e6, 1e-9));
}

TEST_CASE("where nothing complies, the text names the limit broken most often and by how little") {
  const auto m = made(true);
  CHECK(m.result.status == Status::none_found);
  const std::string text = summary_text(m.result);
  const std::string check = m.bound->check_names()[1];
  CHECK(text.find("Failed most often: " + check + ", by 9 designs; the best of them ") != std::string::npos);
  const auto document = Json::parse(candidates_json(m.result));
  CHECK(document["status"] == "none found");
  CHECK(document["conflict"]["checks"][0]["check"] == check);
  CHECK(document["near_misses"][0]["shortfall"] == 0.03);
  CHECK(document["front"].empty());
}

TEST_CASE("a search that its effort ended says so, one that ran out of designs does not") {
  auto m = made(false);
  CHECK(summary_text(m.result).find("The normal effort was spent") != std::string::npos);
  m.result.closed = true;
  CHECK(summary_text(m.result).find("effort was spent") == std::string::npos);
}

TEST_CASE("every text output fits its width and warns; none of them calls a design safe or approved") {
  for (const bool nothing : {false, true}) {
    const auto m = made(nothing);
    for (const auto& file : result_files(m.result)) {
      INFO(file.path);
      if (file.path == "summary.txt")
        for (const auto& line : lines_of(file.content)) CHECK(display_width(line) <= kTextWidth);
      if (!file.path.ends_with(".csv")) CHECK(file.content.find("mains potential") != std::string::npos);
      CHECK(file.content.find("safe ") == std::string::npos);
      CHECK(file.content.find("approved") == std::string::npos);
      CHECK(file.content.find("\x1b") == std::string::npos);
    }
  }
}

TEST_CASE("the result does not depend on the number of threads") {
  auto m = made(false);
  search::SearchOutcome outcome;
  const search::Choice choice(m.bound->space().slots.size(), 0);
  outcome.front.push_back({choice, {}, true});
  search::SearchOptions one, two;
  one.threads = 1;
  two.threads = 2;
  CHECK(candidates_json(make_result(*m.bound, outcome, one, "1")) ==
        candidates_json(make_result(*m.bound, outcome, two, "1")));
}

}  // namespace
}  // namespace dropfront::report
