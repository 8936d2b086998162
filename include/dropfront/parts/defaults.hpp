#pragma once

namespace dropfront::parts {

/// Temperature coefficient of a zener, as a fraction of its voltage per kelvin, at its test current.
/// 6.8 V and above: typical values of the JEDEC 1N957..1N978 family; below: middles of the ranges given for
/// 1N4728A..1N4735A. Straight lines between the listed voltages, the end values outside 3.3 .. 51 V.
double zener_temperature_coefficient_per_K(double voltage_V);

/// Greatest loss tangent at 120 Hz, 20 degC of a general-purpose 105 degC aluminium electrolytic by rated
/// voltage (data-sheet table 6.3 .. 100 V; a voltage between two rows takes the lower row's greater value;
/// above 100 V 0.20, from memory), plus 0.02 for each 1000 uF above 1000 uF.
double electrolytic_loss_tangent(double rated_voltage_V, double capacitance_F);

/// ESR at 20 degC that loss tangent gives: tan(delta)/(2 pi 120 Hz C).
double electrolytic_esr_ohm(double rated_voltage_V, double capacitance_F);

/// ESR at -25 degC over ESR at 20 degC: 3 below 25 V rating, 2 from there (data-sheet impedance ratios).
double electrolytic_cold_factor(double rated_voltage_V);

/// Data-sheet leakage after 2 minutes: the greater of 0.01·C·V and 3 uA.
double electrolytic_leakage_A(double rated_voltage_V, double capacitance_F);

}  // namespace dropfront::parts
