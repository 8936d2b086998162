#pragma once
#include <cstdint>
#include <vector>

#include "dropfront/search/achievement.hpp"
#include "dropfront/search/session.hpp"

namespace dropfront::search {

/// A relaxed design: one combination of category options, a position on every axis.
struct RelaxedDesign {
  Choice categories;  ///< entries of slots that are no categories: 0
  std::vector<double> position;
  std::vector<double> objectives;
  double violation = 0;
  std::vector<double> headroom;  ///< as in Evaluation
};

/// The best relaxed design for one aim in one region.
struct RelaxedOptimum {
  RelaxedDesign design;
  std::vector<double> weights;
};

struct Relaxation {
  std::vector<RelaxedOptimum> optima;  ///< by aim, then region
  ObjectiveRange range;                ///< of the relaxed designs that comply, or of all if none does
};

/// Stage relax. Each region (combination of category options) is sampled evenly, searched by a global NLopt
/// method for a balanced aim, then polished by a local one for the aims it serves best, starting from the
/// best of the log. Regions beyond the effort's limit are thinned out evenly. Feeds the session's model.
Relaxation relax(Session& session);

/// Combinations of category options, at most `most` of them, evenly thinned.
std::vector<Choice> regions_of(const Space& space, int most);

}  // namespace dropfront::search
