#pragma once
#include <string>

#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// What confirming the ranked designs showed, for people: corners that were not the worst, the builds
/// sampled, what tolerances cost. Empty when nothing was confirmed.
std::string confirmation_text(const Result& result);

}  // namespace dropfront::report
