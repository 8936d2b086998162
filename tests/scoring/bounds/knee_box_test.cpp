// In the knee of the clamp a larger series resistance raises the available current, because the dead time
// shrinks: a bound that took the resistor as monotone would lose designs. The box of the case that shows it.
#include <algorithm>

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/scoring/bounds/bound_table.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "scoring/bounds/support/box_sample.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// A bridge at 128.5 V, 60 Hz with 2.49 uF, a 17.6 V clamp and 33 uF, asked for 16 V: everything exact, so
/// that every corner has these values.
struct KneeBox {
  test::Example example{"bridge-clamp-across"};
  std::array<parts::Resistor, 3> resistors;
  DesignBox box;

  KneeBox() {
    example.supply() = {"", {128.5, 128.5, 128.5}, {60, 60, 60}, {}, true, true};
    example.requirement.surroundings.ambient_degC = {25, 25, 25};
    example.requirement.output.voltage_V = 16;
    example.requirement.output.tolerance = 0;
    auto& film = example.dropper;
    film.capacitance_F = 2.49e-6;
    film.tolerance = film.end_of_life_loss = film.loss_tangent = film.temperature_coefficient_per_K = 0;
    auto& clamp = example.clamp;
    clamp.voltage_V = clamp.voltage_min_V = clamp.voltage_max_V = 17.6;
    clamp.knee_current_A.reset();
    clamp.slope_min_ohm = clamp.slope_resistance_ohm = 1e-3;
    clamp.temperature_coefficient_per_K = 0;
    auto& can = example.reservoir;
    can.capacitance_F = 33e-6;
    can.tolerance = can.end_of_life_loss = can.esr_ohm = can.leakage_A = 0;
    example.discharge_count = 0;
    example.stage.output_voltage_V = 16;
    resistors.fill(example.series_resistor);
    box = test::box_of(example.design());
    box.series_resistors.clear();
    const std::array<double, 3> values_ohm{67, 135, 270};
    for (std::size_t i = 0; i < 3; ++i) {
      resistors[i].resistance_ohm = values_ohm[i];
      resistors[i].tolerance = 0;
      box.series_resistors.push_back(&resistors[i]);
    }
  }
  KneeBox(const KneeBox&) = delete;

  double margin_A(std::size_t i) const {
    Design design = example.design();
    design.series_resistor = &resistors[i];
    return Evidence(design, example.requirement, example.requirement.supplies[0]).lean().margin_A;
  }
};

/// What a rule says of a box.
std::optional<double> say(bounds::ObjectiveBound* rule, const DesignBox& box,
                          const Requirement& requirement) {
  const BoundContext context(requirement);
  const BoxEnds ends(box, context);
  return rule(BoxQuestion(box, ends, context, context.supplies[0]));
}

}  // namespace

TEST_CASE("A bridge in the knee delivers more through more ohms: 29.4, 31.0, 33.8 mA at 67, 135, 270 ohm") {
  const KneeBox knee;
  const double heaviest_A = 10e-3;
  // Simulator figures as restated, to their last digit; the rectifier's curve there is not stated.
  REQUIRE_THAT(1e3 * (knee.margin_A(0) + heaviest_A), WithinAbs(29.4, 0.3));
  REQUIRE_THAT(1e3 * (knee.margin_A(1) + heaviest_A), WithinAbs(31.0, 0.3));
  REQUIRE_THAT(1e3 * (knee.margin_A(2) + heaviest_A), WithinAbs(33.8, 0.3));
}

TEST_CASE("That box breaks a bound that takes the series resistor as monotone, whichever way") {
  const KneeBox knee;
  const auto alone = [&](std::size_t i) {
    DesignBox box = knee.box;
    box.series_resistors = {&knee.resistors[i]};
    return say(bounds::margin_by_engine, box, knee.example.requirement).value();
  };
  // As if the least ohms gave the most current: the member with 270 ohm beats that "bound" by milliamperes.
  REQUIRE(knee.margin_A(2) > alone(0) + 3e-3);
  // The other way fails away from the knee, with the rail well below the clamp.
  KneeBox saturated;
  saturated.example.requirement.output.voltage_V = 8;
  saturated.example.stage.output_voltage_V = 8;
  REQUIRE(saturated.margin_A(0) > saturated.margin_A(2) + 1e-4);
}

TEST_CASE("The bounds of that box hold, and the engine's says nothing of it until one resistor is left") {
  const KneeBox knee;
  const auto& requirement = knee.example.requirement;
  REQUIRE(!say(bounds::margin_by_engine, knee.box, requirement));
  const double ceiling_A = say(bounds::margin_by_charge, knee.box, requirement).value();
  for (std::size_t i = 0; i < 3; ++i) {
    REQUIRE(knee.margin_A(i) <= ceiling_A);
    DesignBox box = knee.box;
    box.series_resistors = {&knee.resistors[i]};
    const double single_A = say(bounds::margin_by_engine, box, requirement).value();
    REQUIRE(knee.margin_A(i) <= single_A);
    // Nothing else is free: the engine's bound is the member itself, within its own tolerance.
    REQUIRE_THAT(single_A, WithinAbs(knee.margin_A(i), 1e-6));
  }
}
