#pragma once

namespace dropfront::circuit {

/// Voltage left on a capacitor `after_s` seconds after it was cut off at `start_V`:
///   v = V0·exp(-t/(R·C))
/// Valid: R > 0 (infinite: nothing discharges), C > 0, t >= 0. Nothing else may load the capacitor, which is
/// the cautious case.
double discharged_voltage_V(double start_V, double resistance_ohm, double capacitance_F, double after_s);

/// Largest total resistance that brings `start_V` down to `limit_V` within `after_s`:
///   R = t/(C·ln(V0/V))
/// Infinite when start_V <= limit_V.
double largest_bleeder_ohm(double start_V, double limit_V, double capacitance_F, double after_s);

/// Greatest share of the chain's voltage on one of `count` equal elements of the given tolerance (fraction):
/// R_max/(R_max + sum of the others' R_min). 1 for a single element.
double greatest_voltage_share(int count, double tolerance);

/// Greatest power in one of `count` elements of nominal `element_ohm` with `chain_Vrms` across the chain,
/// whatever each element's place in its tolerance: V²·R/(sum R)², worst either with this element high and the
/// others low, or with all low.
double greatest_element_power_W(double chain_Vrms, int count, double element_ohm, double tolerance);

}  // namespace dropfront::circuit
