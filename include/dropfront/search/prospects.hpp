#pragma once
#include <cstdint>
#include <map>
#include <vector>

#include "dropfront/search/candidate_queue.hpp"
#include "dropfront/search/prospector.hpp"
#include "dropfront/search/search_state.hpp"

namespace dropfront::search {

/// The designs under consideration: looked at, guessed at, waiting in order of promise.
class Prospects {
 public:
  explicit Prospects(SearchState& state)
      : state_(state), queue_(state.codec, state.evaluator.objective_count()) {}

  /// Looks at designs and queues those that stay in play. `made_from[i]`: index into `parents` of choice i.
  void add(const std::vector<Parent>& parents, const std::vector<Choice>& choices,
           const std::vector<std::size_t>& made_from);

  /// Takes the most promising designs. Guesses are made anew each time the evaluations have grown by a
  /// quarter.
  std::vector<Choice> take(int count);

  bool empty() const { return queue_.empty(); }
  std::int64_t promising() const { return queue_.promising(); }
  std::size_t aside() const { return queue_.aside(); }
  /// Guesses anew at everything that was laid aside, going farther behind the front as long as that brings
  /// nothing; true when something of it waits again, false when nothing was aside.
  bool recall();

 private:
  void reguess(std::size_t most);

  SearchState& state_;
  CandidateQueue queue_;
  std::vector<Parent> parents_;                   ///< of all designs ever queued
  std::map<std::int64_t, std::size_t> place_of_;  ///< tag of a compliant parent -> its place there
  std::int64_t guessed_at_ = 0;                   ///< evaluations at the last reguess
  std::int64_t recalled_at_ = -1;                 ///< and at the last recall
};

}  // namespace dropfront::search
