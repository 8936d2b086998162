#pragma once
#include <string>
#include <vector>

#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// candidates.json: format, title, name, status, problem, provenance, counts, proof, front, ranked, extras,
/// evidence, near_misses, prices, conflict, cautions. Same result, same bytes; no times, paths or thread
/// counts.
std::string candidates_json(const Result& result);

/// {"problems": [...]}, one candidates document each, in order.
std::string problems_json(const std::vector<std::string>& candidates_documents);

/// Value of `format` in candidates.json and study.json.
inline constexpr const char* kCandidatesFormat = "dropfront candidates 1";
inline constexpr const char* kStudyFormat = "dropfront study 1";

}  // namespace dropfront::report
