#include "dropfront/problem/design_box.hpp"

#include "problem/random_box.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::problem;
using namespace dropfront::problem::testing;

TEST_CASE("a box's parts are those of its options, and parts taken out take their options with them") {
  const Problem problem =
      read_problem_file(std::string(DROPFRONT_SOURCE_DIR) + "/problems/leak-alarm.json").problems.front();
  const SlotSpace slots = make_space(problem.offers);
  values::RandomStream random(9);
  for (int n = 0; n < 20; ++n) {
    search::Box box = random_box(slots.space, 5, random);
    scoring::DesignBox parts = design_box(problem.offers, slots.ids, box);
    const auto members = members_of(box);
    const scoring::Design last = design_of(problem.offers, slots.ids, members.back());
    CHECK(parts.arrangement == last.arrangement);
    CHECK(parts.droppers.back() == last.dropper);
    CHECK(parts.discharges.back().element == last.discharge);
    CHECK(parts.discharges.back().count == last.discharge_count);
    CHECK(parts.varistors == std::vector<const parts::Varistor*>{nullptr});  // the slot is not offered
    search::Box whole = box;
    keep_parts(problem.offers, slots.ids, parts, whole);
    CHECK(whole.options == box.options);
    if (parts.clamps.size() < 3) continue;
    parts.clamps.erase(parts.clamps.begin() + 1);
    keep_parts(problem.offers, slots.ids, parts, whole);
    CHECK(whole.members() == box.members() / static_cast<double>(parts.clamps.size() + 1) *
                                 static_cast<double>(parts.clamps.size()));
    CHECK(design_box(problem.offers, slots.ids, whole).clamps == parts.clamps);
  }
}
