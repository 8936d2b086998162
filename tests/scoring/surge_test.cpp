#include "dropfront/scoring/surge.hpp"

#include <cmath>

#include "dropfront/circuit/surge_wave.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/recipes.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

SurgeAnswer surge(const test::Example& example) {
  Evidence evidence(example.design(), example.requirement, example.requirement.supplies.front());
  const auto answer = evidence.surge();
  INFO(answer.reason);
  REQUIRE(answer.usable);
  return answer;
}

test::Example example_with(const char* wiring, double surge_V) {
  test::Example example(wiring);
  example.linear(5, 0.04, 1.7, 1e-3);
  example.surge(surge_V);
  return example;
}

/// One run at a place of one's own choice.
struct Bench {
  explicit Bench(const test::Example& of)
      : example(of),
        design(example.design()),
        points(design, example.requirement, 6),
        shapes(mains_shapes(example.supply())),
        rest(points.solve("rich_empty", rich_recipe(shapes), {}, 50)),
        moments(surge_moments(points, rest, {0, 90, 180, 270})) {
    REQUIRE(rest.state.usable());
    REQUIRE(moments.size() == 4);
  }
  const SurgeMoment& moment(double phase_deg) const {
    for (const auto& m : moments)
      if (m.phase_deg == phase_deg) return m;
    FAIL("no such phase");
    return moments.front();
  }
  SurgeRun run(double phase_deg, double surge_V, double series_ohm, ZenerCurve curve = ZenerCurve::high,
               End dropper = End::high, End discharge = End::low) const {
    SurgeCase which;
    which.recipe = rich_recipe(shapes);
    which.recipe.clamp = curve;
    which.recipe.dropper = dropper;
    which.recipe.discharge = discharge;
    which.series_resistor_ohm = series_ohm;
    which.surge_V = surge_V;
    which.stress = curve == ZenerCurve::low_slope;
    auto run = run_surge(points, rest, moment(phase_deg), which);
    INFO(run.reason);
    REQUIRE(run.usable);
    REQUIRE(run.energy_residual <= 1e-6);  // energy in = dissipated + stored
    return run;
  }
  test::Example example;
  Design design;
  PointSolver points;
  MainsShapes shapes;
  OperatingPoint rest;
  std::vector<SurgeMoment> moments;
};

const char* const kWirings[] = {"half-wave-clamp-ahead", "half-wave-clamp-across", "bridge-clamp-across",
                                "bridge-clamp-ahead"};

}  // namespace

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

TEST_CASE("No place, end or polarity of a whole grid is worse than what the few runs found") {
  // Half a per cent: the places are found at one ambient and one curve.
  constexpr double kSlack = 1.005;
  for (const char* wiring : kWirings) {
    for (const int varistor : {0, 1, 2}) {
      auto example = example_with(wiring, 1000);
      example.requirement.surroundings.ambient_degC = {50, 50, 50};
      example.guarded = varistor > 0;
      example.varistor_before = varistor == 1;
      const auto answer = surge(example);
      const Bench bench(example);
      double resistor_J = 0;
      for (const auto& run : answer.resistors) resistor_J = std::max(resistor_J, run.resistor.energy_J);
      for (const double phase : {0.0, 90.0, 180.0, 270.0}) {
        for (const double volts : {1000.0, -1000.0}) {
          for (const double ohm : {47 * 0.95, 47.0, 47 * 1.05}) {
            for (const End dropper : {End::low, End::high}) {
              INFO(wiring << " varistor " << varistor << ": " << phase << " deg " << volts << " V " << ohm);
              const auto high = bench.run(phase, volts, ohm, ZenerCurve::high, dropper);
              CHECK(high.rail_max_V <= kSlack * answer.rail.rail_max_V);
              CHECK(high.resistor.energy_J <= kSlack * resistor_J);
              CHECK(high.dropper_peak_V <= kSlack * answer.dropper.dropper_peak_V);
              CHECK(high.line_A2s <= kSlack * answer.line.line_A2s);
              CHECK(high.rectifier_peak_A <= kSlack * answer.rectifier.rectifier_peak_A);
              CHECK(high.varistor_energy_J <= kSlack * answer.varistor.varistor_energy_J);
              CHECK(high.varistor_peak_A <= kSlack * answer.varistor_peak.varistor_peak_A);
              if (dropper == End::low) continue;
              const auto stiff = bench.run(phase, volts, ohm, ZenerCurve::low_slope, dropper);
              CHECK(stiff.clamp_stress_W_sqrt_s <= kSlack * answer.clamp.clamp_stress_W_sqrt_s);
              CHECK(stiff.resistor.energy_J <= kSlack * resistor_J);
            }
          }
        }
      }
    }
  }
}

TEST_CASE("A bridge takes both polarities alike at mirrored phases") {
  for (const char* wiring : {"bridge-clamp-across", "bridge-clamp-ahead"}) {
    const Bench bench(example_with(wiring, 1000));
    for (const double phase : {0.0, 90.0}) {
      const auto one = bench.run(phase, 1000, 47, ZenerCurve::low_slope);
      const auto other = bench.run(phase + 180, -1000, 47, ZenerCurve::low_slope);
      INFO(wiring << " " << phase);
      CHECK_THAT(one.rail_max_V, WithinRel(other.rail_max_V, 1e-6));
      CHECK_THAT(one.resistor.energy_J, WithinRel(other.resistor.energy_J, 1e-6));
      CHECK_THAT(one.dropper_peak_V, WithinRel(other.dropper_peak_V, 1e-6));
      // Two zeners back to back: what one takes in one run the other takes in the other, up to the trace's
      // pieces.
      CHECK_THAT(one.clamp_stress_W_sqrt_s, WithinRel(other.clamp_stress_W_sqrt_s, 1e-3));
    }
  }
}

