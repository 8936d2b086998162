#pragma once
#include <string>

#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// What was proven and how, or what is left open and what it could still hide: one paragraph, not wrapped;
/// empty when no proof was made or tried.
std::string proof_text(const Result& result);

}  // namespace dropfront::report
