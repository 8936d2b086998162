#include <algorithm>
#include <cmath>

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/scoring/lean_search.hpp"
#include "dropfront/values/random.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// A design and surroundings drawn at random, in the knee or saturated, on either mains.
test::Example draw(values::RandomStream& random, const char* wiring) {
  const auto between = [&](double low, double high) {
    return low * std::pow(high / low, random.uniform01());
  };
  test::Example example(wiring);
  if (random.uniform01() < 0.4) {
    example.supply().voltage_Vrms = {108, 120, 132};
    example.supply().frequency_Hz = {60, 60, 60};
  }
  example.dropper.capacitance_F = between(0.1e-6, 4e-6);
  example.series_resistor.resistance_ohm = between(22, 470);
  example.reservoir.capacitance_F = between(22e-6, 1000e-6);
  example.reservoir.esr_ohm = 0.16 / (754 * example.reservoir.capacitance_F);  // tan d 0.16 at 120 Hz
  example.reservoir.esr_cold_ohm = 2 * example.reservoir.esr_ohm;
  const parts::Clamp clamps[] = {test::zener_4V7(), test::zener_12V(), test::zener_24V(), test::zener_47V()};
  example.clamp = clamps[random.next() % 4];
  example.requirement.output.voltage_V = between(0.3, 0.92) * example.clamp.voltage_V;
  example.requirement.output.tolerance = 0;
  example.requirement.surroundings.ambient_degC = {-25 + 25 * random.uniform01(), 25,
                                                   40 + 30 * random.uniform01()};
  example.discharge.resistance_ohm = between(150e3, 1.5e6);
  return example;
}

}  // namespace

TEST_CASE("On random designs no end and no ambient delivers less than the lean answer") {
  values::RandomStream random(20);
  for (int round = 0; round < 10; ++round) {
    for (const char* wiring :
         {"half-wave-clamp-ahead", "half-wave-clamp-across", "bridge-clamp-across", "bridge-clamp-ahead"}) {
      const auto example = draw(random, wiring);
      const auto design = example.design();
      const auto shapes = mains_shapes(example.requirement.supplies[0]);
      const double required_V = example.requirement.output.voltage_V;
      PointSolver points(design, example.requirement, required_V);
      LeanSearch search(points, shapes.lean, 0, true);
      const auto& least = search.least();
      INFO(wiring << " " << example.dropper.capacitance_F << " F, clamp " << example.clamp.voltage_V
                  << " V, required " << required_V << " V: " << least.reason);
      REQUIRE(least.usable);
      const auto& ambient = example.requirement.surroundings.ambient_degC;
      double others_A = 1e9;
      for (const double t : {ambient.low, ambient.high}) {
        for (int ends = 0; ends < 8; ++ends) {
          const auto pick = [&](int bit) { return (ends >> bit & 1) != 0 ? End::high : End::low; };
          const auto solved = search.solver().solve({t, {pick(0), pick(1), pick(2)}}, nullptr);
          REQUIRE(solved.usable);
          others_A = std::min(others_A, solved.available_A);
        }
      }
      // A tenth of a kelvin of the junction between two searches: 1e-3 of the current in a steep knee.
      REQUIRE(least.available_A <= others_A * (1 + 2e-3) + 1e-7);
    }
  }
}
