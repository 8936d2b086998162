#include "dropfront/scoring/tolerance_box.hpp"

#include <algorithm>

#include "dropfront/scoring/box_values.hpp"
#include "dropfront/scoring/corner_trial.hpp"
#include "dropfront/scoring/tolerance_cost.hpp"
#include "dropfront/values/random.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;

// What settled temperatures leave open: 0.1 K of a junction is 1e-4 of the clamp's voltage.
constexpr double kSettled = 1e-3;

ToleranceBox box_of(const test::Example& example, BoxQuantity quantity) {
  return {example.design(), example.requirement, example.requirement.supplies.front(), quantity};
}

/// A 5 V regulator behind the 12 V clamp: the rail it needs lies far below the clamp.
test::Example saturated() {
  test::Example example;
  example.requirement.output.voltage_V = 5;
  example.linear(5, 0.04, 0.3, 1e-3);
  return example;
}

std::size_t axis_named(const ToleranceBox& box, std::string_view name) {
  const auto& axes = box.axes();
  const auto found =
      std::find_if(axes.begin(), axes.end(), [&](const auto& axis) { return axis.name == name; });
  return static_cast<std::size_t>(found - axes.begin());
}

TEST_CASE("in saturation the current a build delivers goes with its capacitance") {
  // Charge balance: I = f·C·(2·Vpk - Vo - 2·Vf), nothing else in it changes with C.
  test::Example example = saturated();
  example.discharge_count = 0;  // the chain's current does not go through the dropper
  const auto box = box_of(example, BoxQuantity::margin);
  auto position = box.corner();
  const std::size_t dropper = axis_named(box, "dropper_F");
  std::vector<double> delivered;
  for (const double u : {0.0, 0.5, 1.0}) {
    position[dropper] = u;
    const auto margin = box.at(position);
    REQUIRE(margin);
    delivered.push_back(*margin + 10e-3 + 1e-3 + example.reservoir.leakage_A);
  }
  // The drop across Rs grows with the current: 0.4 % at most here (ω·Rs·C = 0.01, squared in the amplitude).
  CHECK_THAT(delivered[1] / delivered[0], WithinRel(1 / 0.9, 4e-3));
  CHECK_THAT(delivered[2] / delivered[0], WithinRel(1.1 / 0.9, 4e-3));
}

TEST_CASE("each axis moves the quantity the way the circuit does") {
  const test::Example example;
  struct Direction {
    BoxQuantity quantity;
    const char* axis;
    bool rises;
  };
  for (const auto& d :
       {Direction{BoxQuantity::margin, "line_voltage_Vrms", true},
        Direction{BoxQuantity::margin, "line_frequency_Hz", true},
        Direction{BoxQuantity::margin, "age_lives", false}, Direction{BoxQuantity::rail, "clamp_V", true},
        Direction{BoxQuantity::rail, "line_voltage_Vrms", true},
        Direction{BoxQuantity::standby, "dropper_F", true},
        Direction{BoxQuantity::standby, "discharge_element_ohm", false},
        Direction{BoxQuantity::clamp_power, "load_share", false},
        Direction{BoxQuantity::resistor_power, "series_resistor_ohm", true},
        Direction{BoxQuantity::input_power, "line_frequency_Hz", true}}) {
    const auto box = box_of(example, d.quantity);
    std::vector<double> position(box.axes().size(), 0.5);
    const std::size_t axis = axis_named(box, d.axis);
    INFO(d.axis << " of " << box_quantity_name(d.quantity));
    REQUIRE(axis < position.size());
    position[axis] = 0;
    const auto low = box.at(position);
    position[axis] = 1;
    const auto high = box.at(position);
    REQUIRE((low && high));
    CHECK((*high > *low) == d.rises);
  }
}

TEST_CASE("points inside the tolerances are no worse than the corners of a saturated design") {
  const test::Example example = saturated();
  values::RandomStream random(11);
  for (const auto quantity : {BoxQuantity::margin, BoxQuantity::rail, BoxQuantity::standby,
                              BoxQuantity::clamp_power, BoxQuantity::input_power}) {
    const auto box = box_of(example, quantity);
    const auto corner =
        corner_value(quantity, example.design(), example.requirement, example.requirement.supplies.front());
    REQUIRE(corner);
    INFO(box_quantity_name(quantity));
    for (int i = 0; i < 60; ++i) {
      std::vector<double> position(box.axes().size());
      for (double& u : position) u = i % 2 == 0 ? random.uniform01() : static_cast<double>(random.below(2));
      const auto value = box.at(position);
      REQUIRE(value);
      const double slack = kSettled * (std::abs(*corner) + (least_counts(quantity) ? 10e-3 : 0));
      if (least_counts(quantity))
        CHECK(*value >= *corner - slack);
      else
        CHECK(*value <= *corner + slack);
    }
  }
}

