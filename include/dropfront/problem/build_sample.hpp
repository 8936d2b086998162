#pragma once
#include <array>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/problem/problem.hpp"
#include "dropfront/scoring/corner_trial.hpp"

namespace dropfront::problem {

/// A sample of builds: parts uniform inside their tolerances, by independent random shifts of one Sobol set.
inline constexpr int kScrambles = 16;
inline constexpr int kBuildsAScramble = 256;

/// What one scramble showed. A build without an answer passes nothing.
struct ScrambleTally {
  std::array<int, scoring::kBoxQuantities> passed{};  ///< builds within the limit, by quantity
  int passed_all = 0;
  std::vector<double> margins_A;  ///< one a build with an answer
  std::vector<double> standbys_W;
  friend bool operator==(const ScrambleTally&, const ScrambleTally&) = default;
};

/// Share of builds that pass, with a 95 % interval.
struct Yield {
  std::string check;  ///< id, or "all of these"
  int builds = 0;
  int passed = 0;
  double share = 0;
  double low = 0, high = 1;
};

/// Order statistics of a figure over the builds.
struct Quantiles {
  double least = 0, one_percent = 0, median = 0, ninety_nine_percent = 0, greatest = 0;
};

struct BuildSample {
  std::vector<Yield> yields;  ///< one a quantity that has a limit, then all together
  std::optional<Quantiles> margin_A, standby_W;
};

/// Scramble number `scramble` of a design: kBuildsAScramble builds, each at the worst conditions
/// (corner_trial.hpp) of every supply.
ScrambleTally try_scramble(const Problem& problem, const scoring::Design& design, int scramble);

/// Adds up the scrambles of one design.
BuildSample summed(const Problem& problem, const scoring::Design& design,
                   const std::vector<ScrambleTally>& scrambles);

/// Mean of equally long scrambles' shares and its 95 % interval by Student's t over the scrambles, kept in
/// 0..1. Where all scrambles agree at 0 or 1, which says nothing of the spread, the exact interval of
/// C. J. Clopper, E. S. Pearson, Biometrika 26 (1934) 404 for that many builds.
Yield yield_of(const std::string& check, const std::vector<int>& passed, int builds_each);

}  // namespace dropfront::problem
