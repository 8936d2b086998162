// The proof against full enumeration, on catalogues small enough for both.
#include "dropfront/search/prove.hpp"

#include <array>
#include <atomic>
#include <numeric>
#include <set>

#include "dropfront/search/rank.hpp"
#include "search/proof_lists.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;
using toy::Fault;
using toy::ProofLists;
using toy::ProofShape;

namespace {

SearchOptions proving() {
  SearchOptions options;
  options.prove = true;
  options.switches.enumerate = false;
  options.effort = Effort::quick;
  return options;
}

ProofShape catalogue(std::uint64_t seed, double resolution) {
  ProofShape shape;
  shape.seed = seed;
  shape.objectives = std::vector<int>{4, 2, 4, 3, 4, 1}[seed % 6];
  shape.resolution = resolution;
  return shape;  // 11,520 designs
}

bool same_front(const std::vector<Candidate>& a, const std::vector<Candidate>& b) {
  return std::equal(a.begin(), a.end(), b.begin(), b.end(), [](const Candidate& x, const Candidate& y) {
    return x.choice == y.choice && x.evaluation.objectives == y.evaluation.objectives;
  });
}

struct Proven {
  Proof proof;
  std::vector<Candidate> front;
};

/// Sets its stop flag at a given bound.
struct StoppingLists : ProofLists {
  StoppingLists(const ProofShape& shape, long after) : ProofLists(shape), stop_after(after) {}
  Bounds bound(const Box& box, int depth) const override {
    if (++bounds >= stop_after) stop = true;
    return ProofLists::bound(box, depth);
  }
  long stop_after;
  mutable std::atomic<long> bounds{0};
  mutable std::atomic<bool> stop{false};
};

/// The proof alone: no search before it, so that it has to find everything itself.
Proven prove_with(const ProofShape& shape, Fault fault) {
  const ProofLists lists(shape, fault);
  const SearchOptions options = proving();
  SearchState state(lists, options);
  Proven result;
  result.proof = prove(state, lists);
  result.front = front_of(state.ledger);
  return result;
}

/// Over many catalogues, until one shows it: does the proof ever miss what enumeration finds?
bool caught(Fault fault) {
  for (std::uint64_t seed = 1; seed <= (fault == Fault::none ? 24u : 96u); ++seed) {
    ProofShape shape = catalogue(seed, seed % 2 ? 0.0 : 0.02);
    // Few questions are asked about small boxes.
    if (fault == Fault::question_low) shape.sizes = {2, 4, 10, 8, 6, 6, 3};
    if (!same_front(prove_with(shape, fault).front, toy::front_by_definition(ProofLists(shape)))) return true;
  }
  return false;
}

void require_counts_add_up(const Proof& proof, const Space& space) {
  CHECK(proof.space == space.size());
  CHECK(proof.settled() + proof.left == proof.space);
  CHECK((proof.left == 0) == proof.complete);
  CHECK(proof.open_bounds.empty() == (proof.open_boxes == 0));
}

}  // namespace

TEST_CASE("the proven front equals full enumeration, design for design, raw and at a resolution") {
  std::size_t members = 0, infeasible = 0;
  for (std::uint64_t seed = 1; seed <= 24; ++seed)
    for (const double resolution : {0.0, 0.02}) {
      const ProofShape shape = catalogue(seed, resolution);
      const ProofLists lists(shape);
      const auto expected = toy::front_by_definition(lists);
      INFO("catalogue " << seed << ", resolution " << resolution << ", front of " << expected.size());
      const Proven proven = prove_with(shape, Fault::none);
      CHECK(proven.proof.complete);
      CHECK_FALSE(proven.proof.enumerated);
      CHECK(same_front(proven.front, expected));
      require_counts_add_up(proven.proof, lists.space());
      members += expected.size();
      infeasible += expected.empty();
    }
  CHECK(members > 300);    // fronts worth comparing
  CHECK(infeasible < 24);  // and not all of them trivial
}

TEST_CASE("a larger space is proven like a small one, scoring few of its designs") {
  for (std::uint64_t seed : {3, 6}) {
    ProofShape shape = catalogue(seed, 0.01);
    shape.sizes = {2, 4, 14, 10, 8, 8, 3};  // 215,040 designs
    const ProofLists lists(shape);
    const SearchOutcome outcome = run_search(lists, proving(), &lists);
    REQUIRE(outcome.proof);
    CHECK(outcome.proof->complete);
    CHECK(same_front(outcome.front, toy::front_by_definition(lists)));
    require_counts_add_up(*outcome.proof, lists.space());
    CHECK(outcome.proof->scored < 0.2 * lists.space().size());
  }
}

TEST_CASE("any bound turned round loses a design that enumeration finds") {
  CHECK_FALSE(caught(Fault::none));
  CHECK(caught(Fault::cost_high));
  CHECK(caught(Fault::area_high));
  CHECK(caught(Fault::loss_high));
  CHECK(caught(Fault::margin_low));
  CHECK(caught(Fault::question_low));
  CHECK(caught(Fault::broken_by_any));
  CHECK(caught(Fault::unknown_breaks));
  CHECK(caught(Fault::window_swapped));
  CHECK(caught(Fault::reduce_rating));
  CHECK(caught(Fault::reduce_dearer));
  CHECK(caught(Fault::reduce_first));
}

