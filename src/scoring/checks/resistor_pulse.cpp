#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

/// The energy hardly depends on Rs; what a film part may take does (its pulse is shorter at the low end), so
/// both ends are judged.
std::optional<Check> resistor_pulse(Evidence& evidence) {
  const PlugInAnswer& plug_in = evidence.plug_in();
  const parts::Resistor& part = *evidence.design().series_resistor;
  const auto judge = [&](const PlugIn& run, double energy_J, End end) {
    const double capacitance = dropper_F(*evidence.design().dropper, End::high, false, run.ambient_degC);
    const Check check =
        at_most("resistor.pulse", energy_J, pulse_energy_limit_J(part, resistor_ohm(part, end), capacitance),
                "J", at_plug_in(run),
                part.construction == parts::Construction::film
                    ? "plug-in energy; rating at 1 ms carried along P·sqrt(t) to R·C/2"
                    : "plug-in energy against the joule rating");
    return plug_in.usable ? check : unsolved(check, plug_in.reason);
  };
  return worse(judge(plug_in.resistor_low, plug_in.resistor_energy_low_J, End::low),
               judge(plug_in.resistor_high, plug_in.resistor_energy_high_J, End::high));
}

}  // namespace dropfront::scoring
