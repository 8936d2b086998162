#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// The published rules that may be named in place of figures: "60335-1", "62368-1", "61010-1", "60950-1".
const std::vector<std::string>& discharge_rule_names();

/// The rule of that name. Its basis says how each figure is known. Absent: no such name.
///   60335-1: 34 V after 1 s, none up to 0.1 uF
///   62368-1: 60 V at 300 nF and more, by a table below, after 2 s
///   61010-1: 60 V after 5 s (the other way to pass, a charge of at most 45 uC, is not taken)
///   60950-1: 37 % of the crest after 1 s (pluggable type A), none up to 0.1 uF
std::optional<DischargeRule> discharge_rule(std::string_view name);

/// Most that `rule` leaves on `capacitance_F` charged to `start_V`.
double allowed_voltage_V(const DischargeRule& rule, double capacitance_F, double start_V);

/// Voltage a charged capacitor may hold as an ES1 source, straight between the table's points: 60 V from
/// 300 nF up, 5000 V at 0.8 nF and below. `capacitance_F` > 0.
/// Source: IEC 62368-1 table 5, from memory.
double es1_capacitor_V(double capacitance_F);

}  // namespace dropfront::scoring
