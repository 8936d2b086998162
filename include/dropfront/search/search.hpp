#pragma once
#include <atomic>
#include <cstdint>
#include <functional>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/search/evaluation.hpp"
#include "dropfront/search/proof.hpp"

namespace dropfront::search {

enum class Effort { quick, normal, deep };

struct SearchOptions {
  Effort effort = Effort::normal;
  std::uint64_t seed = 1;
  int threads = 0;                                       ///< 0: all cores; the answer never depends on it
  int top = 5;                                           ///< designs a ranked set
  bool prove = false;                                    ///< prove the front, whatever the space's size
  std::optional<std::int64_t> budget;                    ///< most designs looked at and boxes bounded
  std::optional<double> time_s;                          ///< the only clock that may decide anything
  const std::atomic<bool>* stop = nullptr;               ///< set by a signal handler
  std::function<void(const struct Progress&)> progress;  ///< called from one thread
  struct Switches {         ///< to measure what each piece earns; all on in earnest use
    bool enumerate = true;  ///< enumerate small spaces
    bool relax = true;      ///< stage relax and what snap makes of it
    bool predict = true;    ///< order the closing by local models of the objectives not yet known
  } switches;
};

struct Progress {
  std::string stage;  ///< relax, snap, close, prove, rank
  double fraction = 0;
  std::int64_t looked = 0, scored = 0, front = 0;
};

struct Candidate {
  Choice choice;
  Evaluation evaluation;
  bool on_front = true;
};

/// Designs by one measure, best first.
struct RankedSet {
  std::string name;  ///< "objective <k>" by index order, or "balanced"
  std::vector<Candidate> candidates;
};

struct NearMiss {
  Choice choice;
  int check = 0;  ///< the one check it breaks
  double shortfall = 0;
};

struct CheckTally {
  std::int64_t failed = 0;     ///< designs that failed it
  double least_shortfall = 0;  ///< how close the best of them came
  Choice closest;
};

struct SearchCounts {
  double space = 0;
  std::int64_t relaxed = 0;  ///< relaxed designs evaluated
  std::int64_t looked = 0;   ///< distinct designs looked at
  std::int64_t scored = 0;   ///< of those, scored in full
  std::int64_t compliant = 0;
};

struct SearchOutcome {
  bool cut_short = false;   ///< ended by the stop flag, the time or the budget given in the options
  bool exhaustive = false;  ///< every design of the space was looked at, none left out but by exact reasoning
  /// Of a proof that was asked for or made because the space is small. Complete: `front` is the front of the
  /// whole space, design for design, and an empty one means that no design complies.
  std::optional<Proof> proof;
  bool closed = false;  ///< exhaustive, or no one-part change of a front member was left untried
  SearchCounts counts;
  std::vector<Candidate> front;       ///< sorted by objectives in order, then choice
  std::vector<RankedSet> ranked;      ///< one an objective, then balanced
  std::vector<NearMiss> near_misses;  ///< up to three a check, by check then shortfall
  std::vector<CheckTally> tallies;    ///< one a check name
};

/// Stages relax, snap, close, prove, rank. Spaces up to the effort's limit are enumerated instead. Without a
/// `bounder` (it must know the evaluator's space) nothing larger can be proven. Same evaluator, bounder,
/// options and seed: same outcome with any thread count.
SearchOutcome run_search(const Evaluator& evaluator, const SearchOptions& options,
                         const Bounder* bounder = nullptr);

}  // namespace dropfront::search
