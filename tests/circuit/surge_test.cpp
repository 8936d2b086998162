#include <cmath>

#include "circuit/support_values.hpp"
#include "dropfront/circuit/surge_wave.hpp"
#include "dropfront/circuit/transient.hpp"
#include "dropfront/circuit/varistor.hpp"
#include "support/catch.hpp"

using Catch::Matchers::WithinAbs;
using Catch::Matchers::WithinRel;
using namespace dropfront::circuit;

namespace {

/// Unit combination wave on a mains of next to nothing.
Waveform unit_wave() {
  return Waveform(1e-9, 50).with_pulse(0, SurgeWave::kScale, SurgeWave::kFront_s, SurgeWave::kTail_s);
}

double first_time_above_s(const Waveform& wave, double level, double from_s, double step_s) {
  double t = from_s;
  while (wave.value_V(t) < level) t += step_s;
  return t;
}

}  // namespace

TEST_CASE("The combination wave has the front, tail, peak and integrals of its standard") {
  // IEC 61000-4-5 (as restated, copy not kept): 1.2 us = 1.67 x (t90 - t30), 50 us to half value from the
  // virtual origin; peak and integrals computed from the closed form by an independent quadrature.
  const Waveform wave = unit_wave();
  const double step_s = 1e-10;
  const double t30_s = first_time_above_s(wave, 0.3, 0, step_s);
  const double t90_s = first_time_above_s(wave, 0.9, 0, step_s);
  REQUIRE_THAT(1.67 * (t90_s - t30_s), WithinRel(1.2e-6, 0.01));
  double peak = 0, peak_s = 0, integral = 0, square = 0;
  for (double t = 0; t < 1e-3; t += 1e-9) {
    const double v = wave.value_V(t + 0.5e-9);
    if (v > peak) {
      peak = v;
      peak_s = t;
    }
    integral += v * 1e-9;
    square += v * v * 1e-9;
  }
  REQUIRE_THAT(peak, WithinAbs(0.99976, 1e-4));
  REQUIRE_THAT(peak_s, WithinRel(2.089e-6, 0.01));
  REQUIRE_THAT(integral, WithinRel(70.32e-6, 1e-3));
  REQUIRE_THAT(square, WithinRel(36.03e-6, 1e-3));
  const double half_s = [&] {
    double t = peak_s;
    while (wave.value_V(t) > 0.5) t += step_s;
    return t;
  }();
  const double origin_s = t30_s - 0.5 * (t90_s - t30_s);  // where the line through 30 and 90 % meets zero
  REQUIRE_THAT(half_s - origin_s, WithinRel(50e-6, 0.01));
}

TEST_CASE("A surge into a resistor alone leaves the wave's own joule integral there") {
  // V^2/R times the integral of the squared unit wave, 36.03 us.
  Network network;
  const Node line = network.add_node();
  network.source = {line, Waveform(1e-6, 50).with_pulse(0, 1000 * SurgeWave::kScale, SurgeWave::kFront_s,
                                                        SurgeWave::kTail_s)};
  network.resistors.push_back({line, 0, 100, Owner::series_resistor});
  const Node top = network.add_node();
  network.capacitors.push_back({top, 0, 1e-9, Owner::reservoir});
  network.resistors.push_back({top, 0, 1e6, Owner::leak});
  network.rail = top;
  TransientOptions options;
  options.duration_s = 1e-3;
  const auto run = run_transient(network, {0.0}, options);
  INFO(run.reason);
  REQUIRE(run.usable);
  REQUIRE_THAT(run.resistor_energy_J[0], WithinRel(1e6 / 100 * 36.03e-6, 1e-3));
  REQUIRE_THAT(run.resistor_peak_A[0], WithinRel(10 * 0.99976, 1e-3));
}

TEST_CASE("Energy closes over a surge on every arrangement, varistor or not") {
  for (const auto& arrangement : dropping()) {
    for (const bool guarded : {false, true}) {
      for (const double sign : {1.0, -1.0}) {
        ElementValues v = ordinary_values();
        const double start_s = v.mains.crest_time_s();
        v.mains = Waveform(253, 50).with_pulse(start_s, sign * 1000 * SurgeWave::kScale, SurgeWave::kFront_s,
                                               SurgeWave::kTail_s);
        v.source_ohm = 2;
        if (guarded) v.varistor = varistor_branches({430, 710, 50});
        TransientOptions options;
        options.start_time_s = start_s;
        options.duration_s = 1e-3;
        const auto run = run_transient(arrangement.build(v), {-350.0, 11.0}, options);
        INFO(arrangement.name << " " << guarded << " " << sign << ": " << run.reason);
        REQUIRE(run.usable);
        REQUIRE(run.energy_residual <= 1e-6);
        REQUIRE(run.resistor_peak_A[1] > 1);
      }
    }
  }
}

