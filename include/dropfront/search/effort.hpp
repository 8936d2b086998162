#pragma once
#include <cstddef>
#include <cstdint>

#include "dropfront/search/search.hpp"

namespace dropfront::search {

/// What an effort may spend. A look costs microseconds, an evaluation up to about a millisecond, a relaxed
/// evaluation about as much as a full one.
struct EffortPlan {
  std::int64_t looks;             ///< most designs looked at
  std::int64_t evaluations;       ///< most evaluations begun, at most 5 % of the looks when heuristic
  std::int64_t relaxed;           ///< most relaxed evaluations
  std::int64_t exhaustive_limit;  ///< spaces up to this size are enumerated
  std::int64_t proof_limit;       ///< spaces up to this size are proven unasked
  int aims;                       ///< weight vectors, at least
  int most_regions;               ///< combinations of category options relaxed, at most
  int starts;                     ///< relaxed designs of each region that are snapped and scored, at most
  int pair_window;                ///< two-part changes: distinct neighbours on either side of each axis
  double reach;                   ///< designs guessed to miss the front by more than this share of its extent
                                  ///< wait until nothing better is left
};

/// quick / normal / deep; `options.budget` replaces the looks.
EffortPlan plan_for(const SearchOptions& options);

/// Fixed batch sizes: part of the answer, since a batch sees the front as it was before.
constexpr int evaluation_batch = 96;
constexpr std::size_t proof_batch = 256;  ///< boxes
constexpr int members_a_round = 8;
constexpr int mixtures_a_round = 600;
constexpr int most_dry_rounds = 10;

}  // namespace dropfront::search
