#pragma once
#include "dropfront/scoring/corners.hpp"

namespace dropfront::scoring {

/// Air around a set when its standby power is measured (IEC 62301: 23 ± 5 degC).
inline constexpr double kStandby_degC = 23;

inline constexpr const char* kNominalEnds = "nominal values";

/// Rich corners: high peaked mains, C max, Rs max, Rb min, high clamp curve, least drops; reservoir at its
/// worst (C min, ESR max, aged) both empty and loaded, so that the two differ by their load alone.
Recipe rich_recipe(const MainsShapes& shapes);
/// Its ends in words; the discharge chain is named where there is one (`bled`).
const char* rich_ends(bool bled);

/// Nominal values, new.
Recipe nominal_recipe(const MainsShapes& shapes);

/// Production worst for standby: tolerances only, new; C max, Rb min, high clamp curve, one end of Rs.
Recipe production_recipe(const MainsShapes& shapes, End series_resistor);
const char* production_ends(End series_resistor, bool bled);

}  // namespace dropfront::scoring