TEST_CASE("The varistor's pieces touch its law and stay close below it") {
  const VaristorLaw law{430, 710, 50};
  REQUIRE_THAT(law.voltage_V(1e-3), WithinRel(430, 1e-12));
  REQUIRE_THAT(law.voltage_V(50), WithinRel(710, 1e-12));
  const auto branches = varistor_branches(law);
  const auto current_A = [&](double voltage_V) {
    double sum = 0;
    for (const auto& piece : branches) {
      sum += std::max(0.0, voltage_V - piece.threshold_V) / piece.slope_ohm;
    }
    return sum;
  };
  for (const double amperes : {0.1, 1.0, 10.0, 30.0, 100.0, 300.0, 1000.0, 3000.0}) {
    REQUIRE_THAT(current_A(law.voltage_V(amperes)), WithinRel(amperes, 1e-9));
  }
  for (double amperes = 1; amperes < 3000; amperes *= 1.1) {
    // The stated four per cent of voltage: at 96 % of the law's voltage the pieces carry less.
    REQUIRE(current_A(law.voltage_V(amperes)) >= amperes * (1 - 1e-9));
    REQUIRE(current_A(0.96 * law.voltage_V(amperes)) <= amperes);
  }
}

TEST_CASE("Pieces made for one run touch the law where it matters and stay 2 % below it") {
  const VaristorLaw law{430, 710, 50};
  for (const double greatest_A : {0.1, 3.0, 370.0}) {
    const auto branches = varistor_branches(law, greatest_A);
    INFO(greatest_A);
    REQUIRE(branches.size() <= 4);
    const auto current_A = [&](double voltage_V) {
      double sum = 0;
      for (const auto& piece : branches)
        sum += std::max(0.0, voltage_V - piece.threshold_V) / piece.slope_ohm;
      return sum;
    };
    REQUIRE_THAT(current_A(law.voltage_V(greatest_A)), WithinRel(greatest_A, 1e-9));
    for (double amperes = greatest_A / 30; amperes < greatest_A; amperes *= 1.05) {
      REQUIRE(current_A(law.voltage_V(amperes)) >= amperes * (1 - 1e-9));
      REQUIRE(current_A(0.98 * law.voltage_V(amperes)) <= amperes);
    }
  }
  REQUIRE(varistor_branches(law, 0.5e-3).empty());
}

TEST_CASE("The current behind a source lies on both lines, and is none below the 1 mA point") {
  const VaristorLaw law{430, 710, 50};
  for (const double open_V : {600.0, 1000.0, 1358.0, 4000.0}) {
    const double amperes = current_behind_A(law, open_V, 2);
    REQUIRE_THAT(law.voltage_V(amperes) + 2 * amperes, WithinRel(open_V, 1e-9));
  }
  REQUIRE(current_behind_A(law, 429, 2) == 0);
}

TEST_CASE("A varistor built for one direction conducts nothing in the other") {
  ElementValues v = ordinary_values();
  v.varistor = varistor_branches({430, 710, 50});
  const auto both = find_arrangement("half-wave-clamp-ahead")->build(v);
  v.varistor_ways = 1;
  const auto there = find_arrangement("half-wave-clamp-ahead")->build(v);
  v.varistor_ways = -1;
  const auto back = find_arrangement("half-wave-clamp-ahead")->build(v);
  const auto pieces = [](const Network& network, bool into_neutral) {
    int count = 0;
    for (const auto& branch : network.branches)
      count += branch.owner == Owner::varistor && (branch.b == 0) == into_neutral ? 1 : 0;
    return count;
  };
  REQUIRE(pieces(both, true) == 8);
  REQUIRE(pieces(both, false) == 8);
  REQUIRE(pieces(there, true) == 8);
  REQUIRE(pieces(there, false) == 0);
  REQUIRE(pieces(back, true) == 0);
  REQUIRE(pieces(back, false) == 8);
}
