// Where the input power stops growing with the clamp, the engine's bound must say nothing.
#include <array>

#include "dropfront/scoring/bounds/bound_table.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "scoring/bounds/support/box_sample.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::scoring;

namespace {

struct TwoClamps {
  test::Example example{"bridge-clamp-across"};
  std::array<parts::Clamp, 2> clamps{test::one_watt_zener(43, 0.006, 70, 1500, 0.25e-3, 0.00095),
                                     test::one_watt_zener(82, 0.003, 200, 3000, 0.25e-3, 0.00099)};
  TwoClamps() {
    for (auto& clamp : clamps) clamp.thermal_resistance_K_per_W = 2;  // heat is not the question here
  }

  double standby_W(std::size_t i) const {
    Design design = example.design();
    design.clamp = &clamps[i];
    Evidence evidence(design, example.requirement, example.requirement.supplies[0]);
    return evidence.standby_worst().state.input_power_W;
  }
  std::optional<double> engine_W() const {
    DesignBox box = test::box_of(example.design());
    box.clamps = {&clamps[0], &clamps[1]};
    const BoundContext context(example.requirement);
    const BoxEnds ends(box, context);
    return bounds::standby_by_engine(BoxQuestion(box, ends, context, context.supplies[0]));
  }
};

}  // namespace

TEST_CASE(
    "A chain that takes a good part of the current turns the clamp's sign, and no bound is drawn from it") {
  TwoClamps two;
  two.example.dropper.capacitance_F = 68e-9;
  two.example.discharge.resistance_ohm = 100e3;
  two.example.discharge_count = 1;
  REQUIRE(two.standby_W(1) < two.standby_W(0));
  REQUIRE(!two.engine_W());
}

TEST_CASE("With an ordinary chain the higher clamp loses more, and the bound is the lower one's loss") {
  const TwoClamps two;
  REQUIRE(two.standby_W(1) > two.standby_W(0));
  const auto bound_W = two.engine_W();
  REQUIRE(bound_W);
  REQUIRE(*bound_W <= two.standby_W(0));
  // Only the slope differs from the lower clamp's own and is the same, and 0.1 K of warmth is given away.
  REQUIRE_THAT(*bound_W, Catch::Matchers::WithinRel(two.standby_W(0), 1e-3));
}
