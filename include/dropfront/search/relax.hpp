#pragma once
#include <vector>

#include "dropfront/search/achievement.hpp"
#include "dropfront/search/relaxed_log.hpp"
#include "dropfront/search/search_state.hpp"

namespace dropfront::search {

/// The best relaxed design for one aim in one region.
struct RelaxedOptimum {
  RelaxedDesign design;
  std::vector<double> weights;
};

struct Relaxation {
  std::vector<RelaxedOptimum> optima;  ///< in order of the runs that found them
  std::vector<RelaxedOptimum> starts;  ///< some of every region, well spread (see spread_of)
  ObjectiveRange range;                ///< of the relaxed designs that comply, or of all if none does
};

/// Stage relax, every region (combination of category options) by itself: an even sample, then a global NLopt
/// method on the violation alone until a design complies. Then a local one from the best of the log, first
/// for a balanced aim in every region that has a complying design, then for the spread aims in the regions
/// that serve each best. Regions beyond the effort's limit are thinned out evenly. Feeds the search state's
/// relaxed model.
Relaxation relax(SearchState& state);

/// Combinations of category options, at most `most` of them, evenly thinned.
std::vector<Choice> regions_of(const Space& space, int most);

}  // namespace dropfront::search
