// The search's view of bounds: same slots and objectives as bind(), and never tighter than a member.
#include "dropfront/problem/box_binding.hpp"

#include <cmath>

#include "dropfront/problem/binding.hpp"
#include "problem/random_box.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::problem;
using namespace dropfront::problem::testing;

namespace {

void require_true(const BoundProblem& bound, const search::Bounder& bounder, const search::Box& box) {
  const auto members = members_of(box);
  for (const int depth : {0, 1}) {
    const search::Bounds bounds = bounder.bound(box, depth);
    for (const auto& member : members) {
      const search::Evaluation e = bound.evaluate(member, search::Dominated{});
      if (bounds.broken >= 0 || bounds.undefined) {
        CHECK(e.outcome != search::Outcome::compliant);
        continue;
      }
      REQUIRE(bounds.objectives.size() == e.objectives.size());
      bool above_one = bounds.corners.empty();
      for (const auto& corner : bounds.corners) {
        bool above = true;
        for (std::size_t k = 0; k < corner.size(); ++k) above = above && !(e.objectives[k] < corner[k]);
        above_one = above_one || above;
      }
      CHECK(above_one);
      for (std::size_t k = 0; k < e.objectives.size(); ++k)
        if (!std::isnan(e.objectives[k])) CHECK(bounds.objectives[k] <= e.objectives[k]);
    }
  }
}

}  // namespace

TEST_CASE("no member of a box of a shipped problem is better than its bounds say") {
  values::RandomStream random(11);
  for (const char* name : {"leak-alarm", "sensor-family", "towel-rail-timer"}) {
    const auto file = read_problem_file(std::string(DROPFRONT_SOURCE_DIR) + "/problems/" + name + ".json");
    const Problem& problem = file.problems.front();
    const auto bound = bind(problem);
    const auto bounder = bind_bounds(problem);
    INFO(name);
    for (int n = 0; n < 25; ++n) {
      search::Box box = random_box(bound->space(), 2, random);
      // At most eight members: two lists of two beside the first.
      int lists = 0;
      for (auto& list : box.options)
        if (list.size() > 1 && ++lists > 3) list.erase(list.begin() + 1, list.end());
      require_true(*bound, *bounder, box);
    }
  }
}

TEST_CASE("reducing a box of a shipped problem leaves a member as good as each it drops") {
  const auto file = read_problem_file(std::string(DROPFRONT_SOURCE_DIR) + "/problems/leak-alarm.json");
  const auto bound = bind(file.problems.front());
  const auto bounder = bind_bounds(file.problems.front());
  values::RandomStream random(4);
  double dropped = 0;
  int compared = 0;
  for (int n = 0; n < 300 && compared < 20; ++n) {
    const search::Box whole = random_box(bound->space(), 12, random);
    search::Box left = whole;
    dropped += bounder->reduce(left);
    for (std::size_t slot = 0; slot < left.options.size(); ++slot) {
      REQUIRE_FALSE(left.options[slot].empty());
      if (left.options[slot].size() == whole.options[slot].size()) continue;
      search::Choice out;
      for (const auto& list : left.options) out.push_back(list.front());
      for (const auto option : whole.options[slot]) {
        const auto& kept = left.options[slot];
        if (std::find(kept.begin(), kept.end(), option) == kept.end()) out[slot] = option;
      }
      const search::Evaluation gone = bound->evaluate(out, search::Dominated{});
      if (gone.outcome != search::Outcome::compliant) continue;
      ++compared;
      bool matched = false;
      for (const auto option : left.options[slot]) {
        search::Choice other = out;
        other[slot] = option;
        const search::Evaluation e = bound->evaluate(other, search::Dominated{});
        bool as_good = e.outcome == search::Outcome::compliant;
        for (std::size_t k = 0; k < e.objectives.size() && as_good; ++k)
          as_good = e.objectives[k] <= gone.objectives[k];
        matched = matched || as_good;
      }
      CHECK(matched);
    }
  }
  CHECK(dropped > 0);
}
