// A margin that a member has is in reach of its box, whatever the box: the engine at the best of everything
// must carry what one member carries.
#include "dropfront/scoring/bounds/lean_reach.hpp"

#include <algorithm>

#include "dropfront/scoring/bounds/box_ends.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "scoring/bounds/support/box_sample.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// Margin of the lean search, least over supplies; none where there is no answer.
std::optional<double> margin_A(const Design& design, const Requirement& requirement) {
  std::optional<double> least;
  for (const auto& supply : requirement.supplies) {
    Evidence evidence(design, requirement, supply);
    const auto& lean = evidence.lean();
    if (!lean.usable) return std::nullopt;
    least = least ? std::min(*least, lean.margin_A) : lean.margin_A;
  }
  return least;
}

struct Tally {
  int members = 0, shown = 0, wanted = 0;
};

void try_box(const DesignBox& box, const Requirement& requirement, Tally& tally) {
  const LeanReach reach(requirement);
  const double load_A = load_profile(requirement.output).heaviest_output_A();
  for (const auto& member : test::members_of(box)) {
    const auto margin = margin_A(member, requirement);
    // A design that carries next to nothing says little, and its load may not be above zero.
    if (!margin || !(*margin > -0.8 * load_A)) continue;
    ++tally.members;
    INFO(box.arrangement->name << ", margin " << *margin << " A of " << load_A << " A");
    REQUIRE_FALSE(reach.out_of_reach(box, *margin));
    ++tally.wanted;
    tally.shown += reach.out_of_reach(test::box_of(member), *margin + 0.05 * load_A);
  }
}

void try_boxes(int boxes, int most_members, std::uint64_t seed) {
  Tally tally;
  for (const auto& arrangement : circuit::arrangements()) {
    if (!plain_clamped(arrangement)) continue;
    values::RandomStream random(seed);
    for (int k = 0; k < boxes; ++k) {
      const auto& requirement = test::requirements()[k % test::requirements().size()];
      // Half of the boxes vary one list only, the others several.
      const DesignBox box = k % 2 ? test::random_box(arrangement, requirement, most_members, random)
                                  : test::box_open_in(k / 2 % 7, arrangement, requirement, random);
      try_box(box, requirement, tally);
    }
  }
  CHECK(tally.members > boxes);
  // Most single designs that miss by a twentieth of the load are shown to miss, or the bound were no use.
  INFO(tally.shown << " of " << tally.wanted << " shown");
  CHECK(2 * tally.shown > tally.wanted);
}

}  // namespace

TEST_CASE("No margin that a member has is out of reach of its box") { try_boxes(120, 12, 7); }

TEST_CASE("Ten thousand boxes: no margin that a member has is out of reach of its box", "[.long]") {
  for (std::uint64_t seed = 1; seed <= 25; ++seed) try_boxes(100, 24, seed);
}

TEST_CASE("Without a part that every member needs, or with too many resistors, nothing is said") {
  values::RandomStream random(3);
  const auto& requirement = test::requirements().front();
  const auto& arrangement = circuit::arrangements().front();
  const LeanReach reach(requirement);
  const double beyond_A = 1e3;
  DesignBox box = test::box_open_in(1, arrangement, requirement, random);
  CHECK(reach.out_of_reach(box, beyond_A));
  DesignBox missing = box;
  missing.clamps = {nullptr};
  CHECK_FALSE(reach.out_of_reach(missing, beyond_A));
  const parts::Resistor one = *box.series_resistors.front();
  std::vector<parts::Resistor> many(LeanReach::kMostResistors + 1, one);
  box.series_resistors.clear();
  for (auto& resistor : many) {
    box.series_resistors.push_back(&resistor);
    resistor.resistance_ohm += static_cast<double>(box.series_resistors.size());
  }
  CHECK_FALSE(reach.out_of_reach(box, beyond_A));
}
