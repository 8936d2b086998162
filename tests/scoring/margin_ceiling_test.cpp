#include <cmath>

#include "dropfront/scoring/evidence.hpp"
#include "dropfront/values/random.hpp"
#include "scoring/support/example.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::scoring;

TEST_CASE("No solved margin exceeds the charge-balance ceiling, whatever the stage") {
  values::RandomStream random(4711);
  const auto between = [&](double low, double high) {
    return low * std::pow(high / low, random.uniform01());
  };
  for (int round = 0; round < 15; ++round) {
    for (const char* wiring :
         {"half-wave-clamp-ahead", "half-wave-clamp-across", "bridge-clamp-across", "bridge-clamp-ahead"}) {
      for (const bool stepping : {false, true}) {
        test::Example example(wiring);
        example.dropper.capacitance_F = between(0.1e-6, 4e-6);
        example.series_resistor.resistance_ohm = between(22, 470);
        example.reservoir.capacitance_F = between(22e-6, 1000e-6);
        example.discharge.resistance_ohm = between(50e3, 1.5e6);
        const parts::Clamp clamps[] = {test::zener_12V(), test::zener_24V(), test::zener_47V()};
        example.clamp = clamps[random.next() % 3];
        if (stepping) {
          example.stage.kind = parts::StageKind::step_down;
          example.stage.efficiency = 0.8;
          example.stage.output_voltage_V = 5;
          example.stage.input_min_V = 7;
        }
        example.requirement.output.voltage_V = stepping ? 5 : 0.7 * example.clamp.voltage_V;
        const auto design = example.design();
        Evidence evidence(design, example.requirement, example.requirement.supplies[0]);
        const auto& lean = evidence.lean();
        INFO(wiring << " stepping " << stepping << " " << lean.reason);
        if (!lean.usable) continue;
        // The search's own current tolerance, a millionth of some tens of milliamperes.
        REQUIRE(lean.margin_A <= evidence.margin_ceiling_A() + 1e-7);
      }
    }
  }
}
