#include "dropfront/problem/score_view.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "dropfront/scoring/check_table.hpp"

namespace dropfront::problem {
namespace {

constexpr double kUnknown = std::numeric_limits<double>::quiet_NaN();

double value_of(scoring::Objective objective, const scoring::Objectives& known) {
  switch (objective) {
    case scoring::Objective::cost:
      return known.cost_micro ? static_cast<double>(*known.cost_micro) / 1e6 : kUnknown;
    case scoring::Objective::standby_loss:
      return known.standby_loss_W.value_or(kUnknown);
    case scoring::Objective::board_area:
      return known.board_area_um2 ? static_cast<double>(*known.board_area_um2) / 1e6 : kUnknown;
    case scoring::Objective::current_margin:
      return known.current_margin_A ? -*known.current_margin_A : kUnknown;
  }
  return kUnknown;
}

/// How far beyond the limit, relative to it; 1 where that has no meaning (yes/no checks, a limit of 0).
double shortfall(const scoring::Check& check) {
  const auto headroom = check.headroom();
  return headroom && std::isfinite(*headroom) ? std::max(0.0, -*headroom) : 1.0;
}

}  // namespace

ScoreView::ScoreView(const scoring::Requirement& requirement) : requirement_(requirement) {
  for (const scoring::CheckRule& rule : scoring::check_table()) names_.emplace_back(rule.id);
}

int ScoreView::index_of(std::string_view id) const {
  const auto found = std::find(names_.begin(), names_.end(), id);
  return static_cast<int>(found - names_.begin());
}

std::vector<double> ScoreView::objectives(const scoring::Objectives& known) const {
  std::vector<double> out;
  out.reserve(requirement_.objectives.size());
  for (const scoring::Objective objective : requirement_.objectives)
    out.push_back(value_of(objective, known));
  return out;
}

search::Evaluation ScoreView::evaluation(const scoring::Score& score) const {
  search::Evaluation out;
  out.complete = score.complete;
  out.objectives = objectives(score.objectives);
  out.violation = std::isfinite(score.violation) ? score.violation : 1e9;
  bool missing = false;
  for (const scoring::Check& check : score.checks) {
    if (!check.pass) missing = missing || !requirement_.accept_missing_ratings;
    if (check.pass.value_or(true)) continue;
    out.broken.push_back(static_cast<std::int16_t>(index_of(check.id)));
    out.shortfall.push_back(shortfall(check));
  }
  if (score.complete) {
    // A finished score must know every objective it is ranked by.
    const bool known =
        std::none_of(out.objectives.begin(), out.objectives.end(), [](double x) { return std::isnan(x); });
    missing = missing || score.verdict == scoring::Verdict::undefined || !known;
  }
  out.outcome = !out.broken.empty() || score.verdict == scoring::Verdict::breaks_limits
                    ? search::Outcome::breaks_limits
                : missing ? search::Outcome::undefined
                          : search::Outcome::compliant;
  return out;
}

}  // namespace dropfront::problem
