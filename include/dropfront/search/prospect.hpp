#pragma once
#include <vector>

#include "dropfront/search/candidate_queue.hpp"
#include "dropfront/search/session.hpp"

namespace dropfront::search {

/// A design to work from and what is known of it.
struct Parent {
  Choice choice;
  std::vector<double> objectives;  ///< all known for front members; NaN allowed
  double violation = 0;            ///< of a design that breaks limits, taken up while nothing complies
};

/// Looks at designs, guesses what looks do not tell, and queues them for evaluation. `made_from[i]`: index
/// into `parents` of choice i. Guesses: the local model of the design's region, anchored at the parent where
/// that is the parent's region too, less its error (optimistic); without a usable model the parent's value.
void prospect(Session& session, CandidateQueue& queue, const std::vector<Parent>& parents,
              const std::vector<Choice>& choices, const std::vector<std::size_t>& made_from);

}  // namespace dropfront::search
