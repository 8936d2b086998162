#pragma once
#include <string>

#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// For a result without a compliant design: what stands in the way, limit by limit, and the near misses.
std::string nothing_found(const Result& result);

}  // namespace dropfront::report
