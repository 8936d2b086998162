#include "dropfront/report/second_sources.hpp"

#include "report/sample.hpp"
#include "support/catch.hpp"

namespace dropfront::report {
namespace {

/// The timer's problem with one more rectifier on offer, a copy of the design's own changed by `change`.
template <typename Change>
std::vector<Entry::Alternative> with_other_rectifier(const Change& change) {
  auto s = sample("towel-rail-timer", "towel-rail-timer");
  parts::Rectifier other = *s.design.rectifier;
  other.info.name = "another maker's";
  change(other);
  s.file.problems.front().offers.rectifiers.push_back(&other);
  return SecondSources(s.problem()).of(s.design);
}

TEST_CASE("a part with equal values and another name is a second source") {
  const auto found = with_other_rectifier([](parts::Rectifier&) {});
  REQUIRE(found.size() == 1);
  CHECK(found[0].slot == "rectifier");
  CHECK(found[0].parts == std::vector<std::string>{"another maker's"});
}

TEST_CASE("a part that differs in one value is none, nor is one without a rating the other has") {
  CHECK(with_other_rectifier([](parts::Rectifier& r) { r.threshold_voltage_V *= 1 + 1e-12; }).empty());
  CHECK(with_other_rectifier([](parts::Rectifier& r) { r.surge_current_A.reset(); }).empty());
}

TEST_CASE("a cheaper or smaller equal part is a design of its own, not a second source") {
  CHECK(with_other_rectifier([](parts::Rectifier& r) { r.info.price_breaks = {{1, 1}}; }).empty());
  CHECK(with_other_rectifier([](parts::Rectifier& r) { *r.info.length_um -= 1; }).empty());
}

}  // namespace
}  // namespace dropfront::report
