#include "dropfront/scoring/score.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/scoring/check_table.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// A design that keeps its limits: a stiff pulse rating and a modest load are what it takes.
test::Example sound(const char* wiring = "half-wave-clamp-across") {
  test::Example example(wiring);
  example.linear(5, 0.04, 1.7, 1e-3);
  example.stage.input_max_V = 60;
  example.stage.thermal_resistance_K_per_W = 100;
  example.stage.max_junction_degC = 150;
  example.reservoir.surge_voltage_V = 60;
  example.reservoir.rated_voltage_V = 35;
  example.clamp.pulse_power_W = 60;
  return example;
}

const Check* find(const Score& score, std::string_view id) {
  const auto it = std::find_if(score.checks.begin(), score.checks.end(),
                               [&](const Check& check) { return check.id == id; });
  return it == score.checks.end() ? nullptr : &*it;
}

void require_finite(const Score& score) {
  REQUIRE(std::isfinite(score.violation));
  for (const auto& figure :
       {score.objectives.standby_loss_W, score.objectives.current_margin_A, score.current_margin_new_A}) {
    if (figure) REQUIRE(std::isfinite(*figure));
  }
  for (const auto& check : score.checks) {
    INFO(check.id);
    if (check.value) REQUIRE(std::isfinite(*check.value));
    if (check.limit) REQUIRE(std::isfinite(*check.limit));
  }
}

}  // namespace

TEST_CASE("A sound design complies, with every check worked out and all operating points beside it") {
  const auto example = sound();
  const auto result = score(example.design(), example.requirement, Depth::full);
  for (const auto& check : result.checks) {
    INFO(check.id << " " << check.value.value_or(-1) << " against " << check.limit.value_or(-1));
    REQUIRE(check.pass.value_or(false));
  }
  REQUIRE(result.verdict == Verdict::compliant);
  REQUIRE(result.complete);
  REQUIRE(result.violation == 0);
  REQUIRE(result.operations.size() == 1);
  REQUIRE(result.operations[0].operations.size() == 7);
  for (const auto& row : result.operations[0].operations) {
    INFO(row.corner);
    REQUIRE(row.state.usable());
    REQUIRE(row.available_current_A.has_value());
  }
  REQUIRE(*result.current_margin_new_A > *result.objectives.current_margin_A);
}

TEST_CASE("A deeper score repeats a shallower one to the bit") {
  for (const auto* wiring : {"half-wave-clamp-across", "bridge-clamp-across"}) {
    const auto example = sound(wiring);
    const auto full = score(example.design(), example.requirement, Depth::full);
    for (const auto depth : {Depth::cheap, Depth::screen, Depth::compliant}) {
      const auto part = score(example.design(), example.requirement, depth);
      REQUIRE(part.objectives.cost_micro == full.objectives.cost_micro);
      REQUIRE(part.objectives.board_area_um2 == full.objectives.board_area_um2);
      if (depth != Depth::cheap) {
        REQUIRE(part.objectives.standby_loss_W == full.objectives.standby_loss_W);
        REQUIRE(part.objectives.current_margin_A == full.objectives.current_margin_A);
      }
      for (const auto& check : part.checks) {
        const auto* same = find(full, check.id);
        INFO(check.id);
        REQUIRE(same != nullptr);
        REQUIRE(check.value == same->value);
        REQUIRE(check.limit == same->limit);
        REQUIRE(check.pass == same->pass);
      }
    }
  }
}

TEST_CASE("A scorer used again gives the same bits, whatever it scored in between") {
  const auto example = sound(), other = sound("bridge-clamp-ahead");
  const Scorer scorer(example.requirement);
  const auto first = scorer.score(example.design(), Depth::screen);
  scorer.score(other.design(), Depth::full);
  const auto again = scorer.score(example.design(), Depth::screen);
  REQUIRE(first.objectives.current_margin_A == again.objectives.current_margin_A);
  REQUIRE(first.objectives.standby_loss_W == again.objectives.standby_loss_W);
}

TEST_CASE("Of several supplies the worst counts, and a check says on which") {
  auto example = sound();
  example.supply().name = "Europe";
  const auto one = score(example.design(), example.requirement, Depth::full);
  example.requirement.supplies.push_back({"weak", {180, 200, 253}, {49.5, 50, 50.5}, {}, false, false});
  const auto two = score(example.design(), example.requirement, Depth::full);
  REQUIRE(*two.objectives.current_margin_A < *one.objectives.current_margin_A);
  REQUIRE(two.objectives.standby_loss_W == one.objectives.standby_loss_W);  // the greater of both
  REQUIRE(find(two, "supply.margin")->at.supply == "weak");
  REQUIRE(find(two, "standby.power") == nullptr);  // no limit, no check
  REQUIRE(two.operations.size() == 2);
  REQUIRE(two.operations[1].supply == "weak");
}

