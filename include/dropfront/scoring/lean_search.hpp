#pragma once
#include <array>
#include <functional>
#include <optional>
#include <vector>

#include "dropfront/scoring/lean_case.hpp"

namespace dropfront::scoring {

/// Finds the least the lean corner delivers over both ambients and both ends of series resistor, ESR and
/// discharge chain. At one presumed case the available current is searched; at the other ends, one at a time
/// and at both ambients, a steady state at that current decides. Where the rail falls short, the ends that
/// lower it are taken together and the search is done there; so on until none falls short.
class LeanSearch {
 public:
  LeanSearch(PointSolver& points, const circuit::Waveform& lean_mains, double overhead_A, double aged);

  /// Least over both ambients; solved at the first call.
  const LeanSolution& least();
  /// Least over the ends at the low (false) or high (true) ambient.
  const LeanSolution& at(bool hot);
  /// Available current for another required rail, such as a step-down's turn-on threshold: the least over
  /// both ambients and the ends of Rs, ESR and chain that decide at that rail, which need not be those that
  /// decide at V_required. A start knows two states of warmth: the first one, at the low ambient, with
  /// nothing warmed yet; and one at the high ambient after a break, everything still as warm as the lean load
  /// left it.
  std::optional<double> current_at_A(double rail_V);
  LeanCaseSolver& solver() { return solver_; }

 private:
  /// How the cases of one descent are solved.
  struct Cases {
    std::function<LeanSolution(const LeanCase&, const LeanSolution* neighbour)> solve;
    std::function<double(const LeanCase&, const LeanSolution& known)> rail_V;
    std::function<double(const LeanSolution&)> capability_A;
  };
  struct Short {
    LeanCase where;
    double rail_V;
  };
  Cases settled_cases();
  bool knee_presumed() const;
  bool little_room(double rail_V) const;
  LeanEnds presumed_ends(bool knee) const;
  LeanSolution least_of(const Cases& cases, const std::vector<double>& ambients, const LeanEnds& first);
  std::vector<Short> short_cases(const Cases& cases, const std::vector<double>& ambients,
                                 const LeanSolution& least);

  LeanCaseSolver solver_;
  std::optional<LeanSolution> least_;
  std::array<std::optional<LeanSolution>, 2> at_;
};

}  // namespace dropfront::scoring
