#pragma once
#include <atomic>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/problem/build_sample.hpp"
#include "dropfront/scoring/tolerance_cost.hpp"
#include "dropfront/search/search.hpp"

namespace dropfront::problem {

/// A difference of less than this share of the corner's value lies within what the settled temperatures of
/// both leave open (0.1 K of a junction is 1e-4 of a zener's voltage) and is none.
inline constexpr double kBoxTolerance = 1e-3;

/// One quantity: what the corners say, and the worst point found inside the tolerances.
struct BoxFinding {
  scoring::BoxQuantity quantity;
  std::string supply;            ///< on which it was worst
  std::optional<double> corner;  ///< absent: no answer
  std::optional<double> inside;  ///< absent: no answer
  bool corner_exceeded = false;  ///< `inside` is worse than `corner` by more than kBoxTolerance
  std::optional<double> limit;
  std::optional<bool> pass;          ///< of the worse of both against the limit; absent without one
  std::vector<scoring::Term> where;  ///< of `inside`
  int evaluations = 0;

  std::optional<double> worst() const;     ///< the worse of both
  std::optional<double> headroom() const;  ///< of worst(), as a check's
};

/// A ranked design scored again from its part values: the tolerance box, the sample, the price of tolerances.
struct Confirmation {
  std::vector<BoxFinding> box;
  std::optional<BuildSample> sample;  ///< absent: not made for this design at this effort
  std::vector<scoring::ToleranceCost> costs;
  int evaluations = 0;

  bool corners_hold() const;  ///< no corner was exceeded
  bool limits_hold() const;   ///< every limit that could be judged holds inside the tolerances
};

/// What confirming may spend at an effort.
struct ConfirmPlan {
  int margin_evaluations = 60;  ///< points of the box tried a design, for the margin
  int other_evaluations = 40;   ///< and for each other quantity
  int sample_units = 2;         ///< designs sampled, a step-down stage counting as four; 0: none, -1: all
};
ConfirmPlan confirm_plan(search::Effort effort);

/// Confirms designs in their order; the sample goes to the first ones of `sample_order` (indices into
/// `designs`) as far as the plan's units go, one at least. Same answer for any thread count. `stop`: nothing
/// more is begun once it is set; the designs not reached have no confirmation.
std::vector<std::optional<Confirmation>> confirm(const Problem& problem,
                                                 const std::vector<scoring::Design>& designs,
                                                 const std::vector<int>& sample_order,
                                                 const ConfirmPlan& plan, int threads,
                                                 const std::atomic<bool>* stop = nullptr);

}  // namespace dropfront::problem
