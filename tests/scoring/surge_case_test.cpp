#include "dropfront/scoring/surge_case.hpp"

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

TEST_CASE("No place, end or polarity of a whole grid is worse than what the few runs found") {
  // Half a per cent: the places are found at one ambient and one curve.
  constexpr double kSlack = 1.005;
  for (const char* wiring : kSurgeWirings) {
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