TEST_CASE("behind a soft zener the flat-topped line drives an unloaded rail higher than the peaked one") {
  // The zener's peak voltage goes with the peak of C·dv/dt. At the zero crossing the slope of the line with a
  // third harmonic p is V1·w·(1 + 3p) in phase and V1·w·(1 - 3p) in opposition; with p = 3 % its greatest
  // slope is 1.09·V1·w against 0.91·V1·w. Crest and slope pull different ways: a stiff zener feels
  // neither much.
  test::Example example;
  example.dropper.capacitance_F = 2.2e-6;
  example.clamp = test::zener_24V();
  example.reservoir.esr_ohm = example.reservoir.esr_cold_ohm = 0.01;
  const auto box = box_of(example, BoxQuantity::rail);
  auto position = box.corner();
  position[axis_named(box, "clamp_slope_ohm")] = 1;
  const std::size_t turn = axis_named(box, "first_harmonic_half_turns");
  REQUIRE(turn < position.size());
  position[turn] = 0;
  const auto flat = box.at(position);
  position[turn] = 1;
  const auto peaked = box.at(position);
  REQUIRE((flat && peaked));
  CHECK(*flat > *peaked);
}

TEST_CASE("where no envelope stands between them, the worst vertex is the corner") {
  test::Example example = saturated();
  example.clamp.slope_min_ohm = example.clamp.slope_resistance_ohm;
  example.clamp.knee_current_A.reset();  // the sharp curve at both ends
  for (const auto quantity : {BoxQuantity::margin, BoxQuantity::rail, BoxQuantity::standby}) {
    const auto box = box_of(example, quantity);
    auto position = box.corner();
    std::optional<double> worst;
    // Both ends of what the corner tries both ends of.
    for (unsigned ends = 0; ends < 8; ++ends) {
      auto turned = position;
      unsigned bit = 0;
      for (const char* name : {"series_resistor_ohm", "reservoir_esr_ohm", "ambient_degC"}) {
        const std::size_t axis = axis_named(box, name);
        if (axis < turned.size()) turned[axis] = (ends >> bit & 1U) != 0 ? 1 : 0;
        ++bit;
      }
      const auto value = box.at(turned);
      REQUIRE(value);
      if (!worst || (least_counts(quantity) ? *value < *worst : *value > *worst)) worst = value;
    }
    const auto corner =
        corner_value(quantity, example.design(), example.requirement, example.requirement.supplies.front());
    INFO(box_quantity_name(quantity));
    CHECK_THAT(*worst, WithinRel(*corner, 2 * kSettled));
  }
}

TEST_CASE("a build tried at the corner's conditions is a point of the boxes") {
  const test::Example example;
  const CornerTrial trial(example.design(), example.requirement, example.requirement.supplies.front());
  const auto box = box_of(example, BoxQuantity::standby);
  const auto figures = trial.at(box.corner());
  const auto& standby = figures[static_cast<std::size_t>(BoxQuantity::standby)];
  REQUIRE(standby);
  CHECK(*standby == *box.at(box.corner()));
  for (const auto& figure : figures) CHECK(figure);
}

TEST_CASE("an incomplete stage leaves the margin without an answer") {
  test::Example example;
  example.stage.kind = parts::StageKind::step_down;
  example.stage.input_min_V.reset();
  const auto box = box_of(example, BoxQuantity::margin);
  CHECK_FALSE(box.at(box.corner()));
}

TEST_CASE("a part's spread costs what the margin gains without it") {
  test::Example example = saturated();
  example.discharge_count = 0;
  const auto costs = tolerance_costs(example.design(), example.requirement);
  const auto cost_of = [&](std::string_view slot, std::string_view what) {
    const auto found = std::find_if(costs.begin(), costs.end(),
                                    [&](const auto& c) { return c.slot == slot && c.what == what; });
    return found != costs.end() ? found->margin_A : -1;
  };
  const auto lean = corner_value(BoxQuantity::margin, example.design(), example.requirement,
                                 example.requirement.supplies.front());
  REQUIRE(lean);
  // The delivered current goes with C(1 - 10 %)(1 - 10 %): each tenth taken back is worth a ninth of it.
  const double delivered_A = *lean + 10e-3 + 1e-3 + example.reservoir.leakage_A;
  CHECK_THAT(cost_of("dropper", "tolerance"), WithinRel(delivered_A / 9, 0.01));
  CHECK_THAT(cost_of("dropper", "ageing"), WithinRel(delivered_A / 9, 0.01));
  example.dropper.tolerance = 0;
  for (const auto& cost : tolerance_costs(example.design(), example.requirement))
    CHECK((cost.slot != "dropper" || cost.what != "tolerance"));
}

}  // namespace
}  // namespace dropfront::scoring
