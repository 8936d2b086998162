#pragma once
#include <set>
#include <string>
#include <vector>

#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// Designs one under the other, values and objectives in columns.
struct Line {
  std::string label;
  const Entry* entry = nullptr;
  bool describe = true;  ///< the rest of the design, its tightest check and its part names on lines below
};
std::string design_table(const std::string& heading, const std::vector<Line>& lines,
                         const std::string& currency);

/// One ranked set by candidate numbers; '*' behind a number: not on the front. Designs of `described` are not
/// described again; the others are added to it.
std::string ranked_table(const Result& result, const RankedList& list, std::set<int>& described);

/// Heading of a ranked set: "Cheapest", "Lowest standby loss", ...
std::string ranked_heading(const std::string& name);

/// "SR275-470n, WF2-100R, ...": the placed parts of a design by name, with their number where it is not one.
std::string part_names(const scoring::Design& design);

}  // namespace dropfront::report