TEST_CASE("a proof is the same with 1, 2 and 4 threads") {
  const ProofShape shape = catalogue(6, 0.01);
  const ProofLists lists(shape);
  SearchOptions options = proving();
  options.threads = 1;
  const SearchOutcome one = run_search(lists, options, &lists);
  REQUIRE(one.proof);
  CHECK_FALSE(one.front.empty());
  for (const int threads : {2, 4}) {
    options.threads = threads;
    const SearchOutcome other = run_search(lists, options, &lists);
    CHECK(same_front(one.front, other.front));
    CHECK(one.proof->boxes == other.proof->boxes);
    CHECK(one.proof->scored == other.proof->scored);
    CHECK(one.proof->reduced == other.proof->reduced);
    CHECK(one.proof->broken == other.proof->broken);
    CHECK(one.proof->dominated == other.proof->dominated);
    CHECK(one.counts.looked == other.counts.looked);
    CHECK(one.counts.scored == other.counts.scored);
    for (std::size_t set = 0; set < one.ranked.size(); ++set)
      CHECK(same_front(one.ranked[set].candidates, other.ranked[set].candidates));
  }
}

TEST_CASE("a budget cuts a proof cleanly: what is left is counted and its bounds hold") {
  const ProofShape shape = catalogue(3, 0.0);
  const ProofLists lists(shape);
  const auto exact = toy::front_by_definition(lists);
  for (const std::int64_t budget : {1, 20, 100, 300}) {
    SearchOptions options = proving();
    options.budget = budget;
    const SearchOutcome outcome = run_search(lists, options, &lists);
    REQUIRE(outcome.proof);
    const Proof& proof = *outcome.proof;
    INFO("budget " << budget << ", " << proof.left << " left in " << proof.open_boxes << " boxes");
    CHECK(outcome.counts.looked + proof.boxes <= budget);
    CHECK(outcome.cut_short);
    CHECK_FALSE(proof.complete);
    CHECK(proof.open_boxes > 0);
    require_counts_add_up(proof, lists.space());
    // No design of the true front is better than both the front found and what the open boxes could hold.
    for (std::size_t k = 0; k < proof.open_bounds.size(); ++k) {
      double best = proof.open_bounds[k];
      for (const Candidate& c : outcome.front) best = std::min(best, c.evaluation.objectives[k]);
      for (const Candidate& c : exact) CHECK(c.evaluation.objectives[k] >= best);
    }
  }
}

TEST_CASE("a proof that is stopped keeps whole batches only, whatever the threads were at") {
  // What stands after each batch of a proof that runs to its end.
  using Standing = std::array<std::int64_t, 3>;
  std::set<Standing> whole{{0, 0, 0}};
  std::size_t inside = 0;
  for (const bool stopping : {false, true})
    for (const int threads : {1, 3})
      for (long after = stopping ? 150 : 1'000'000'000; after <= (stopping ? 6000 : 1'000'000'000);
           after += 450) {
        const StoppingLists lists(catalogue(3, 0.0), after);
        SearchOptions options = proving();
        options.threads = threads;
        options.stop = &lists.stop;
        if (!stopping)
          options.progress = [&whole](const Progress& p) { whole.insert({p.looked, p.scored, p.front}); };
        SearchState state(lists, options);
        const Proof proof = prove(state, lists);
        require_counts_add_up(proof, lists.space());
        if (!stopping) continue;
        if (!lists.stop) break;
        const SearchCounts& counts = state.ledger.counts();
        INFO(threads << " threads, stopped at bound " << after << ", " << counts.looked << " looked at");
        CHECK(whole.count({counts.looked, counts.scored, state.ledger.front().size()}) == 1);
        inside += counts.looked > 0;
      }
  CHECK(whole.size() > 4);
  CHECK(inside > 4);
}

TEST_CASE("a stop flag leaves everything open") {
  const ProofLists lists(catalogue(3, 0.0));
  const std::atomic<bool> stop{true};
  SearchOptions options = proving();
  options.stop = &stop;
  const SearchOutcome outcome = run_search(lists, options, &lists);
  REQUIRE(outcome.proof);
  CHECK_FALSE(outcome.proof->complete);
  CHECK(outcome.proof->left == lists.space().size());
  CHECK(outcome.cut_short);
}

TEST_CASE("a proof that ends without a front says that nothing complies") {
  ProofShape shape = catalogue(3, 0.0);
  shape.least_margin = 1000;
  const ProofLists lists(shape);
  const SearchOutcome outcome = run_search(lists, proving(), &lists);
  REQUIRE(outcome.proof);
  CHECK(outcome.proof->complete);
  CHECK(outcome.front.empty());
  const ByKind& margin = outcome.proof->broken[5];
  CHECK(std::accumulate(margin.begin(), margin.end(), 0.0) > 0);
}

TEST_CASE("small spaces are enumerated, with a certificate of exact reasoning") {
  ProofShape shape = catalogue(3, 0.0);
  shape.sizes = {2, 4, 4, 4, 3, 3, 2};  // 2,304 designs
  const ProofLists lists(shape);
  SearchOptions options = proving();
  options.switches.enumerate = true;
  const SearchOutcome outcome = run_search(lists, options, &lists);
  REQUIRE(outcome.proof);
  CHECK(outcome.proof->complete);
  CHECK(outcome.proof->enumerated);
  CHECK(outcome.proof->weakest() == BoundKind::exact);
  require_counts_add_up(*outcome.proof, lists.space());
  CHECK(same_front(outcome.front, toy::front_by_definition(lists)));
}

TEST_CASE("the certificate names the weakest kind of reasoning it needed") {
  Proof proof;
  CHECK(proof.weakest() == BoundKind::exact);
  proof.broken.resize(2);
  proof.dominated[1] = 4;
  CHECK(proof.weakest() == BoundKind::theorem);
  proof.broken[1][2] = 1;
  CHECK(proof.weakest() == BoundKind::monotone);
  CHECK(proof.settled() == 5);
}
