#include "dropfront/search/box_split.hpp"

#include <set>

#include "search/proof_lists.hpp"
#include "support/catch.hpp"

using namespace dropfront::search;

namespace {

std::set<std::int32_t> set_of(const std::vector<std::int32_t>& list) { return {list.begin(), list.end()}; }

}  // namespace

TEST_CASE("the first boxes share the space out by category and group") {
  const toy::ProofLists lists(toy::ProofShape{});
  const BoxSplitter splitter(lists);
  const std::vector<Box> roots = splitter.roots();
  CHECK(roots.size() == 2 * 2);  // arrangements; stages in two groups
  double members = 0;
  for (const Box& box : roots) {
    members += box.members();
    CHECK(box.options[0].size() == 1);
    for (const auto stage : box.options[1])
      CHECK(lists.space().slots[1].group[stage] == lists.space().slots[1].group[box.options[1][0]]);
  }
  CHECK(members == lists.space().size());
}

TEST_CASE("splitting parts one list in two, in order, until single designs are left") {
  const toy::ProofLists lists(toy::ProofShape{});
  const BoxSplitter splitter(lists);
  const std::vector<double> extent(4, 1.0);
  std::vector<Box> open = splitter.roots();
  double singles = 0;
  while (!open.empty()) {
    const Box box = open.back();
    open.pop_back();
    const int slot = splitter.widest(box, extent);
    if (slot < 0) {
      CHECK(box.members() == 1);
      ++singles;
      continue;
    }
    const auto halves = splitter.split(box, slot);
    for (const Box* half : {&halves.first, &halves.second}) {
      REQUIRE(!half->options[slot].empty());
      CHECK(std::is_sorted(half->options[slot].begin(), half->options[slot].end()));
    }
    CHECK(halves.first.members() + halves.second.members() == box.members());
    std::set<std::int32_t> both = set_of(halves.first.options[slot]);
    both.merge(set_of(halves.second.options[slot]));
    CHECK(both == set_of(box.options[slot]));
    // Coordinates do not overlap.
    const auto& coordinate = lists.space().slots[slot].coordinate;
    double low = -1e300, high = 1e300;
    for (const auto o : halves.first.options[slot])
      low = std::max(low, coordinate.empty() ? 0 : coordinate[o]);
    for (const auto o : halves.second.options[slot])
      high = std::min(high, coordinate.empty() ? 0 : coordinate[o]);
    CHECK(low <= high);
    if (halves.first.members() > 1) open.push_back(halves.first);
    if (halves.second.members() > 1) open.push_back(halves.second);
    singles += halves.first.members() == 1;
    singles += halves.second.members() == 1;
  }
  CHECK(singles == lists.space().size());
}

TEST_CASE("a slot that offers nothing leaves no box") {
  // The lists themselves cannot be built without parts; the splitter only sees the space.
  class Empty : public toy::ProofLists {
   public:
    Empty() : ProofLists(toy::ProofShape{}) { space_ = ProofLists::space(), space_.slots[4].size = 0; }
    const Space& space() const override { return space_; }

   private:
    Space space_;
  } lists;
  CHECK(BoxSplitter(lists).roots().empty());
}
