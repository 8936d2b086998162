#include "dropfront/report/proof_json.hpp"

#include <limits>
#include <nlohmann/json.hpp>

#include "report/sample.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

nlohmann::json written(const Result& result) {
  JsonWriter json;
  write_proof(json, result);
  return nlohmann::json::parse(json.take());
}

/// leak-alarm asks for standby loss, cost and area, in this order.
Result sample_result(const Sample& s) {
  Result result;
  result.problem = &s.problem();
  result.check_names = {"clamp.power", "rail.max"};
  search::Proof proof;
  proof.space = 1000;
  proof.broken = {{0, 300, 0}, {0, 0, 0}};
  proof.dominated = {100, 0, 40};
  proof.reduced = {0, 500, 0};
  proof.undefined = 10;
  proof.scored = 50;
  proof.boxes = 7;
  proof.complete = true;
  result.proof = proof;
  return result;
}

TEST_CASE("a certificate lists what was discarded, by limit and class, and the counts add up to the space") {
  const Sample s = sample("leak-alarm", "bench-120v");
  const auto json = written(sample_result(s));
  CHECK(json["complete"] == true);
  CHECK(json["method"] == "branch and bound");
  CHECK(json["weakest_class"] == "monotone by test");
  CHECK(json["open"].is_null());
  double sum = json["scored"].get<double>();
  for (const auto& discard : json["discarded"]) sum += discard["designs"].get<double>();
  CHECK(sum == json["space"].get<double>());
  CHECK(json["discarded"][0] ==
        nlohmann::json({{"why", "clamp.power"}, {"class", "theorem"}, {"designs", 300}}));
}

TEST_CASE("an open proof says what is left and what it could hold at best, unknown as null") {
  const Sample s = sample("leak-alarm", "bench-120v");
  Result result = sample_result(s);
  result.proof->complete = false;
  result.proof->left = 20;
  result.proof->open_boxes = 3;
  result.proof->open_bounds = {0.25, 0.5, -std::numeric_limits<double>::infinity()};
  const auto open = written(result)["open"];
  CHECK(open["designs"] == 20);
  CHECK(open["boxes"] == 3);
  CHECK(open["at_best"]["standby_loss_W"] == 0.25);
  CHECK(open["at_best"]["cost"] == 0.5);
  CHECK(open["at_best"]["board_area_mm2"].is_null());
  CHECK(open["at_best"]["current_margin_A"].is_null());
}

TEST_CASE("no proof is null") {
  const Sample s = sample("leak-alarm", "bench-120v");
  Result result = sample_result(s);
  result.proof.reset();
  CHECK(written(result).is_null());
  CHECK_FALSE(proven(result));
}

}  // namespace
}  // namespace dropfront::report
