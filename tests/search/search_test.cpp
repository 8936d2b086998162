#include "dropfront/search/search.hpp"

#include "search/toy_lists.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;

namespace {

void require_same_front(const std::vector<Candidate>& found, const std::vector<Candidate>& expected) {
  REQUIRE(found.size() == expected.size());
  for (std::size_t i = 0; i < found.size(); ++i) {
    CHECK(found[i].choice == expected[i].choice);
    CHECK(found[i].evaluation.objectives == expected[i].evaluation.objectives);
  }
}

toy::Shape random_shape(std::uint64_t seed) {
  toy::Random random{seed * 7 + 1};
  const auto between = [&random](int low, int high) {
    return low + static_cast<int>(random.uniform() * (high - low + 1));
  };
  toy::Shape shape;
  shape.seed = seed;
  shape.arrangements = between(1, 3);
  shape.droppers = between(6, 12);
  shape.resistors = between(5, 8);
  shape.clamps = between(4, 7);
  shape.reservoirs = between(3, 6);
  shape.chains = between(1, 2);
  shape.objectives = 2 + static_cast<int>(seed % 3);
  shape.least_margin = random.between(-0.5, 0.5);
  shape.most_loss = random.between(0.5, 2);
  return shape;
}

}  // namespace

TEST_CASE("on small spaces the front equals full enumeration, design for design, raw and at a resolution") {
  for (std::uint64_t seed = 1; seed <= 20; ++seed)
    for (double resolution : {0.0, 0.01}) {
      toy::Shape shape = random_shape(seed);
      shape.resolution = resolution;
      const toy::Lists lists(shape);
      INFO("catalogue " << seed << ", " << lists.space().size() << " designs, resolution " << resolution);
      const SearchOutcome outcome = run_search(lists, {});
      CHECK(outcome.exhaustive);
      CHECK(outcome.closed);
      CHECK_FALSE(outcome.cut_short);
      require_same_front(outcome.front, toy::front_by_definition(lists));
      CHECK(outcome.counts.looked == static_cast<std::int64_t>(lists.space().size()));
      CHECK(outcome.counts.scored < outcome.counts.looked);
    }
}

TEST_CASE("one objective gives a front of one and a set filled with the next compliant designs") {
  for (std::uint64_t seed = 1; seed <= 4; ++seed) {
    toy::Shape shape = random_shape(seed);
    shape.objectives = 1;
    shape.least_margin = 0.2;
    shape.resolution = seed % 2 ? 0.0 : 0.001;
    const toy::Lists lists(shape);
    const SearchOutcome outcome = run_search(lists, {});
    REQUIRE(outcome.front.size() == 1);

    std::vector<std::tuple<double, double, Choice>> compliant;
    for (const Choice& c : toy::every_choice(lists.space())) {
      const Evaluation e = lists.exact(c);
      if (e.outcome == Outcome::compliant)
        compliant.emplace_back(objective_key(e.objectives[0], shape.resolution), e.objectives[0], c);
    }
    std::sort(compliant.begin(), compliant.end());
    REQUIRE(outcome.ranked.size() == 2);
    CHECK(outcome.ranked[0].name == "objective 0");
    CHECK(outcome.ranked[1].name == "balanced");
    REQUIRE(compliant.size() >= 5);
    REQUIRE(outcome.ranked[0].candidates.size() == 5);
    for (std::size_t i = 0; i < 5; ++i) {
      CHECK(outcome.ranked[0].candidates[i].on_front == (i == 0));
      CHECK(outcome.ranked[0].candidates[i].choice == std::get<2>(compliant[i]));
      CHECK(outcome.ranked[1].candidates[i].choice == std::get<2>(compliant[i]));
    }
  }
}

