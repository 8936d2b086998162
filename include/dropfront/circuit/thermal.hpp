#pragma once

namespace dropfront::circuit {

/// Steady temperature of a body that dissipates `power_W` through `thermal_resistance_K_per_W` into
/// surroundings at `ambient_degC`: T = T_ambient + Rth·P. Used for a junction (Rth junction to ambient) and
/// for the air in an enclosure (Rth of the enclosure, P the whole input power).
/// Valid: Rth >= 0, P >= 0; for powers steady against the thermal time constant (not for pulses).
/// Source: definition of thermal resistance, IEC 60747-1.
constexpr double temperature_degC(double ambient_degC, double thermal_resistance_K_per_W, double power_W) {
  return ambient_degC + thermal_resistance_K_per_W * power_W;
}

/// Greatest steady power that keeps the body at or below `maximum_degC`: (T_max - T_ambient)/Rth, 0 when the
/// surroundings are as hot already. Rth > 0.
double allowed_power_W(double ambient_degC, double thermal_resistance_K_per_W, double maximum_degC);

}  // namespace dropfront::circuit
