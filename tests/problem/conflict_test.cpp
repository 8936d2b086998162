#include "dropfront/problem/conflict.hpp"

#include <algorithm>

#include "dropfront/problem/slot_space.hpp"
#include "dropfront/scoring/score.hpp"
#include "problem/fixture.hpp"
#include "support/catch.hpp"

namespace dropfront::problem {
namespace {

/// A small space in which much current and little standby are asked for at once.
Problem torn(const testing::Bench& bench) {
  return bench.problem(
      {"limits.standby_power=0.6 W", "limits.current_margin=100 %",
       "slots.arrangement=[\"half-wave-clamp-ahead\"]", "slots.output_stage={\"only\":[\"lin-5\"]}",
       "slots.reservoir={\"only\":[\"e220u-35\",\"e470u-35\"]}",
       "slots.series_resistor={\"only\":[\"fuse-100R\"]}", "slots.clamp={\"only\":[\"z6v8\",\"z12\"]}",
       "slots.discharge={\"only\":[\"chip-220k\"],\"count\":[2]}", "missing_ratings=accept",
       "limits.discharge=none"});
}

/// Whether any design of the space complies with `requirement`: every one is scored.
bool any_complies(const Problem& problem, const scoring::Requirement& requirement) {
  const SlotSpace slots = make_space(problem.offers);
  search::Choice choice(slots.space.slots.size(), 0);
  const scoring::Scorer scorer(requirement);
  while (true) {
    const auto score = scorer.score(design_of(problem.offers, slots.ids, choice), scoring::Depth::compliant);
    if (score.complete && score.verdict == scoring::Verdict::compliant) return true;
    std::size_t s = choice.size();
    while (s > 0 && ++choice[s - 1] == slots.space.slots[s - 1].size) choice[--s] = 0;
    if (s == 0) return false;
  }
}

const ConflictLimit* find_limit(const ConflictSet& set, std::string_view key) {
  for (const auto& limit : set.limits)
    if (limit.knob->key == key) return &limit;
  return nullptr;
}

void set_value(scoring::Requirement& requirement, const LimitKnob& knob, double value) {
  if (knob.key == "limits.standby_power") requirement.limits.standby_power_W = value;
  if (knob.key == "limits.current_margin") requirement.limits.current_margin = value;
}

TEST_CASE("two limits that cannot hold together are named, each with the least that gives way") {
  const testing::Bench bench;
  const Problem problem = torn(bench);
  REQUIRE_FALSE(any_complies(problem, problem.requirement));
  const ConflictSet set = explain_conflict(problem, {});
  CHECK(set.proven);
  CHECK(set.every_design);
  REQUIRE(set.limits.size() == 2);
  for (const char* key : {"limits.standby_power", "limits.current_margin"}) {
    INFO(key);
    const ConflictLimit* limit = find_limit(set, key);
    REQUIRE(limit);
    REQUIRE(limit->needed);
    CHECK_FALSE(keeps(*limit->knob, *limit->needed, limit->asked));
    // Every design scored again: at that value one complies, a hair nearer to what is asked none does.
    auto relaxed = problem.requirement;
    const double away = limit->knob->at_most ? 1 : -1;
    set_value(relaxed, *limit->knob, *limit->needed + away * 1e-9);
    CHECK(any_complies(problem, relaxed));
    set_value(relaxed, *limit->knob, *limit->needed - away * 1e-6);
    CHECK_FALSE(any_complies(problem, relaxed));
    // The design that comes with it is one of those.
    const SlotSpace slots = make_space(problem.offers);
    set_value(relaxed, *limit->knob, *limit->needed + away * 1e-9);
    REQUIRE(limit->choice);
    CHECK(scoring::score(design_of(problem.offers, slots.ids, *limit->choice), relaxed,
                         scoring::Depth::compliant)
              .verdict == scoring::Verdict::compliant);
  }
}

TEST_CASE(
    "a set that cannot hold stays so with all other limits gone, and holds without any one of its own") {
  const testing::Bench bench;
  const Problem problem = torn(bench);
  const ConflictSet set = explain_conflict(problem, {});
  const auto widened_but = [&](const std::vector<const LimitKnob*>& kept) {
    auto requirement = problem.requirement;
    for (const LimitKnob& knob : limit_knobs())
      if (knob.asked(requirement) && std::find(kept.begin(), kept.end(), &knob) == kept.end())
        knob.widen(requirement);
    return requirement;
  };
  std::vector<const LimitKnob*> all;
  for (const auto& limit : set.limits) all.push_back(limit.knob);
  CHECK_FALSE(any_complies(problem, widened_but(all)));
  for (const LimitKnob* knob : all) {
    std::vector<const LimitKnob*> others;
    for (const LimitKnob* other : all)
      if (other != knob) others.push_back(other);
    INFO("without " << knob->key);
    CHECK(any_complies(problem, widened_but(others)));
  }
}

TEST_CASE("searches find the same set and the same values as looking at every design") {
  const testing::Bench bench;
  const Problem problem = torn(bench);
  search::SearchOptions options;
  options.threads = 1;
  const ConflictSet every = explain_conflict(problem, options);
  const ConflictSet searched = explain_conflict(problem, options, 0);
  CHECK_FALSE(searched.every_design);
  CHECK(searched.proven);  // spaces as small as this are enumerated
  REQUIRE(searched.limits.size() == every.limits.size());
  for (std::size_t i = 0; i < every.limits.size(); ++i) {
    CHECK(searched.limits[i].knob == every.limits[i].knob);
    CHECK(searched.limits[i].needed == every.limits[i].needed);
  }
}

TEST_CASE("where parts and ratings stand in the way no limit is blamed") {
  const testing::Bench bench;
  Problem problem = torn(bench);
  problem.requirement.supplies.front().voltage_Vrms = {900, 1000, 1100};  // ten times beyond every rating
  const ConflictSet set = explain_conflict(problem, {});
  CHECK(set.limits.empty());
  CHECK(set.proven);
}

TEST_CASE("a limit that no design reaches alone is a conflict of one") {
  const testing::Bench bench;
  Problem problem = torn(bench);
  problem.requirement.limits.current_margin = 0;
  problem.requirement.limits.standby_power_W = 0.01;
  const ConflictSet set = explain_conflict(problem, {});
  REQUIRE(set.limits.size() == 1);
  CHECK(set.limits.front().knob->key == "limits.standby_power");
  REQUIRE(set.limits.front().needed);
  CHECK(*set.limits.front().needed > 0.01);
}

TEST_CASE("told to stop, nothing is claimed") {
  const testing::Bench bench;
  const Problem problem = torn(bench);
  const std::atomic<bool> stop{true};
  search::SearchOptions options;
  options.stop = &stop;
  CHECK_FALSE(explain_conflict(problem, options).proven);
  CHECK_FALSE(explain_conflict(problem, options, 0).proven);
}

TEST_CASE("every widened limit keeps its check or drops it, and asks no less than before") {
  const testing::Bench bench;
  Problem problem =
      bench.problem({}, testing::with(testing::kProblem, R"(["lists"])", testing::kEverySection));
  int asked = 0;
  for (const LimitKnob& knob : limit_knobs()) {
    INFO(knob.key);
    const auto before = knob.asked(problem.requirement);
    if (!before) continue;
    ++asked;
    auto wide = problem.requirement;
    knob.widen(wide);
    const auto after = knob.asked(wide);
    if (after) CHECK(keeps(knob, *before, *after));
    CHECK((after || knob.needed == nullptr));
  }
  CHECK(asked == static_cast<int>(limit_knobs().size()));
}

}  // namespace
}  // namespace dropfront::problem