TEST_CASE("A failing design breaks limits at every depth that looks, and stops early where asked") {
  auto example = sound();
  example.requirement.output.loads[1].current_A = 50e-3;
  for (const auto depth : {Depth::screen, Depth::compliant, Depth::full}) {
    const auto result = score(example.design(), example.requirement, depth);
    REQUIRE(result.verdict == Verdict::breaks_limits);
    REQUIRE(result.violation > 0);
    REQUIRE(result.complete == (depth == Depth::full));
    REQUIRE_FALSE(*find(result, "supply.margin")->pass);
  }
}

TEST_CASE("Violation grows with the shortfall, smoothly enough to follow") {
  auto example = sound();
  double last = 0;
  for (double load_A = 16e-3; load_A < 60e-3; load_A += 4e-3) {
    example.requirement.output.loads[1].current_A = load_A;
    const double violation = score(example.design(), example.requirement, Depth::screen).violation;
    REQUIRE(violation > last);
    last = violation;
  }
}

TEST_CASE("The caller's stop is asked with what is known, and obeyed") {
  const auto example = sound();
  const Scorer scorer(example.requirement);
  int calls = 0;
  const auto at_once = scorer.score(example.design(), Depth::full, [&](const Objectives& known) {
    ++calls;
    REQUIRE(known.cost_micro.has_value());
    REQUIRE_FALSE(known.standby_loss_W.has_value());
    return true;
  });
  REQUIRE(calls == 1);
  REQUIRE_FALSE(at_once.complete);
  REQUIRE(at_once.steady_states == 0);
  const auto late = scorer.score(example.design(), Depth::full,
                                 [&](const Objectives& known) { return known.current_margin_A.has_value(); });
  REQUIRE_FALSE(late.complete);
  REQUIRE(late.objectives.standby_loss_W.has_value());
  REQUIRE(late.transients == 0);
}

TEST_CASE("Any design gives a verdict: empty, absurd or starved") {
  const Requirement nothing;
  REQUIRE(score({}, nothing, Depth::full).verdict == Verdict::undefined);
  auto example = sound();
  auto design = example.design();
  design.clamp = nullptr;
  const auto holed = score(design, example.requirement, Depth::full);
  REQUIRE(holed.verdict == Verdict::undefined);
  REQUIRE(holed.cautions.size() == 1);
  for (int which = 0; which < 6; ++which) {
    auto odd = sound();
    if (which == 0) odd.dropper.capacitance_F = 1e-12;
    if (which == 1) odd.series_resistor.resistance_ohm = 1e7;
    if (which == 2) odd.clamp = test::one_watt_zener(300, 1e-3, 100, 1000, 1e-4, 1e-3);
    if (which == 3) odd.reservoir.capacitance_F = 1e-9;
    if (which == 4) odd.requirement.surroundings.enclosure_K_per_W = 500;
    if (which == 5) odd.dropper.capacitance_F = 1e-3;
    INFO(which);
    const auto result = score(odd.design(), odd.requirement, Depth::full);
    REQUIRE(result.verdict != Verdict::compliant);
    require_finite(result);
  }
}

TEST_CASE("Figures are finite in every arrangement and kind of stage") {
  for (const auto& wiring : circuit::arrangements()) {
    for (const auto kind :
         {parts::StageKind::direct, parts::StageKind::linear, parts::StageKind::step_down}) {
      auto example = sound(std::string(wiring.name).c_str());
      example.stage.kind = kind;
      example.stage.efficiency = 0.8;
      example.stage.input_min_V = 7;
      example.stage.input_on_V = 8;
      require_finite(score(example.design(), example.requirement, Depth::full));
    }
  }
}

TEST_CASE("A whole worst-case score takes a bounded number of steady states") {
  // Most are half a solution (rail only, warm): the time goes with fewer than ninety whole ones.
  for (const auto& wiring : circuit::arrangements()) {
    const auto example = sound(std::string(wiring.name).c_str());
    const auto result = score(example.design(), example.requirement, Depth::compliant);
    INFO(wiring.name << ": " << result.steady_states << " and " << result.transients << " transients");
    REQUIRE(result.steady_states <= 90);
    REQUIRE(result.transients <= 10);  // eight plug-ins, and a shunt's kick at both ambients
  }
}
