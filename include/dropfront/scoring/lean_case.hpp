#pragma once
#include <string>

#include "dropfront/circuit/available_current.hpp"
#include "dropfront/scoring/point_solver.hpp"

namespace dropfront::scoring {

/// Ends of what is free in the lean corner.
struct LeanEnds {
  End series_resistor = End::high;
  End esr = End::high;
  End discharge = End::high;
  friend bool operator==(const LeanEnds&, const LeanEnds&) = default;
};
/// As words; the discharge chain is left out where there is none.
std::string ends_text(const LeanEnds& ends, bool bled);

/// One ambient and one choice of ends.
struct LeanCase {
  double ambient_degC = 0;
  LeanEnds ends;
  friend bool operator==(const LeanCase&, const LeanCase&) = default;
};

/// A case solved for what it can deliver, with the clamp's junction as warm as that load leaves it.
struct LeanSolution {
  bool usable = false;
  std::string reason;
  LeanCase where;
  Rises rises;
  double available_A = 0;  ///< largest rail load with rail minimum >= V_required
  double best_A = 0;       ///< rail load of greatest output: available_A, or lower for a power law
  double best_rail_V = 0;  ///< rail minimum there (V_required, or the power law's rail)
  circuit::AvailableCurrent available;  ///< in full, to start neighbouring cases from
  circuit::StateVector best_state{};    ///< capacitor voltages at best_A, likewise
};

/// Solves single cases of the lean corner: low flat-topped mains, C min, low clamp curve, greatest drops.
class LeanCaseSolver {
 public:
  /// `overhead_A`: Iq, leakage and rail loads beside the output. `aged`: age in lives, 1 for end-of-life
  /// values.
  LeanCaseSolver(PointSolver& points, const circuit::Waveform& lean_mains, double overhead_A, double aged);

  Recipe recipe(const LeanEnds& ends) const;
  /// Largest load, or for a step-down stage the load of greatest power. The junction's rise settles to 0.1 K.
  /// `neighbour`: a solution of another case to take first guesses from, or null.
  LeanSolution solve(const LeanCase& where, const LeanSolution* neighbour);
  /// The available current for a required rail of `rail_V` at given rises: nothing settles, no power law.
  LeanSolution solve_at(double rail_V, const LeanCase& where, const Rises& rises,
                        const LeanSolution* neighbour);
  /// Rail minimum at `where` with the load and rises of a solution found elsewhere; far below zero when there
  /// is no steady state.
  double rail_V(const LeanCase& where, const LeanSolution& known);
  /// Greatest sustained output current of a solution: rail current less overhead; for a step-down stage its
  /// power eta·I·v over the greatest output voltage, Vout·(1 + tolerance): the load's current is given, and a
  /// stage at the upper end of its tolerance needs the most power for it.
  double capability_A(const LeanSolution& solution) const;

  PointSolver& points() { return *points_; }
  const PointSolver& points() const { return *points_; }
  bool stepping() const;

 private:
  void find_power_peak(circuit::ElementValues values, double near_A, double reach, LeanSolution& found);

  PointSolver* points_;
  const circuit::Waveform* mains_;
  double overhead_A_;
  double aged_;
};

}  // namespace dropfront::scoring
