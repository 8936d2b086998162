#pragma once
#include <iosfwd>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/problem/problem.hpp"

namespace dropfront::app {

/// Reads all files before anything else happens. Every bad one is reported on `err`, one line each; then, or
/// when two share a name, nothing is returned.
std::optional<std::vector<problem::ProblemFile>> read_all(const std::vector<std::string>& paths,
                                                          const std::vector<std::string>& sets,
                                                          std::ostream& err);

/// How a combination of a study is named to people: "output.voltage = 5 V".
std::string variation_text(const problem::Variation& variation);

}  // namespace dropfront::app
