#pragma once
#include <cstdint>
#include <functional>
#include <string>
#include <vector>

#include "dropfront/search/space.hpp"

namespace dropfront::search {

enum class Outcome { compliant, breaks_limits, undefined };

/// What the search learns of one design. All objectives are minimised (a margin comes in negated).
struct Evaluation {
  Outcome outcome = Outcome::undefined;
  bool complete = true;              ///< false: stopped early because it cannot reach the front, or failed;
                                     ///< what was computed by then is filled in all the same
  std::vector<double> objectives;    ///< in the problem's order; NaN where unknown
  double violation = 0;              ///< graded and finite, 0 when compliant
  std::vector<std::int16_t> broken;  ///< indices into the problem's check names that failed
  std::vector<double> shortfall;     ///< relative shortfall, one per entry of `broken`
  /// Relative headroom of every check of the problem's check names, negative where broken, NaN where not
  /// made. May be left empty; given, it lets the search foresee which designs will break a check.
  std::vector<double> headroom;
};

using Dominated = std::function<bool(const std::vector<double>& objectives)>;

/// The bridge to whatever is being designed. Every member is called from several threads at once, is total
/// and depends on its arguments only.
class Evaluator {
 public:
  virtual ~Evaluator() = default;
  virtual const Space& space() const = 0;
  virtual int objective_count() const = 0;
  /// Step of each objective for the Pareto filter; 0: raw.
  virtual const std::vector<double>& resolution() const = 0;
  virtual const std::vector<std::string>& check_names() const = 0;
  /// Exact for the objectives that need no solving (NaN for the others), with the checks that need none.
  /// Outcome compliant: none of those checks is broken, and a full evaluation may still comply.
  virtual Evaluation look(const Choice& choice) const = 0;
  /// Objectives and limits in order of cost. May stop early (complete = false) once `dominated`, called with
  /// the objectives known so far and NaN for the others (a value may also be a bound the objective cannot
  /// fall below), says the design cannot reach the front, or once a check fails. With an empty function
  /// nothing is skipped: every check is made, failed or not, and complete = true unless undefined.
  /// The search passes a front frozen before the batch, so that threads do not matter.
  virtual Evaluation evaluate(const Choice& choice, const Dominated& dominated) const = 0;
  /// A design between the options: `position` holds one entry for each slot whose `coordinate` is not empty,
  /// in slot order, in [0, 1] (0: least coordinate, 1: greatest); category slots are fixed by `categories`
  /// (one entry a slot; those of other slots are ignored). Violation is graded and finite, objectives finite.
  virtual Evaluation relaxed(const Choice& categories, const std::vector<double>& position) const = 0;
};

}  // namespace dropfront::search
