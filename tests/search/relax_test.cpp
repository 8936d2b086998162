#include "dropfront/search/relax.hpp"

#include <algorithm>
#include <atomic>
#include <map>

#include "dropfront/search/sequence.hpp"
#include "dropfront/search/snap.hpp"
#include "search/toy_lists.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;

namespace {

toy::Shape shape_with_margin(double margin) {
  toy::Shape shape;
  shape.seed = 4;
  shape.droppers = shape.resistors = shape.clamps = shape.reservoirs = 20;
  shape.least_margin = margin;
  return shape;
}

/// Sets its stop flag at a given relaxed evaluation.
struct Stopping : toy::Lists {
  explicit Stopping(const toy::Shape& shape, long after) : Lists(shape), stop_after(after) {}
  Evaluation relaxed(const Choice& categories, const std::vector<double>& position) const override {
    const Evaluation e = Lists::relaxed(categories, position);
    if (relaxations.load() >= stop_after) stop = true;
    return e;
  }
  long stop_after;
  mutable std::atomic<bool> stop{false};
};

}  // namespace

TEST_CASE("a relaxation that is stopped keeps whole batches only, whatever the threads were at") {
  std::map<std::int64_t, std::vector<std::vector<double>>> kept;  // starts, by relaxed designs kept
  int stops = 0;
  for (const int threads : {1, 3})
    for (long after = 1; after < 1500; after += 37) {
      const Stopping lists(shape_with_margin(1.0), after);
      SearchOptions options;
      options.effort = Effort::quick;
      options.threads = threads;
      options.stop = &lists.stop;
      SearchState state(lists, options);
      const Relaxation relaxation = relax(state);
      if (!lists.stop) break;
      ++stops;
      const std::int64_t count = state.ledger.counts().relaxed;
      CHECK(count < after);
      std::vector<std::vector<double>> starts;
      for (const RelaxedOptimum& start : relaxation.starts) starts.push_back(start.design.position);
      const auto known = kept.emplace(count, starts).first;
      CHECK(known->second == starts);
    }
  // Five batches (the sample, twice the search for compliance, two polishes), of which the last cannot be
  // kept and one may be empty.
  CHECK(stops > 10);
  CHECK(kept.size() >= 2);
  CHECK(kept.size() <= 5);
}

TEST_CASE("relaxation finds complying designs in every region and keeps to its evaluations") {
  const toy::Lists lists(shape_with_margin(1.0));
  SearchOptions options;
  options.effort = Effort::quick;
  SearchState state(lists, options);
  const Relaxation relaxation = relax(state);
  CHECK(lists.relaxations.load() <= state.plan.relaxed);
  CHECK(state.ledger.counts().relaxed == lists.relaxations.load());
  std::vector<bool> complying(2, false);
  for (const RelaxedOptimum& start : relaxation.starts)
    if (start.design.violation == 0) complying[start.design.categories[0]] = true;
  CHECK(complying == std::vector<bool>{true, true});
  REQUIRE_FALSE(relaxation.optima.empty());
  for (const RelaxedOptimum& optimum : relaxation.optima)
    for (double x : optimum.design.position) {
      CHECK(x >= 0);
      CHECK(x <= 1);
    }
}

TEST_CASE("each single objective is served better by its own optimum than by the even sample") {
  const toy::Lists lists(shape_with_margin(0.5));
  SearchOptions options;
  options.effort = Effort::normal;
  SearchState state(lists, options);
  const Relaxation relaxation = relax(state);
  for (std::size_t k = 0; k < 4; ++k) {
    double aimed = 1e300, sampled = 1e300;
    for (const RelaxedOptimum& optimum : relaxation.optima)
      if (optimum.weights[k] == 1 && optimum.design.violation == 0)
        aimed = std::min(aimed, optimum.design.objectives[k]);
    for (int n = 0; n < 400; ++n) {
      const Evaluation e = lists.relaxed({n % 2, 0, 0, 0, 0, 0}, spread_point(n, 4, 77));
      if (e.violation == 0) sampled = std::min(sampled, e.objectives[k]);
    }
    INFO("objective " << k);
    CHECK(aimed < sampled);
  }
}

TEST_CASE("snapping gives real designs at the nearest coordinates, none twice, within one step around") {
  const toy::Lists lists(shape_with_margin(0.0));
  SearchState state(lists, {});
  RelaxedOptimum optimum;
  optimum.design.categories = {1, 0, 0, 0, 0, 0};
  optimum.design.position = {0.31, 0.62, 0.05, 1.0};
  optimum.weights = {0.25, 0.25, 0.25, 0.25};
  ObjectiveRange range(4);
  range.take({0, 0, 0, -1});
  range.take({3, 1, 3, 1});
  const Snapped snapped = snap(state, optimum, range);
  std::vector<Choice> all = snapped.bases;
  all.insert(all.end(), snapped.around.begin(), snapped.around.end());
  std::sort(all.begin(), all.end());
  CHECK(std::adjacent_find(all.begin(), all.end()) == all.end());
  for (const Choice& c : snapped.bases) {
    CHECK(c[0] == 1);
    for (std::size_t a = 0; a < 4; ++a) {
      const Axis& axis = state.axes[a];
      CHECK(axis.step_of[c[axis.slot]] == axis.around(optimum.design.position[a])[0]);
    }
  }
  for (const Choice& c : all)
    for (std::size_t a = 0; a < 4; ++a) {
      const Axis& axis = state.axes[a];
      CHECK(std::abs(axis.step_of[c[axis.slot]] - axis.around(optimum.design.position[a])[0]) <= 1);
    }
  // The first base is the dearest, the last the cheapest.
  CHECK(lists.look(snapped.bases.front()).objectives[0] > lists.look(snapped.bases.back()).objectives[0]);
}
