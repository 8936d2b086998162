#include "dropfront/scoring/surge.hpp"

#include <algorithm>

#include "dropfront/circuit/surge_wave.hpp"
#include "scoring/support/surge_bench.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;
using Bench = dropfront::scoring::test::SurgeBench;
using dropfront::scoring::test::example_with;
using dropfront::scoring::test::kSurgeWirings;
using dropfront::scoring::test::surge;

TEST_CASE("More surge volts never mean less stress") {
  for (const auto& arrangement : circuit::arrangements()) {
    if (!arrangement.dropper) continue;
    SurgeAnswer before;
    for (const double volts : {250.0, 500.0, 1000.0, 2000.0}) {
      const auto now = surge(example_with(arrangement.name.data(), volts));
      INFO(arrangement.name << " at " << volts);
      CHECK(now.rail.rail_max_V >= before.rail.rail_max_V);
      // A shunt's zener only triggers it.
      if (!arrangement.thyristor_shunt)
        CHECK(now.clamp.clamp_stress_W_sqrt_s >= before.clamp.clamp_stress_W_sqrt_s);
      CHECK(now.resistors.front().resistor.energy_J > before.dropper.resistor.energy_J);
      CHECK(now.dropper.dropper_peak_V > before.dropper.dropper_peak_V);
      CHECK(now.line.line_A2s > before.line.line_A2s);
      CHECK(now.rectifier.rectifier_peak_A > before.rectifier.rectifier_peak_A);
      before = now;
    }
  }
}

TEST_CASE("A varistor cuts the surge that adds to the crest and does nothing for the opposite polarity") {
  for (const char* wiring : kSurgeWirings) {
    auto example = example_with(wiring, 700);
    const Bench bare(example);
    example.guarded = true;
    const Bench guarded(example);
    INFO(wiring);
    // 358 + 700 V is far above the 710 V it holds at 50 A; 358 - 700 V lies below the 387 V at which it
    // begins.
    CHECK(guarded.run(90, 700, 47).resistor.energy_J < 0.5 * bare.run(90, 700, 47).resistor.energy_J);
    const auto with = guarded.run(90, -700, 47), without = bare.run(90, -700, 47);
    CHECK_THAT(with.resistor.energy_J, WithinRel(without.resistor.energy_J, 1e-9));
    CHECK_THAT(with.rail_max_V, WithinRel(without.rail_max_V, 1e-9));
    CHECK_THAT(with.dropper_peak_V, WithinRel(without.dropper_peak_V, 1e-9));
    CHECK(with.varistor_energy_J == 0);
  }
}

TEST_CASE("Behind the series resistor a varistor takes little and the resistor takes the surge") {
  auto example = example_with("half-wave-clamp-ahead", 1000);
  example.guarded = true;
  const auto before = surge(example);
  example.varistor_before = false;
  const auto after = surge(example);
  CHECK(before.varistor.varistor_energy_J > 10 * after.varistor.varistor_energy_J);
  CHECK(after.resistors.front().resistor.energy_J > before.resistors.front().resistor.energy_J);
  // Greatest current: what the source can drive at all into the law's low end.
  const auto law = varistor_law(example.varistor, VaristorEnd::low).value();
  const double crest_V = before.varistor_peak.values.mains.crest_V();
  CHECK(before.varistor_peak.varistor_peak_A <= circuit::current_behind_A(law, crest_V + 1000, 2));
  CHECK(before.varistor_peak.varistor_peak_A > 0.9 * circuit::current_behind_A(law, crest_V + 1000, 2));
}

TEST_CASE("No part takes more than the generator and the mains behind it can deliver") {
  // Into a matched load, for as long as the wave lasts: integral of (crest + surge)^2 / (4·r), the mains
  // taken at its crest for five time constants of the tail.
  for (const int varistor : {0, 1, 2}) {
    auto example = example_with("half-wave-clamp-across", 1000);
    example.guarded = varistor > 0;
    example.varistor_before = varistor == 1;
    const auto answer = surge(example);
    const double crest_V = answer.rail.values.mains.crest_V();
    const double most_J = (1e6 * 36.03e-6 + 2 * crest_V * 1e3 * 70.32e-6 +
                           crest_V * crest_V * 5 * circuit::SurgeWave::kTail_s) /
                          (4 * 2.0);
    CHECK(answer.varistor.varistor_energy_J < most_J);
    for (const auto& run : answer.resistors) CHECK(run.resistor.energy_J < most_J);
  }
}

TEST_CASE("Without a dropper the series resistor holds the surge back") {
  auto example = example_with("resistive", 1000);
  example.series_resistor.resistance_ohm = 22e3;
  const auto answer = surge(example);
  // The wave's own squared integral over the resistor, crest and wave together at most; front and tail of 36
  // us.
  const double crest_V = answer.rail.values.mains.crest_V();
  const auto& run = answer.resistors.front();
  CHECK(run.resistor.peak_A <= (crest_V + 1000) / run.values.series_resistor_ohm);
  CHECK(run.resistor.peak_A >= 0.97 * (crest_V + 1000 - 20) / run.values.series_resistor_ohm);
  CHECK(answer.dropper.dropper_peak_V == 0);
}

TEST_CASE("A supply without a steady state has no surge answer, and says why") {
  auto example = example_with("half-wave-clamp-ahead", 1000);
  Evidence evidence(example.design(), example.requirement, example.supply());
  const auto& rest = evidence.rich_empty();
  OperatingPoint broken = rest;
  broken.state.status = circuit::SteadyStatus::failed;
  broken.state.reason = "made up";
  const auto shapes = mains_shapes(example.supply());
  const auto design = example.design();
  const PointSolver points(design, example.requirement, 6);
  int transients = 0;
  const auto answer = run_surges(points, rich_recipe(shapes), {&broken}, {1000, 2}, transients);
  CHECK_FALSE(answer.usable);
  CHECK(answer.reason == "made up");
  CHECK(transients == 0);
}
