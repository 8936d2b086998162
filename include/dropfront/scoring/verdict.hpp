#pragma once
#include <string>
#include <vector>

#include "dropfront/scoring/requirement.hpp"
#include "dropfront/scoring/score.hpp"

namespace dropfront::scoring {

/// Verdict of a score from its checks and objectives: a failed check always wins; then anything unsolved, a
/// missing rating that is not accepted, or an asked objective that is unknown makes it undefined.
Verdict verdict_of(const Score& score, const Requirement& requirement);

/// Graded measure of what is wrong, finite, 0 when compliant: for each failed check its relative shortfall
/// (at least 1e-9, at most 1e3), for each undefined check and each unknown asked objective 1.
double violation_of(const Score& score, const Requirement& requirement);

/// Relative shortfall of a failed check. Where the limit is 0 a margin is measured against the heaviest load,
/// anything else against 1.
double shortfall_of(const Check& check, const Requirement& requirement);

/// What a reader of this score should be warned of: parts outside their intended use, ratings not given.
std::vector<std::string> cautions_of(const Design& design, const Score& score,
                                     const Requirement& requirement);

}  // namespace dropfront::scoring
