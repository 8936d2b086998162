#include "support/sample_designs.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace dropfront::support {
namespace {

using circuit::ClampCurve;
using circuit::Curve;
using circuit::ElementValues;
using circuit::Waveform;

constexpr double kDegree = std::numbers::pi / 180;

/// The common ground of the sample: an ordinary diode's drop, a 12 V / 1 W zener on its low curve.
ElementValues ordinary(double line_Vrms, double frequency_Hz, double dropper_F, double series_ohm) {
  ElementValues v;
  v.mains = Waveform(line_Vrms, frequency_Hz);
  v.series_resistor_ohm = series_ohm;
  v.dropper_F = dropper_F;
  v.dropper_esr_ohm = 0.001 / (v.mains.omega() * dropper_F);
  v.discharge_ohm = 940e3;
  v.rectifier = Curve{0.67, 0.67};
  v.clamp.main = Curve{11.2, 9.0};
  v.reservoir_F = 220e-6;
  v.reservoir_esr_ohm = 0.8;
  v.thyristor = {0.9, 0.1};
  v.thyristor_holding_A = 5e-3;
  v.thyristor_trigger_A = 0.2e-3;
  v.gate_resistor_ohm = 1000;
  v.load_cutoff_V = 4.0;
  return v;
}

/// A 5.1 V part: rounded below its test current (45 mA, 7 ohm; knee 1 mA, 550 ohm), so an inner branch stands
/// beside the main one.
ClampCurve rounded_5V1() { return {Curve{4.53, 7.0}, Curve{3.45, 550.0}}; }

/// Mean rail current that charge balance grants at a rail, ideal parts (closed form): loads are shares of it.
double charge_balance_A(const circuit::Arrangement& arrangement, const ElementValues& v, double rail_V) {
  const double peak_V = std::numbers::sqrt2 * v.mains.voltage_Vrms();
  const double per_cycle_V = arrangement.full_wave ? 4 * (peak_V - rail_V - 2 * v.rectifier.threshold_V)
                                                   : 2 * peak_V - rail_V - 2 * v.rectifier.threshold_V;
  return v.mains.frequency_Hz() * v.dropper_F * per_cycle_V;
}

}  // namespace

std::vector<SampleDesign> sample_designs(const circuit::Arrangement& arrangement) {
  std::vector<SampleDesign> sample;
  const auto add = [&](const std::string& purpose, ElementValues values, double load_share) {
    values.rail_current_A = load_share * charge_balance_A(arrangement, values, values.clamp.main.threshold_V);
    // Slowest fall: the load alone discharges the reservoir; ten times 0.2 V of it.
    const double fall_s = 2.0 * values.reservoir_F / values.rail_current_A;
    const double periods = std::clamp(std::ceil(fall_s * values.mains.frequency_Hz()), 24.0, 250.0);
    sample.push_back({purpose, &arrangement, std::move(values), periods});
  };
  // A bridge's 3.3 uF at 230 V would be an oven: the same share of load, smaller parts.
  const double scale = arrangement.full_wave ? 0.5 : 1.0;

  add("230 V, 47 ohm, half the current used", ordinary(230, 50, 0.68e-6 * scale, 47), 0.5);

  ElementValues light = ordinary(230, 50, 0.47e-6 * scale, 22);
  light.reservoir_F = 1000e-6;
  light.reservoir_esr_ohm = 0.1;
  add("light load on a big reservoir, 22 ohm", light, 0.01);

  ElementValues heavy = ordinary(230, 50, 0.33e-6 * scale, 150);
  add("load beyond what the line delivers: the rail falls into the cut-off", heavy, 1.03);

  ElementValues small = ordinary(120, 60, 1.5e-6 * scale, 100);
  small.reservoir_F = 47e-6;
  small.reservoir_esr_ohm = 2.0;
  add("120 V / 60 Hz, small reservoir, deep ripple near the limit", small, 0.85);

  ElementValues rounded = ordinary(120, 60, 1.0e-6 * scale, 220);
  rounded.clamp = rounded_5V1();
  rounded.load_cutoff_V = 1.6;
  add("5.1 V clamp with its knee", rounded, 0.6);

  ElementValues rounded_light = rounded;
  rounded_light.mains = Waveform(230, 50);
  rounded_light.dropper_F = 0.22e-6;
  add("5.1 V clamp in its knee: hardly loaded", rounded_light, 0.1);

  ElementValues flat = ordinary(253, 50, 0.47e-6 * scale, 470);
  flat.mains = Waveform(253, 50, {{3, 0.04, 0.0}, {5, 0.03, 180 * kDegree}, {7, 0.01, 60 * kDegree}});
  add("flattened mains with three harmonics, 470 ohm", flat, 0.7);

  ElementValues peaked = ordinary(108, 60, 2.2e-6 * scale, 33);
  peaked.mains = Waveform(108, 60, {{2, 0.01, 90 * kDegree}, {3, 0.03, 180 * kDegree}});
  peaked.clamp.main = Curve{22.8, 20.0};
  peaked.load_cutoff_V = 9.0;
  peaked.discharge_ohm = 300e3;
  add("peaked mains with an even harmonic, 24 V clamp, no spare current", peaked, 0.95);

  // Between clamp and cut-off nothing but the dropper's slope f·C holds the rail: it settles over Cr/C
  // periods.
  ElementValues hanging = heavy;
  hanging.reservoir_F = 47e-6;
  hanging.rail_current_A =
      charge_balance_A(arrangement, hanging, 0.75 * hanging.clamp.main.threshold_V) - 20e-6;
  sample.push_back({"rail hanging between clamp and cut-off", &arrangement, hanging, 300});
  return sample;
}

}  // namespace dropfront::support