TEST_CASE("when nothing complies the tallies and near misses say how close it came") {
  toy::Shape shape = random_shape(3);
  shape.least_margin = 50;  // far beyond any part
  const toy::Lists lists(shape);
  const SearchOutcome outcome = run_search(lists, {});
  CHECK(outcome.exhaustive);
  CHECK(outcome.front.empty());
  for (const RankedSet& set : outcome.ranked) CHECK(set.candidates.empty());
  const CheckTally& margin = outcome.tallies[1];
  CHECK(margin.failed > 0);
  // The closest design by definition: among those that pass the look.
  double least = 1e300;
  std::int64_t failed = 0;
  for (const Choice& c : toy::every_choice(lists.space())) {
    if (lists.look(c).outcome != Outcome::compliant) continue;
    ++failed;
    const Evaluation e = lists.exact(c);
    for (std::size_t i = 0; i < e.broken.size(); ++i)
      if (e.broken[i] == 1) least = std::min(least, e.shortfall[i]);
  }
  CHECK(margin.failed == failed);
  CHECK(margin.least_shortfall == least);
  const Evaluation closest = lists.exact(margin.closest);
  CHECK(closest.shortfall[std::find(closest.broken.begin(), closest.broken.end(), 1) -
                          closest.broken.begin()] == least);
}

TEST_CASE("near misses break exactly one check and are the three closest of those evaluated") {
  toy::Shape shape = random_shape(5);
  shape.least_margin = 50;
  const toy::Lists lists(shape);
  const SearchOutcome outcome = run_search(lists, {});
  REQUIRE_FALSE(outcome.near_misses.empty());
  std::map<int, std::vector<double>> expected;
  for (const Choice& c : toy::every_choice(lists.space())) {
    const Evaluation e = lists.exact(c);
    if (e.broken.size() == 1) expected[e.broken[0]].push_back(e.shortfall[0]);
  }
  std::map<int, std::vector<double>> found;
  for (const NearMiss& miss : outcome.near_misses) {
    const Evaluation e = lists.exact(miss.choice);
    REQUIRE(e.broken == std::vector<std::int16_t>{static_cast<std::int16_t>(miss.check)});
    CHECK(e.shortfall[0] == miss.shortfall);
    found[miss.check].push_back(miss.shortfall);
  }
  for (auto& entry : expected) {
    std::sort(entry.second.begin(), entry.second.end());
    entry.second.resize(std::min<std::size_t>(entry.second.size(), 3));
    CHECK(found[entry.first] == entry.second);
  }
}

TEST_CASE("ranked sets are best first and the balanced one has the least worst regret") {
  const toy::Lists lists(random_shape(8));
  SearchOptions options;
  options.top = 4;
  const SearchOutcome outcome = run_search(lists, options);
  const std::size_t m = static_cast<std::size_t>(lists.objective_count());
  REQUIRE(outcome.front.size() > 4);
  REQUIRE(outcome.ranked.size() == m + 1);
  std::vector<double> best(m, 1e300), worst(m, -1e300);
  for (const Candidate& c : outcome.front)
    for (std::size_t k = 0; k < m; ++k) {
      best[k] = std::min(best[k], c.evaluation.objectives[k]);
      worst[k] = std::max(worst[k], c.evaluation.objectives[k]);
    }
  const auto regret = [&](const Candidate& c) {
    double most = 0;
    for (std::size_t k = 0; k < m; ++k)
      most = std::max(most, (c.evaluation.objectives[k] - best[k]) / (worst[k] - best[k]));
    return most;
  };
  double least = 1e300;
  for (const Candidate& c : outcome.front) least = std::min(least, regret(c));
  CHECK(regret(outcome.ranked[m].candidates[0]) == least);
  for (std::size_t k = 0; k < m; ++k) {
    const auto& set = outcome.ranked[k].candidates;
    REQUIRE(set.size() == 4);
    CHECK(set[0].evaluation.objectives[k] == best[k]);
    for (std::size_t i = 1; i < set.size(); ++i)
      CHECK(set[i - 1].evaluation.objectives[k] <= set[i].evaluation.objectives[k]);
  }
}
