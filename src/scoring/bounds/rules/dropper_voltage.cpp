#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Line r.m.s. over the best derated rating of the list. Theorem.
double dropper_voltage(const BoxQuestion& question) {
  const double derating = question.context.requirement->derating.dropper_voltage;
  const double line_Vrms = question.supply.rich.voltage_Vrms;
  return question.least_share(question.box.droppers, [&](const parts::Dropper* part) {
    return part == nullptr ? 0 : line_Vrms / (part->rated_voltage_Vrms * derating);
  });
}

}  // namespace dropfront::scoring::bounds
