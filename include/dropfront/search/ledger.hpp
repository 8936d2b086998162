#pragma once
#include <cstdint>
#include <vector>

#include "dropfront/search/evaluation.hpp"
#include "dropfront/search/near_misses.hpp"
#include "dropfront/search/pareto.hpp"
#include "dropfront/search/search.hpp"
#include "dropfront/search/shortlist.hpp"

namespace dropfront::search {

/// What became of a design that was merged.
struct Entered {
  bool front = false;                 ///< it joined the front
  std::int64_t tag = -1;              ///< its number among the compliant designs, or -1
  std::vector<std::int64_t> removed;  ///< tags of the members it displaced
};

/// All that a search has found out, fed from one thread in a fixed order.
class Ledger {
 public:
  explicit Ledger(const Evaluator& evaluator);

  /// Takes a look; false when the design is out: a check is broken, or no completion can reach the front.
  bool look(const Choice& choice, const Evaluation& evaluation);

  /// What became of the designs that look() turned away.
  struct TurnedAway {
    std::vector<double> broken;  ///< by the first limit they break, one entry a check name
    double undefined = 0;
    double dominated = 0;
  };
  const TurnedAway& turned_away() const { return turned_away_; }

  /// Takes an evaluation.
  Entered merge(const Choice& choice, const Evaluation& evaluation);

  const ParetoArchive& front() const { return front_; }
  const std::vector<Candidate>& compliant() const { return compliant_; }  ///< by tag
  const SearchCounts& counts() const { return counts_; }
  SearchCounts& counts() { return counts_; }
  const std::vector<CheckTally>& tallies() const { return tallies_; }
  NearMisses& near_misses() { return near_misses_; }
  /// Designs passed over because the front dominates them: best by each objective, to fill short sets from.
  const std::vector<Shortlist>& passed_over() const { return passed_over_; }
  /// Designs that broke limits, least violation first: where to start from while nothing complies.
  const Shortlist& nearest_broken() const { return nearest_broken_; }

  /// Notes a design that the front rejects by the objectives known (NaN: unknown).
  void pass_over(const Choice& choice, const std::vector<double>& objectives);

 private:
  void note_broken(const Choice& choice, const Evaluation& evaluation);

  ParetoArchive front_;
  std::vector<Candidate> compliant_;
  SearchCounts counts_;
  TurnedAway turned_away_;
  std::vector<CheckTally> tallies_;
  NearMisses near_misses_;
  std::vector<Shortlist> passed_over_;
  Shortlist nearest_broken_;
};

}  // namespace dropfront::search
