#pragma once
#include <string>

#include "dropfront/problem/problem.hpp"

namespace dropfront::report {

/// A design taken from a result folder with what it was asked for. Parts and slots of the problem are empty:
/// the design carries its numbers.
struct Recorded {
  problem::Problem problem;
  scoring::Design design;  ///< points into `problem`
};

/// Candidate `number` of the result folder `folder`. Throws values::InputError: no result folder, a study's
/// own folder (its combinations are named), no such number, a file that something else has changed.
Recorded read_recorded(const std::string& folder, int number);

}  // namespace dropfront::report
