#pragma once

namespace dropfront::values {

/// A year is 365.25 days of 24 h (the Julian year of the IAU's system of units): 8766 h, 31,557,600 s. The one
/// definition, for the unit "years" and for lives counted in hours alike.
inline constexpr double kHoursPerYear = 365.25 * 24;
inline constexpr double kSecondsPerYear = 3600 * kHoursPerYear;

}  // namespace dropfront::values
