#pragma once
#include "dropfront/circuit/element_values.hpp"
#include "dropfront/circuit/network.hpp"

namespace dropfront::circuit {

/// One builder an arrangement, each in its own file; the table in arrangement.cpp lists them.
/// Valid: series_resistor_ohm, dropper_F, reservoir_F and every slope > 0, thresholds >= 0.

/// Zener from the dropper node to neutral (it clamps and resets), then the series diode.
Network build_half_wave_clamp_ahead(const ElementValues& values);
/// Reset diode and series diode, zener across the reservoir.
Network build_half_wave_clamp_across(const ElementValues& values);
/// Bridge, zener across the reservoir.
Network build_bridge_clamp_across(const ElementValues& values);
/// Two zeners back to back ahead of the bridge.
Network build_bridge_clamp_ahead(const ElementValues& values);
/// Thyristor and reset diode from the dropper node to neutral, then the series diode; the rail fires it.
Network build_half_wave_thyristor_shunt(const ElementValues& values);
/// Thyristor across the bridge's output, then a blocking diode; the rail fires it.
Network build_bridge_thyristor_shunt(const ElementValues& values);
/// The yardstick for tiny loads: no dropper, the series resistor alone, a series diode, zener across the
/// reservoir. dropper_F and discharge_ohm are not used.
Network build_resistive(const ElementValues& values);

}  // namespace dropfront::circuit
