// What may replace what, case by case.
#include <cmath>

#include "dropfront/scoring/bounds/box_bounder.hpp"
#include "scoring/bounds/support/box_sample.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// A box of two rectifiers, and which of them stay.
struct TwoRectifiers {
  test::Example example{"half-wave-clamp-across"};
  parts::Rectifier first = example.rectifier, second = example.rectifier;

  std::vector<const parts::Rectifier*> left() const {
    auto box = test::box_of(example.design());
    box.rectifiers = {&first, &second};
    const double dropped = BoxBounder(example.requirement).reduce(box);
    CHECK(dropped == 2.0 - static_cast<double>(box.rectifiers.size()));
    return box.rectifiers;
  }
  bool only_first() const { return left() == std::vector<const parts::Rectifier*>{&first}; }
  bool only_second() const { return left() == std::vector<const parts::Rectifier*>{&second}; }
  bool both() const { return left().size() == 2; }
};

}  // namespace

TEST_CASE("Parts equal in everything stay side by side") { REQUIRE(TwoRectifiers{}.both()); }

TEST_CASE("The dearer or larger of two otherwise equal parts goes, whichever stands first") {
  TwoRectifiers dearer;
  dearer.first.info.price_breaks[0].price_micro += 1;
  REQUIRE(dearer.only_second());
  TwoRectifiers larger;
  *larger.second.info.width_um += 1;
  REQUIRE(larger.only_first());
  TwoRectifiers mixed = dearer;
  *mixed.second.info.width_um += 1;
  REQUIRE(mixed.both());
}

TEST_CASE("A price that no objective counts replaces only what stands later") {
  TwoRectifiers parts;
  parts.example.requirement.objectives = {Objective::standby_loss};
  parts.first.info.price_breaks[0].price_micro += 1;
  REQUIRE(parts.both());
  std::swap(parts.first, parts.second);
  REQUIRE(parts.only_first());
}

TEST_CASE("A better rating keeps a dearer part while it counts, and no longer than that") {
  TwoRectifiers parts;
  parts.second.info.price_breaks[0].price_micro += 1;
  parts.second.reverse_voltage_V = 2000;  // twice the crest is below the first one's 1000 V
  REQUIRE(parts.only_first());
  parts.first.reverse_voltage_V = 400;
  REQUIRE(parts.both());
}

TEST_CASE("With price and size equal the earlier part stays, unless its rating is worse") {
  TwoRectifiers parts;
  parts.second.surge_current_A = 3;
  REQUIRE(parts.only_first());
  std::swap(parts.first, parts.second);
  REQUIRE(parts.both());
}

TEST_CASE("A rating that is not given neither replaces nor is replaced by one that is") {
  TwoRectifiers parts;
  parts.first.info.price_breaks[0].price_micro += 1;
  parts.second.surge_current_A.reset();
  REQUIRE(parts.both());
  std::swap(parts.first, parts.second);
  parts.second.info.price_breaks[0].price_micro += 2;
  REQUIRE(parts.both());
}

TEST_CASE("Whatever the circuit sees keeps parts apart") {
  TwoRectifiers parts;
  parts.first.info.price_breaks[0].price_micro += 1;
  parts.first.slope_resistance_ohm *= 1.0000001;
  REQUIRE(parts.both());
}

TEST_CASE("A chain of two replaces a dearer single element of the same resistance and better share") {
  test::Example example("half-wave-clamp-across");
  parts::Resistor whole = example.discharge;
  whole.resistance_ohm = 940e3;
  whole.info.price_breaks[0].price_micro = 50'000;
  *whole.info.length_um = 12'000;
  auto box = test::box_of(example.design());
  box.discharges = {{&whole, 1}, {&example.discharge, 2}};
  // One element bears the whole voltage: its 0.25 W and 200 V are worse than two of the same.
  REQUIRE(BoxBounder(example.requirement).reduce(box) == 1);
  REQUIRE(box.discharges.front().count == 2);
}

TEST_CASE("Where a surge is asked for, no pulse rating suffices by the plug-in alone") {
  TwoRectifiers parts;
  parts.second.info.price_breaks[0].price_micro += 1;
  parts.second.reverse_voltage_V = 2000;
  REQUIRE(parts.only_first());
  parts.example.requirement.limits.surge = Surge{1000, 2};
  REQUIRE(parts.both());
}
