#pragma once
#include <string>

#include "dropfront/scoring/score.hpp"

namespace dropfront::report {

struct AssessTextOptions {
  bool explain = false;  ///< under each check: where it was worst, and the formula or source it rests on
  bool colour = false;   ///< mark what fails for a terminal
};

/// One assessed design for people: verdict, parts, objectives, operating points, checks, cautions. At most
/// kTextWidth wide, escape sequences apart.
std::string assess_text(const std::string& title, const scoring::Design& design,
                        const scoring::Requirement& requirement, const scoring::Score& score,
                        const AssessTextOptions& options = {});

}  // namespace dropfront::report
