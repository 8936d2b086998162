// Evaluators and spaces at the edge of the contract.
#include <limits>

#include "dropfront/search/search.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;

namespace {

/// f = (x, 10 - x) over one slot, with every third design's second objective not a number.
class HalfKnown : public Evaluator {
 public:
  HalfKnown(int size, bool axis) : resolution_{0, 0} {
    Slot slot;
    slot.name = "part";
    slot.size = size;
    if (axis)
      for (int i = 0; i < size; ++i) slot.coordinate.push_back(i);
    space_.slots.push_back(slot);
  }
  const Space& space() const override { return space_; }
  int objective_count() const override { return 2; }
  const std::vector<double>& resolution() const override { return resolution_; }
  const std::vector<std::string>& check_names() const override { return none_; }
  Evaluation look(const Choice& c) const override {
    Evaluation e;
    e.outcome = Outcome::compliant;
    e.objectives = {static_cast<double>(c[0]), std::numeric_limits<double>::quiet_NaN()};
    return e;
  }
  Evaluation evaluate(const Choice& c, const Dominated&) const override {
    Evaluation e = look(c);
    if (c[0] % 3 != 0) e.objectives[1] = 10.0 - c[0];
    return e;  // claims to comply all the same
  }
  Evaluation relaxed(const Choice&, const std::vector<double>&) const override {
    Evaluation e;
    e.outcome = Outcome::undefined;
    e.objectives = {std::numeric_limits<double>::quiet_NaN(), 0};
    e.violation = std::numeric_limits<double>::infinity();
    return e;
  }

 private:
  Space space_;
  std::vector<double> resolution_;
  std::vector<std::string> none_;
};

}  // namespace

TEST_CASE("a design with an objective that is not a number never reaches a front, whatever it claims") {
  for (bool enumerate : {true, false})
    for (bool axis : {true, false}) {
      const HalfKnown evaluator(30, axis);
      SearchOptions options;
      options.switches.enumerate = enumerate;
      const SearchOutcome outcome = run_search(evaluator, options);
      REQUIRE(outcome.front.size() == 20);
      for (const Candidate& c : outcome.front) CHECK(c.choice[0] % 3 != 0);
      CHECK(outcome.counts.compliant == 20);
    }
}

TEST_CASE("spaces of one design, of no design and of no slot have their answer") {
  CHECK(run_search(HalfKnown(1, false), {}).front.empty());
  CHECK(run_search(HalfKnown(2, true), {}).front.size() == 1);
  const SearchOutcome nothing = run_search(HalfKnown(0, false), {});
  CHECK(nothing.front.empty());
  CHECK(nothing.counts.looked == 0);
}
