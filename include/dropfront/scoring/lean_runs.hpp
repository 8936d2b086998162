#pragma once
#include <functional>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/scoring/lean_case.hpp"
#include "dropfront/scoring/rail_load.hpp"

namespace dropfront::scoring {

/// The lean corner as runs need it: its heaviest steady points and the means to set up others beside them.
struct LeanRuns {
  PointSolver* points = nullptr;
  const LeanCaseSolver* solver = nullptr;
  LeanEnds ends;                                ///< that decide the available current
  std::vector<const OperatingPoint*> heaviest;  ///< at those ends, one an ambient, the deciding one first
  int* transients = nullptr;                    ///< counts runs
  std::string reason;                           ///< why the corner has no answer; empty: it has

  double required_V() const { return points->required_V(); }
  const parts::OutputStage& stage() const { return *points->design().output_stage; }
  /// Why there is nothing to start from; empty: there is.
  std::string fault() const;
  /// Values at an ambient's temperatures and a choice of ends, with a load on the rail.
  circuit::ElementValues values(const OperatingPoint& settled, const LeanEnds& ends,
                                const RailLoad& load) const;
  circuit::Network network(const circuit::ElementValues& values) const;
  /// Steady state of such values, the load by the stage's own law; where there is none (a constant power past
  /// what the rail can carry), the state with the load taken at its trough.
  circuit::SteadyState steady(const circuit::ElementValues& values, const OperatingPoint& settled) const;
};

/// Something that happens to the supply for a time.
struct LeanEvent {
  RailLoad before;  ///< and after
  std::function<void(circuit::ElementValues&)>
      disturb;  ///< turns the values before into those while it lasts
  double duration_s = 0;
  std::optional<double> every_s;  ///< again and again; unset: once
};

/// The lowest rail an event leads to, and where.
struct EventAnswer {
  bool usable = false;
  std::string reason;
  std::size_t event = 0;  ///< of those tried
  double rail_min_V = 0;
  double steady_min_V = 0;  ///< before it
  double phase_deg = 0;     ///< of the mains as it begins, 0 to 360
  bool recovers = true;     ///< false: the rail still falls, or falls from one to the next
  double ambient_degC = 25;
  std::string ends;
  circuit::ElementValues values;  ///< before it
  double local_degC = 25;
  double clamp_junction_degC = 25;
};

/// The worst of several events over phases, both ambients and both ends of series resistor, ESR and discharge
/// chain. For each event the grid of phases is searched at the deciding ambient and ends with the ESR high.
/// For the one with the lowest rail each end is turned at that phase, then those that lower the rail
/// together, then the other ambient is tried; the phase is refined last (what moves the worst phase a little
/// moves the rail there by its square).
EventAnswer worst_event(const LeanRuns& runs, const std::vector<LeanEvent>& events);

}  // namespace dropfront::scoring
