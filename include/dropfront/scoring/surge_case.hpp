#pragma once
#include <optional>
#include <string>
#include <vector>

#include "dropfront/circuit/pulse.hpp"
#include "dropfront/circuit/varistor.hpp"
#include "dropfront/scoring/point_solver.hpp"
#include "dropfront/scoring/run_figures.hpp"

namespace dropfront::scoring {

/// Which end of a varistor's tolerance: the high one lets most through, the low one takes most itself.
enum class VaristorEnd { low, high };

/// The varistor's law at one end: +/- 10 % about its voltage at 1 mA (the K of a size such as 431K), the
/// data's clamping voltage being the greatest. Absent: clamping voltage or current is not given.
std::optional<circuit::VaristorLaw> varistor_law(const parts::Varistor& part, VaristorEnd end);

/// The mains' phase in running at which a surge comes, and what the supply holds then.
struct SurgeMoment {
  double phase_deg = 0;  ///< of the fundamental
  double time_s = 0;
  circuit::StateVector state{};  ///< of the unloaded high line
  std::uint32_t latched = 0;
};

/// Values, moment and polarity of one run.
struct SurgeCase {
  Recipe recipe;                   ///< ends of everything but what follows
  double series_resistor_ohm = 0;  ///< anywhere in its range
  VaristorEnd varistor = VaristorEnd::high;
  double surge_V = 0;  ///< open-circuit peak, signed
  double source_ohm = 2;
  bool rail_only = false;  ///< the rail's extremes, nothing else
  bool stress = false;     ///< the clamp's stress too: a trace of its power, which costs as much as the run
};

/// One run and what is read from it.
struct SurgeRun {
  bool usable = false;
  std::string reason;
  double phase_deg = 0;
  double surge_V = 0;  ///< signed
  double ambient_degC = 25;
  std::string ends;
  circuit::ElementValues values;
  double local_degC = 25;
  double clamp_junction_degC = 25;  ///< before the surge
  double rail_max_V = 0;            ///< ESR included
  SeriesResistorFigures resistor;
  double dropper_peak_V = 0;  ///< greatest magnitude
  double rectifier_peak_A = 0;
  double thyristor_peak_A = 0;
  double line_A2s = 0;  ///< integral of the squared line current
  double varistor_energy_J = 0;
  double varistor_peak_A = 0;
  double clamp_energy_J = 0;  ///< in all clamp branches
  double clamp_peak_A = 0;
  double clamp_stress_W_sqrt_s = 0;  ///< of one clamp part; only where asked for
  double energy_residual = 0;
};

/// The supply in running on the unloaded high line at the given phases (ascending, 0 to below 360 degrees).
/// Empty where the run fails.
std::vector<SurgeMoment> surge_moments(const PointSolver& points, const OperatingPoint& rest,
                                       const std::vector<double>& phases_deg);

/// Runs one case from `moment`. Temperatures are those of `rest`.
SurgeRun run_surge(const PointSolver& points, const OperatingPoint& rest, const SurgeMoment& moment,
                   const SurgeCase& which);

}  // namespace dropfront::scoring
