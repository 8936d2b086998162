#pragma once
#include <optional>
#include <string>
#include <string_view>

#include "dropfront/scoring/score.hpp"

namespace dropfront::report {

/// Three significant digits with prefix and unit: with_unit(6.8e-7, "F") is "680 nF". `unit` as checks spell
/// it; one without prefixes (or none) follows the rounded number.
std::string with_unit(double value, std::string_view unit);

/// Rounded plain number with `decimals`; "-" when absent.
std::string rounded(const std::optional<double>& value, int decimals);

/// 1000 times a value, for milliamperes and milliwatts.
std::optional<double> thousandfold(const std::optional<double>& value);

/// A headroom or share as whole percent ("12 %"), one decimal below 10; "-" when absent.
/// "2 x " before a value for two equal parts, nothing for one.
std::string times(int count);
std::string percent(const std::optional<double>& share);

/// 1234567 as "1,234,567"; from 1e15 on "1.2e15".
std::string counted(double count);

/// Objectives in the units of files.
std::optional<double> cost_units(const scoring::Objectives& objectives);  ///< currency
std::optional<double> area_mm2(const scoring::Objectives& objectives);

/// "compliant", "breaks limits", "undefined".
std::string_view verdict_name(scoring::Verdict verdict);

}  // namespace dropfront::report
