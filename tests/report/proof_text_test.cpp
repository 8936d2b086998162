#include "dropfront/report/proof_text.hpp"

#include "report/sample.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

Result sample_result(const Sample& s, bool complete, bool found) {
  Result result;
  result.problem = &s.problem();
  search::Proof proof;
  proof.space = 1e6;
  proof.broken = {{0, 900'000, 0}};
  proof.dominated = {99'990, 0, 0};
  proof.scored = 10;
  proof.complete = complete;
  if (!complete) {
    proof.scored = 4;
    proof.left = 6;
    proof.open_boxes = 2;
    proof.open_bounds = {0.25, 0.5, 400};
  }
  result.proof = proof;
  if (found) result.front.resize(1);
  return result;
}

TEST_CASE("a complete proof claims no more than the lists, and names its weakest reasoning") {
  const Sample s = sample("leak-alarm", "bench-120v");
  const std::string text = proof_text(sample_result(s, true, true));
  CHECK(text.find("Proven: nothing in these lists does better") == 0);
  CHECK(text.find("90.00 % break a limit") != std::string::npos);
  CHECK(text.find("Weakest reasoning used: theorem") != std::string::npos);
  CHECK(proof_text(sample_result(s, true, false)).find("Proven: no design in these lists complies") == 0);
}

TEST_CASE("an open proof says so first, with what the open designs could reach") {
  const Sample s = sample("leak-alarm", "bench-120v");
  const std::string text = proof_text(sample_result(s, false, true));
  CHECK(text.find("Not proven: 6 designs in 2 boxes are still open") == 0);
  INFO(text);
  CHECK(text.find("standby 0.25 W, cost 0.500 EUR, area 400 mm2") != std::string::npos);
  Result none = sample_result(s, false, true);
  none.proof.reset();
  CHECK(proof_text(none).empty());
}

}  // namespace
}  // namespace dropfront::report