TEST_CASE("A varistor cuts the surge that adds to the crest and does nothing for the opposite polarity") {
  for (const char* wiring : kWirings) {
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

TEST_CASE("The resistor's energy follows its closed form and peaks where that says") {
  // A tail V·e^(-t/T) into R + r and C: R/(R + r)·½·C·V²·T/(T + (R + r)·C), by the Laplace transform; checked
  // against the greatest of a fine grid.
  const double r = 2, T = circuit::SurgeWave::kTail_s;
  for (const double C : {0.1e-6, 0.33e-6, 0.68e-6, 2.2e-6}) {
    const auto energy = [&](double R) { return R / (R + r) * T / (T + (R + r) * C); };
    const double best = greatest_energy_ohm(r, C);
    for (double R = 1; R < 1000; R *= 1.01) CHECK(energy(R) <= energy(best) * (1 + 1e-12));
  }
  // In the whole circuit: the clamp takes its share, the front is no step, the mains moves on: 6 %.
  const Bench bench(example_with("half-wave-clamp-across", 1000));
  const double C = bench.run(90, 1000, 47).values.dropper_F;
  for (const double R : {22.0, 47.0, 100.0, 220.0}) {
    const auto run = bench.run(90, 1000, R);
    const double peak_V = 1000 * circuit::SurgeWave::kScale - 12;
    const double whole_r = 2 + run.values.rectifier.slope_ohm +
                           1 / (1 / run.values.reservoir_esr_ohm + 1 / run.values.clamp.main.slope_ohm);
    const double expected_J = 0.5 * C * peak_V * peak_V * R / (R + whole_r) * T / (T + (R + whole_r) * C);
    INFO(R);
    CHECK_THAT(run.resistor.energy_J, WithinRel(expected_J, 0.06));
  }
  // And it peaks inside: less at both far ends.
  const double best = greatest_energy_ohm(2, C);
  const double top_J = bench.run(90, 1000, best).resistor.energy_J;
  CHECK(bench.run(90, 1000, best / 4).resistor.energy_J < top_J);
  CHECK(bench.run(90, 1000, best * 4).resistor.energy_J < top_J);
}

TEST_CASE("An interior peak of the resistor's energy is run too") {
  auto example = example_with("half-wave-clamp-across", 1000);
  example.series_resistor.resistance_ohm = 15;
  example.series_resistor.tolerance = 0.2;
  const auto answer = surge(example);
  REQUIRE(answer.resistors.size() == 3);
  CHECK(answer.resistors[1].ends == "series_resistor between its ends");
  CHECK(answer.resistors[1].values.series_resistor_ohm > answer.resistors[0].values.series_resistor_ohm);
  CHECK(answer.resistors[1].values.series_resistor_ohm < answer.resistors[2].values.series_resistor_ohm);
  example.series_resistor.resistance_ohm = 100;
  CHECK(surge(example).resistors.size() == 2);
}

TEST_CASE("The discharge chain's ends move nothing") {
  // Its current is a thousandth of the surge's, which is why one end is enough.
  const Bench bench(example_with("half-wave-clamp-ahead", 1000));
  const auto low = bench.run(90, 1000, 47),
             high = bench.run(90, 1000, 47, ZenerCurve::high, End::high, End::high);
  CHECK_THAT(low.rail_max_V, WithinRel(high.rail_max_V, 1e-3));
  CHECK_THAT(low.resistor.energy_J, WithinRel(high.resistor.energy_J, 1e-3));
  CHECK_THAT(low.dropper_peak_V, WithinRel(high.dropper_peak_V, 1e-3));
}

TEST_CASE("A 1 kV surge takes the rail of an aged, cold reservoir to 57 V") {
  // Measured with ngspice: 12 V clamp across a full reservoir, 0.68 uF, 47 ohm behind the 2 ohm of the
  // source. The ESR of that run is not stated: 0.8 ohm doubled by age and doubled by cold is 3.2 ohm. 5 %.
  const test::Example example("half-wave-clamp-across");
  const circuit::Waveform mains(230, 50);
  Recipe recipe;
  recipe.mains = &mains;
  auto values = corner_values(example.design(), recipe, {}, 3);
  values.reservoir_esr_ohm = 3.2;
  values.dropper_esr_ohm = 0;
  values.source_ohm = 2;
  const double start_s = mains.crest_time_s();
  values.mains = mains.with_pulse(start_s, 1000 * circuit::SurgeWave::kScale, circuit::SurgeWave::kFront_s,
                                  circuit::SurgeWave::kTail_s);
  const auto network = example.arrangement->build(values);
  circuit::StateVector full{};
  for (std::size_t k = 0; k < network.capacitors.size(); ++k) {
    full[k] = network.capacitors[k].owner == circuit::Owner::dropper ? mains.crest_V() - 12.67 : 12.0;
  }
  circuit::TransientOptions options;
  options.start_time_s = start_s;
  options.duration_s = 0.5e-3;
  const auto run = circuit::run_transient(network, full, options);
  REQUIRE(run.usable);
  CHECK_THAT(run.rail_max_V, WithinRel(57.0, 0.05));
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
