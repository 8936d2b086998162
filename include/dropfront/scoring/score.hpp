#pragma once
#include <cstdint>
#include <functional>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/circuit/steady_state.hpp"
#include "dropfront/scoring/check.hpp"
#include "dropfront/scoring/corners/mains_shape.hpp"
#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/faults.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

enum class Verdict { compliant, breaks_limits, undefined };

/// The four objectives with names, never by position. Absent: could not be computed (price or size not given,
/// no steady state).
struct Objectives {
  std::optional<std::int64_t> cost_micro;
  std::optional<double> standby_loss_W;
  std::optional<std::int64_t> board_area_um2;
  std::optional<double> current_margin_A;  ///< worst case, end of life, at the output; more is better
};

/// One row of `operation`.
struct Operation {
  std::string corner;  ///< nominal, lean_cold, lean_hot, rich_empty, ...
  double ambient_degC = 25;
  std::string ends;
  double load_current_A = 0;  ///< at the output
  double rail_current_A = 0;
  std::optional<double>
      available_current_A;  ///< rail current; absent: not computed at this depth, or no answer
  circuit::SteadyState state;
  std::string note;
};

struct SupplyOperations {
  std::string supply;
  std::vector<Operation> operations;
};

enum class Depth {
  cheap,      ///< cost, area, height, static ratings: no steady state solved
  screen,     ///< adds lean and standby: the four objectives and their checks
  compliant,  ///< all checks, stopping at the first that fails (checks then holds what was computed)
  full        ///< everything, never stopping, operations with available currents included
};

struct Score {
  Verdict verdict = Verdict::undefined;
  bool complete = false;  ///< every check and objective was worked out (never at depth cheap and screen)
  Objectives objectives;
  std::string standby_supply;  ///< name of the supply with the greatest standby loss
  std::string margin_supply;   ///< and of the one with the least margin; the first where alike
  std::optional<double> current_margin_new_A;  ///< the margin with new parts
  /// Year at which the margin reaches zero, the least over supplies; Depth::full only. Absent with a horizon
  /// set: not before the horizon. Absent without one: no answer.
  std::optional<double> current_margin_zero_year;
  std::optional<double> current_margin_horizon_years;
  std::vector<Check> checks;                 ///< in the fixed order of the check table
  std::vector<SupplyOperations> operations;  ///< Depth::full only
  std::vector<FaultRow> faults;  ///< left to faults_of(): only whole evidence carries them
  std::vector<std::string> cautions;
  /// Graded, finite measure of broken limits: sum over failed checks of the relative shortfall, at least 1
  /// per undefined check. 0 when compliant. For the relaxation only.
  double violation = 0;
  int steady_states = 0;  ///< what it cost: steady states and transients run, searches included
  int transients = 0;
};

/// Called once cost and area are known, again with the standby loss, again with all four objectives: true
/// stops the score there (complete = false). It must depend on its argument only for the same bits on any
/// thread.
using Stop = std::function<bool(const Objectives& known)>;

/// Scores designs against one requirement. What depends on the requirement alone is worked out once.
/// Thread-safe; `requirement` must outlive it.
class Scorer {
 public:
  explicit Scorer(const Requirement& requirement);
  /// Total: any design gives a verdict; never throws, never NaN in a set field. Depends on nothing but the
  /// design, the requirement and the depth, so `assess` and `search` give the same bits; a deeper score
  /// repeats the figures of a shallower one to the bit.
  Score score(const Design& design, Depth depth, const Stop& stop = {}) const;

 private:
  const Requirement* requirement_;
  std::vector<MainsShapes> shapes_;
};

/// One design scored once.
Score score(const Design& design, const Requirement& requirement, Depth depth);

}  // namespace dropfront::scoring
