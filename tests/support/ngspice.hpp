#pragma once
#include <map>
#include <string>

namespace dropfront::support {

/// What ngspice printed for each .measure line, by name.
using Measures = std::map<std::string, double>;

/// Runs a deck with `ngspice -b` in a folder of its own, removed afterwards. Throws std::runtime_error with
/// the reason: ngspice not installed, the run failed (its last lines are quoted), or no measure came back.
Measures run_ngspice(const std::string& deck);

}  // namespace dropfront::support
