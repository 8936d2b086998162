#pragma once
#include <string>

#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// For a result without a compliant design: what stands in the way, limit by limit, and the near misses.
std::string nothing_found(const Result& result);

/// Designs that break exactly one limit, with that limit: all, or, where there are more than `most`, the
/// nearest of each limit, nearest first. Empty where there is none.
std::string near_misses_text(const Result& result, std::size_t most);

}  // namespace dropfront::report
