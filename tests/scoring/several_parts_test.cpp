// Two equal parts that act as one: series resistors in series, droppers in parallel.
#include <cmath>

#include "dropfront/scoring/board_area.hpp"
#include "dropfront/scoring/cost.hpp"
#include "dropfront/scoring/score.hpp"
#include "scoring/checks/judge.hpp"
#include "support/catch.hpp"

namespace dropfront::scoring {
namespace {

using Catch::Matchers::WithinRel;
using test::Example;

constexpr double kRounding = 1e-12;

Check judged(const Example& example, const Design& design, CheckFunction* check) {
  Evidence evidence(design, example.requirement, example.requirement.supplies[0]);
  return check(evidence).value();
}

/// The same network twice: as one part, and as two of half the value that act as one.
struct Pair {
  Example whole, halves;
  Design one() const { return whole.design(); }
  Design two(bool resistors) const {
    Design design = halves.design();
    (resistors ? design.series_resistor_count : design.dropper_count) = 2;
    return design;
  }
};

Pair split_resistor() {
  Pair pair;
  pair.halves.series_resistor.resistance_ohm /= 2;
  return pair;
}

Pair doubled_dropper() {
  Pair pair;
  pair.halves.dropper.capacitance_F /= 2;
  return pair;
}

TEST_CASE("the circuit sees the sum: two halves give the whole part's operating points") {
  for (const bool resistors : {true, false}) {
    const auto pair = resistors ? split_resistor() : doubled_dropper();
    const auto one = score(pair.one(), pair.whole.requirement, Depth::screen);
    const auto two = score(pair.two(resistors), pair.halves.requirement, Depth::screen);
    // Halving and doubling are exact in binary, so nothing differs.
    CHECK(one.objectives.standby_loss_W == two.objectives.standby_loss_W);
    CHECK(one.objectives.current_margin_A == two.objectives.current_margin_A);
  }
}

TEST_CASE("two parts are bought, placed and paid for twice") {
  for (const bool resistors : {true, false}) {
    const auto pair = resistors ? split_resistor() : doubled_dropper();
    const auto& info = resistors ? pair.whole.series_resistor.info : pair.whole.dropper.info;
    const auto& need = pair.whole.requirement;
    CHECK(*cost_micro(pair.two(resistors), need) - *cost_micro(pair.one(), need) ==
          parts::price_micro_at(info, need.volume).value());
    const auto around = 2 * mains_margin_um(need);
    CHECK(*board_area_um2(pair.two(resistors), need) - *board_area_um2(pair.one(), need) ==
          (*info.length_um + around) * (*info.width_um + around));
  }
}

TEST_CASE("each of two series resistors takes half the loss and half the running voltage") {
  const auto pair = split_resistor();
  for (auto* check : {resistor_power, resistor_voltage}) {
    const auto one = judged(pair.whole, pair.one(), check), two = judged(pair.halves, pair.two(true), check);
    INFO(one.id);
    CHECK_THAT(*two.value, WithinRel(*one.value / 2, kRounding));
    CHECK(*two.limit == *one.limit);
  }
}

TEST_CASE("a pulse divides by the unluckiest share: R_max against R_max + R_min") {
  const auto pair = split_resistor();
  const double share = 1.05 / (1.05 + 0.95);  // 5 % parts
  for (auto* check : {resistor_pulse, resistor_pulse_voltage}) {
    const auto one = judged(pair.whole, pair.one(), check), two = judged(pair.halves, pair.two(true), check);
    INFO(one.id);
    CHECK_THAT(*two.value, WithinRel(*one.value * share, kRounding));
    CHECK(*two.limit == *one.limit);
  }
}

TEST_CASE(
    "split in two, a shorted dropper heats each half with half the power, so opening is harder to show") {
  const auto pair = split_resistor();
  const auto one = judged(pair.whole, pair.one(), resistor_opens);
  const auto two = judged(pair.halves, pair.two(true), resistor_opens);
  CHECK_THAT(*two.value, WithinRel(*one.value / 2, kRounding));
}

TEST_CASE("droppers in parallel slew alike, hold their charge together and count together for the rule") {
  auto pair = doubled_dropper();
  CHECK(judged(pair.whole, pair.one(), dropper_slew).value ==
        judged(pair.halves, pair.two(false), dropper_slew).value);
  for (auto* example : {&pair.whole, &pair.halves}) {
    example->requirement.limits.discharge = DischargeRule{};
    example->dropper.tolerance = 0;
  }
  CHECK(judged(pair.whole, pair.one(), discharge_voltage).value ==
        judged(pair.halves, pair.two(false), discharge_voltage).value);
  // Two of 0.08 uF are 0.16 uF: over the 0.1 uF that one alone stays under.
  pair.halves.dropper.capacitance_F = 0.08e-6;
  CHECK_FALSE(test::judge(pair.halves, discharge_voltage));
  CHECK(judged(pair.halves, pair.two(false), discharge_voltage).value);
}

}  // namespace
}  // namespace dropfront::scoring
