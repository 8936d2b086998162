#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace dropfront::values {

/// Preferred number series of IEC 60063.
enum class Series { E3, E6, E12, E24, E48, E96, E192 };

/// "E24" and the like, any case; empty for anything else.
std::optional<Series> series_named(std::string_view name);
std::string_view series_name(Series series);

/// All names, for messages and schemas.
const std::vector<std::string>& series_names();

/// One decade as whole numbers: 10..91 (E3..E24) or 100..988 (E48..E192). Rule: 10^(k/N) rounded half up to 2
/// or 3 digits; exceptions: eight members of E24 (inherited by E3..E12) and 9.20 of E192.
const std::vector<int>& series_decade(Series series);

/// Values of 1e-30 .. 1e30 for the following, else 0 or an empty list. Members are correctly rounded decimals
/// (4700 is 4.7e3 exactly). A value within 1e-9 of a member counts as that member.

/// The member with the least difference from `value` (ties: the lower).
double nearest_preferred(Series series, double value);

/// The greatest member below `value`, and the least above it, the value itself excluded.
double next_lower_preferred(Series series, double value);
double next_higher_preferred(Series series, double value);

/// All members of [from, to], ascending. Empty when from > to.
std::vector<double> preferred_between(Series series, double from, double to);

}  // namespace dropfront::values
