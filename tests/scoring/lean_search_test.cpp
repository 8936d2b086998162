#include "dropfront/scoring/lean_search.hpp"

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

double margin_A(const test::Example& example) {
  Evidence evidence(example.design(), example.requirement, example.requirement.supplies[0]);
  const auto& lean = evidence.lean();
  REQUIRE(lean.usable);
  return lean.margin_A;
}

/// Least available current over both ambients and all ends, each searched on its own.
double by_trying_all(const test::Example& example) {
  const auto shapes = mains_shapes(example.requirement.supplies[0]);
  const auto design = example.design();
  const auto profile = load_profile(example.requirement.output);
  const double required_V = *required_rail_V(*design.output_stage, example.requirement.output, profile);
  PointSolver points(design, example.requirement, required_V);
  LeanSearch search(points, shapes.lean, 0, true);
  const Rises rises = search.least().rises;
  double least_A = 1e9;
  const auto& ambient = example.requirement.surroundings.ambient_degC;
  for (const double t : {ambient.low, ambient.high}) {
    for (const End series : {End::low, End::high}) {
      for (const End esr : {End::low, End::high}) {
        for (const End discharge : {End::low, End::high}) {
          const auto values = points.values(search.solver().recipe({series, esr, discharge}), rises, t);
          const auto found = circuit::find_available_current(design.arrangement->build, values, required_V);
          REQUIRE(found.usable);
          least_A = std::min(least_A, found.current_A);
        }
      }
    }
  }
  return least_A;
}

}  // namespace

TEST_CASE("The least over ambients and ends is the one that trying them all gives") {
  for (const auto* wiring :
       {"half-wave-clamp-ahead", "half-wave-clamp-across", "bridge-clamp-across", "bridge-clamp-ahead"}) {
    for (const bool knee : {false, true}) {
      test::Example example(wiring);
      if (!knee) example.linear(5, 0.04, 1.7, 1e-3);
      if (knee) example.requirement.output.tolerance = 0.15;  // 10.2 V wanted of a 12 V zener
      INFO(wiring << (knee ? " in the knee" : " saturated"));
      Evidence evidence(example.design(), example.requirement, example.supply());
      const double least_A = by_trying_all(example);
      // Temperatures there are those of the deciding end: a tenth of a kelvin apart is 1e-4 of the current.
      REQUIRE_THAT(evidence.lean().available_A, WithinRel(least_A, 1e-3) || WithinAbs(least_A, 1e-6));
    }
  }
}

TEST_CASE("The margin falls by just what the load rises") {
  test::Example example;
  example.linear(5, 0.04, 1.7, 1e-3);
  const double before = margin_A(example);
  example.requirement.output.loads[1].current_A += 2e-3;
  REQUIRE_THAT(before - margin_A(example), WithinAbs(2e-3, 1e-12));  // the same search, then one subtraction
  example.stage.quiescent_current_A += 1e-3;
  REQUIRE_THAT(before - margin_A(example), WithinAbs(3e-3, 1e-12));
}

TEST_CASE("Whatever makes the line weaker or the parts looser makes the margin smaller") {
  for (const auto* wiring : {"half-wave-clamp-ahead", "bridge-clamp-across"}) {
    test::Example example(wiring);
    example.linear(5, 0.04, 1.7, 1e-3);
    const double before = margin_A(example);
    const auto worse = [&](auto change) {
      auto changed = example;
      change(changed);
      return margin_A(changed);
    };
    REQUIRE(worse([](auto& e) { e.supply().voltage_Vrms.low = 195; }) < before);
    REQUIRE(worse([](auto& e) { e.supply().frequency_Hz.low = 47; }) < before);
    REQUIRE(worse([](auto& e) { e.dropper.tolerance = 0.2; }) < before);
    REQUIRE(worse([](auto& e) { e.dropper.end_of_life_loss = 0.3; }) < before);
    REQUIRE(worse([](auto& e) { e.dropper.capacitance_F = 0.47e-6; }) < before);
    REQUIRE(worse([](auto& e) { e.series_resistor.resistance_ohm = 470; }) < before);
    REQUIRE(worse([](auto& e) { e.reservoir.leakage_A = 1e-3; }) < before);
  }
}

TEST_CASE("Saturated, the available current is the charge balance within a few per cent") {
  // I = f·C·(rises - Vo - 2·Vf) half-wave, 2·f·C·(rises - 2·Vo - 4·Vf) bridge, plus Vpk/(π·Rb) a direction;
  // the slope of the diodes and of a stiff clamp, the ripple and ω·Rs·C = 0.01 are left out: 3 % together.
  for (const auto* wiring : {"half-wave-clamp-ahead", "half-wave-clamp-across", "bridge-clamp-across"}) {
    test::Example example(wiring);
    example.linear(5, 0.04, 1.7, 1e-3);
    example.reservoir.capacitance_F = 1000e-6;
    Evidence evidence(example.design(), example.requirement, example.supply());
    const auto& lean = evidence.lean();
    const auto& values = evidence.lean_hot().values;
    const double Vf = values.rectifier.threshold_V, Vo = evidence.required_rail_V();
    const double bled = values.mains.crest_V() / (3.14159265 * 2 * 470e3);
    const double fC = values.mains.frequency_Hz() * values.dropper_F;
    const double swing = values.mains.sum_of_rises_V();
    const bool bridge = example.arrangement->full_wave;
    const double expected =
        bridge ? 2 * fC * (swing - 2 * Vo - 4 * Vf) + 2 * bled : fC * (swing - Vo - 2 * Vf) + bled;
    INFO(wiring << " " << lean.ends);
    REQUIRE(lean.hot_decides);
    REQUIRE_THAT(lean.available_A, WithinRel(expected, 0.03));
  }
}

TEST_CASE("In the knee the cold decides, saturated the heat: film -200 ppm/K and little else") {
  test::Example example;
  example.clamp = test::zener_10V();
  example.requirement.surroundings.ambient_degC = {-25, 25, 60};
  example.requirement.output.voltage_V = 8.2;
  example.requirement.output.tolerance = 0.0;
  Evidence knee(example.design(), example.requirement, example.supply());
  REQUIRE(knee.lean().usable);
  REQUIRE_FALSE(knee.lean().hot_decides);
  const double cold_A = *knee.available_A(knee.lean_cold()), hot_A = *knee.available_A(knee.lean_hot());
  REQUIRE(cold_A < 0.9 * hot_A);
  example.requirement.output.voltage_V = 5;
  Evidence saturated(example.design(), example.requirement, example.supply());
  REQUIRE(saturated.lean().hot_decides);
  const double loss =
      1 - *saturated.available_A(saturated.lean_hot()) / *saturated.available_A(saturated.lean_cold());
  // 85 K of -200 ppm/K is 1.7 %; a type of -250 ppm/K loses 2.1 %.
  REQUIRE(loss > 0.012);
  REQUIRE(loss < 0.030);
}

TEST_CASE("No current at all, or a stage that states no input minimum, still gives an answer") {
  test::Example example;
  example.requirement.output.voltage_V = 30;  // above the clamp
  Evidence starved(example.design(), example.requirement, example.supply());
  REQUIRE(starved.lean().usable);
  REQUIRE(starved.lean().available_A == 0);
  REQUIRE(starved.lean().margin_A < -9e-3);
  example.stage.kind = parts::StageKind::step_down;
  example.stage.efficiency = 0.8;
  Evidence unstated(example.design(), example.requirement, example.supply());
  REQUIRE_FALSE(unstated.lean().usable);
  REQUIRE_FALSE(unstated.lean().reason.empty());
}
