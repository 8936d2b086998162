#pragma once
#include <string>

#include "dropfront/scoring/corners.hpp"
#include "dropfront/scoring/operating_point.hpp"
#include "dropfront/scoring/requirement.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring {

/// What hangs on the rail in one corner.
struct LoadCase {
  std::string name = "none";
  double output_A = 0;
  double beside_A = 0;  ///< leakage and rail loads
  Quiescent quiescent = Quiescent::data;
  bool at_trough = false;  ///< a step-down stage's current is taken at the rail's minimum, else at its mean
  End output = End::high;  ///< end of its output tolerance a step-down stage stands at
};

/// Rises over the ambient at which the values of a point were taken.
struct Rises {
  double local_K = 0;     ///< of the air in the enclosure
  double junction_K = 0;  ///< of the clamp's junction over that air
  Temperatures over(double ambient_degC) const;
};

/// Solves single points with what feeds back on them settled: the air in the enclosure and the clamp's
/// junction warm up by the power solved for, and a step-down stage draws by the rail solved for. Counts what
/// it solves.
class PointSolver {
 public:
  /// `required_V` sets the load's soft cut-off (half of it) and the stage's dropout; all must outlive this.
  PointSolver(const Design& design, const Requirement& requirement, double required_V);

  /// One operating point. Temperatures settle to 0.05 K, the current to 1e-6 relative. `warm`: a neighbour of
  /// the same score to start from, or null for the analytic start.
  OperatingPoint solve(const char* corner, const Recipe& recipe, const LoadCase& load, double ambient_degC,
                       const OperatingPoint* warm = nullptr);

  /// Values at given rises, load left out.
  circuit::ElementValues values(const Recipe& recipe, const Rises& rises, double ambient_degC) const;
  /// One steady state at given values, counted.
  circuit::SteadyState steady(const circuit::ElementValues& values,
                              const circuit::SteadyOptions& options = {},
                              const circuit::StateVector* guess = nullptr);
  /// Rises a solved state causes, given the junction rise its values were taken at.
  Rises rises_of(const circuit::ElementValues& values, const circuit::SteadyState& state,
                 double junction_K) const;
  /// Rises by the closed-form currents, to start from.
  Rises estimated_rises(const circuit::ElementValues& cold, double load_A) const;

  const Design& design() const { return *design_; }
  const Requirement& requirement() const { return *requirement_; }
  double required_V() const { return required_V_; }
  int steady_states() const { return steady_states_; }
  void count(int steady_states) { steady_states_ += steady_states; }

 private:
  const Design* design_;
  const Requirement* requirement_;
  double required_V_;
  int steady_states_ = 0;
};

}  // namespace dropfront::scoring
