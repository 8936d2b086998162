#pragma once
#include <cstdint>
#include <map>
#include <utility>
#include <vector>

#include "dropfront/search/candidate_queue.hpp"
#include "dropfront/search/search_state.hpp"

namespace dropfront::search {

/// A design to work from and what is known of it.
struct Parent {
  Choice choice;
  std::vector<double> quantities;  ///< objectives, then headrooms of checks (may end earlier); NaN: unknown
  double violation = 0;            ///< of a design that breaks limits, taken up while nothing complies
  std::int64_t tag = -1;           ///< of a compliant design
};

/// A design that was looked at, and the index of the parent it was made from.
struct Offspring {
  Choice choice;
  std::vector<double> known;
  std::size_t parent = 0;
};

/// Guesses what looks do not tell.
///
/// Objectives: a local model of the design's region about its place (one fit for all designs in a cell of a
/// grid over the axes), anchored at the parent where that lies in the same region and close by, less its
/// error (optimistic); without a usable model the parent's value. Chance to hold the checks: from models of
/// those headrooms that evaluations have found broken, and from the record of the options that differ from
/// the parent's.
class Prospector {
 public:
  Prospector(SearchState& state, const std::vector<Parent>& parents);

  std::vector<Guess> guess(const std::vector<Offspring>& offspring);

 private:
  using Cell = std::pair<std::int64_t, std::vector<int>>;  // region, position in steps of the grid
  Cell cell_of(const Choice& choice) const;
  void fit(const std::vector<Offspring>& offspring);
  std::vector<double> objectives(const Offspring& design, const std::vector<LocalFit>* fits) const;
  double chance(const Offspring& design, const std::vector<LocalFit>* fits) const;
  const LocalFit* fit_of(const std::vector<LocalFit>* fits, int quantity) const;
  double known(std::size_t parent, int quantity) const;
  double value(const LocalFit& fit, const Offspring& design, int quantity) const;

  SearchState& state_;
  const std::vector<Parent>& parents_;
  std::vector<int> checks_;
  std::vector<int> wanted_;    ///< quantities fitted: unknown objectives, then telling checks
  std::vector<int> place_of_;  ///< quantity -> index into wanted_, or -1
  std::map<Cell, std::vector<LocalFit>> fits_;
};

}  // namespace dropfront::search
