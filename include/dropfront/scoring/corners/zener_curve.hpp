#pragma once
#include "dropfront/circuit/element_values.hpp"
#include "dropfront/parts/clamp.hpp"

namespace dropfront::scoring {

/// Which breakdown curve of a zener. Everything solved is monotone between low and high.
///   low:       V0 = Vmin - rz_max·Izt, slope rz_min, with the knee branch where the data give it
///   high:      V0 = Vmax - rz_min·Izt, slope rz_max
///   nominal:   V0 = Vz   - rz_max·Izt, slope rz_max
///   low_slope: V0 = Vmax - rz_min·Izt, slope rz_min (the stiffest: greatest pulse in the zener)
enum class ZenerCurve { low, nominal, high, low_slope };

/// The curve with the junction at `junction_degC`: voltages scale by 1 + tempco·(Tj - 25 degC).
/// Knee: inner parallel branch of slope Zzk through (Izk, Vz - (Zzt·Izt + Zzk·Izk)/2·ln(Izt/Izk)), where the
/// incremental resistance falls as 1/I between the two data points.
circuit::ClampCurve zener_curve(const parts::Clamp& part, ZenerCurve curve, double junction_degC);

}  // namespace dropfront::scoring
