#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// 2·Vcrest over the best overload voltage of the list. Theorem.
double resistor_pulse_voltage(const BoxQuestion& question) {
  const double step_V = 2 * question.supply.rich.crest_V;
  return question.least_share(question.box.series_resistors, [&](const parts::Resistor* part) {
    return part == nullptr || !part->overload_voltage_V ? 0 : step_V / *part->overload_voltage_V;
  });
}

}  // namespace dropfront::scoring::bounds
