#pragma once
#include <array>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/scoring/lean.hpp"
#include "dropfront/scoring/load_profile.hpp"
#include "dropfront/scoring/point_solver.hpp"

namespace dropfront::scoring {

/// Ends of what is free in the lean corner.
struct LeanEnds {
  End series_resistor = End::high;
  End esr = End::high;
  End discharge = End::high;
};
std::string ends_text(const LeanEnds& ends);

/// The lean corner at one ambient and one choice of ends, solved for what it can deliver.
struct LeanSolution {
  bool usable = false;
  std::string reason;
  double ambient_degC = 0;
  LeanEnds ends;
  Rises rises;
  double available_A = 0;  ///< largest rail load with rail minimum >= V_required
  double best_A = 0;       ///< rail load of greatest output: available_A, or lower for a power law
  double best_rail_V = 0;  ///< rail minimum there (V_required, or the power law's rail)
  circuit::StateVector state{};
};

/// Finds the least the lean corner delivers over ambients and ends. At one presumed choice the available
/// current is searched; at every other a steady state at that current decides, and where the rail falls
/// short the search is done there instead.
class LeanSearch {
 public:
  /// `overhead_A`: Iq, leakage and rail loads beside the output. `aged`: end-of-life values.
  LeanSearch(PointSolver& points, const circuit::Waveform& lean_mains, double overhead_A, bool aged);

  /// Least over both ambients; solved at the first call.
  const LeanSolution& least();
  /// Least over the ends at the low (false) or high (true) ambient.
  const LeanSolution& at(bool hot);
  /// Available current for another required rail, least of both ambients at the deciding ends.
  std::optional<double> current_at_A(double rail_V);
  /// Greatest sustained output current of a solution: rail current less overhead; for a step-down stage its
  /// power eta·I·v over the output voltage.
  double capability_A(const LeanSolution& solution) const;
  Recipe recipe(const LeanEnds& ends) const;

 private:
  struct Case {
    double ambient_degC;
    LeanEnds ends;
  };
  std::vector<Case> cases(bool cold, bool hot) const;
  LeanSolution search(const Case& where, const Rises* rises);
  LeanSolution least_of(std::vector<Case> cases);
  double rail_at(const Case& where, const LeanSolution& known);
  bool knee_presumed() const;

  PointSolver* points_;
  const circuit::Waveform* mains_;
  double overhead_A_;
  bool aged_;
  std::optional<LeanSolution> least_;
  std::array<std::optional<LeanSolution>, 2> at_;
};

}  // namespace dropfront::scoring
