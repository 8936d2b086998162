#pragma once
#include <cstdint>
#include <vector>

#include "dropfront/search/search.hpp"
#include "dropfront/search/shortlist.hpp"

namespace dropfront::search {

/// Designs that break exactly one check. An evaluation that stopped at its first broken check only suggests
/// one: such designs wait until they are evaluated to the end.
class NearMisses {
 public:
  static constexpr int kept = 3;      ///< reported a check
  static constexpr int waiting = 48;  ///< remembered a check, least shortfall first

  explicit NearMisses(int checks);

  /// A design with one broken check so far; `complete`: all its checks were made.
  void suggest(const Choice& choice, const Evaluation& evaluation);

  /// The designs still to be evaluated before the three least shortfalls of each check are certain, at most
  /// `a_check` for each; empty when nothing is left to settle.
  std::vector<Choice> unsettled(int a_check) const;

  /// The full evaluation of a design that was waiting.
  void settle(const Choice& choice, const Evaluation& full);

  /// By check, then shortfall.
  std::vector<NearMiss> result() const;

 private:
  struct PerCheck {
    Shortlist open{waiting};
    Shortlist sure{kept};
    std::set<Choice> settled;
  };
  std::vector<PerCheck> checks_;
};

}  // namespace dropfront::search
