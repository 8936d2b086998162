#include "dropfront/circuit/pulse.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/checks/stress.hpp"
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

/// The energy hardly depends on Rs; what a film part may take does (its pulse is shorter at the low end), so
/// both ends are judged.
std::optional<Check> resistor_pulse(Evidence& evidence) {
  if (evidence.design().dropper == nullptr) return std::nullopt;  // no charge to rush in: no pulse
  const PlugInAnswer& plug_in = evidence.plug_in();
  const parts::Resistor& part = *evidence.design().series_resistor;
  const auto judge = [&](const PlugIn& run, double energy_J, End end) {
    const Design& design = evidence.design();
    const double capacitance_F = all_droppers_F(design, End::high, 0, run.ambient_degC);
    const double resistance_ohm = series_resistor_ohm(design, end), share = series_resistor_share(design);
    const double closings = evidence.requirement().connection.chatter;
    Check check = at_most("resistor.pulse", energy_J * share * closings,
                          pulse_energy_limit_J(part, resistance_ohm, capacitance_F), "J", at_plug_in(run),
                          part.construction == parts::Construction::film
                              ? "plug-in energy; rating at 1 ms carried along P·sqrt(t) to R·C/2"
                              : "plug-in energy against the joule rating");
    check.figures = {{"energy_J", energy_J},
                     {"share_of_one_part", share},
                     {"closings_in_a_row", closings},
                     {"pulse_s", circuit::exponential_pulse_s(resistance_ohm, capacitance_F)}};
    add_figure(check, "rated_energy_J", part.pulse_energy_J);
    return plug_in.usable ? check : unsolved(check, plug_in.reason);
  };
  return worse(judge(plug_in.resistor_low, plug_in.resistor_energy_low_J, End::low),
               judge(plug_in.resistor_high, plug_in.resistor_energy_high_J, End::high));
}

}  // namespace dropfront::scoring
