#pragma once
#include <string>
#include <vector>

#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// Designs one under the other, values and objectives in columns, the rest of each design and its tightest
/// check on a second line. `labels`: what stands in the first column, under `heading`.
std::string design_table(const std::string& heading, const std::vector<std::string>& labels,
                         const std::vector<const Entry*>& entries, const std::string& currency);

/// One ranked set by candidate numbers; '*' behind a number: not on the front.
std::string ranked_table(const Result& result, const RankedList& list);

/// Heading of a ranked set: "Cheapest", "Lowest standby loss", ...
std::string ranked_heading(const std::string& name);

}  // namespace dropfront::report
