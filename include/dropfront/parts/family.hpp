#pragma once
#include <vector>

#include "dropfront/parts/clamp.hpp"
#include "dropfront/parts/dropper.hpp"
#include "dropfront/parts/reservoir.hpp"
#include "dropfront/parts/resistor.hpp"
#include "dropfront/values/series.hpp"

namespace dropfront::parts {

/// A part of the given value between two rows: numbers log-log in the value (straight in log(value) where a
/// number may be zero, negative or in degC), words and yes/no from the row nearer in log(value), prices and
/// sizes rounded to their integer unit. Outside [low, high] the nearer end's numbers are kept. A rating that
/// either row lacks is not given. A number that equals its documented default in both rows follows that
/// default at the new value. A clamp keeps its tolerance, so voltage_min and voltage_max scale with the
/// voltage. The name is the nearer row's.
/// Valid: values > 0; low may equal high (all columns copied). Total: never throws.
Dropper interpolate(const Dropper& low, const Dropper& high, double capacitance_F);
Resistor interpolate(const Resistor& low, const Resistor& high, double resistance_ohm);
Clamp interpolate(const Clamp& low, const Clamp& high, double voltage_V);
Reservoir interpolate(const Reservoir& low, const Reservoir& high, double capacitance_F);

/// A family: one part per member of `series` in [from, to], ascending, named '<row> <value>' ("film 470 nF").
/// One row: its other columns are copied. Several: interpolated between the two nearest by value, ends clamp.
/// No rows: empty.
std::vector<Dropper> expand_family(const std::vector<const Dropper*>& rows, values::Series series,
                                   double from_F, double to_F);
std::vector<Resistor> expand_family(const std::vector<const Resistor*>& rows, values::Series series,
                                    double from_ohm, double to_ohm);
std::vector<Clamp> expand_family(const std::vector<const Clamp*>& rows, values::Series series, double from_V,
                                 double to_V);
std::vector<Reservoir> expand_family(const std::vector<const Reservoir*>& rows, values::Series series,
                                     double from_F, double to_F);

}  // namespace dropfront::parts
