#pragma once
#include <string>

#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// What a search found, for people: counts, the ranked sets, or what stands in the way; cautions. At most
/// kTextWidth wide, no colour, no paths.
std::string summary_text(const Result& result);

/// The part above the cautions, for several results one after the other.
std::string summary_body(const Result& result);

/// "Cautions" and the list, wrapped.
std::string cautions_text(const std::vector<std::string>& cautions);

}  // namespace dropfront::report
