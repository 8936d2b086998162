#include "dropfront/scoring/verdict.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/scoring/load_profile.hpp"

namespace dropfront::scoring {

namespace {

constexpr double kLeastShortfall = 1e-9;
constexpr double kMostShortfall = 1e3;

bool known(const Objectives& objectives, Objective which) {
  switch (which) {
    case Objective::cost:
      return objectives.cost_micro.has_value();
    case Objective::standby_loss:
      return objectives.standby_loss_W.has_value();
    case Objective::board_area:
      return objectives.board_area_um2.has_value();
    case Objective::current_margin:
      return objectives.current_margin_A.has_value();
  }
  return false;
}

bool accepted(const Check& check, const Requirement& requirement) {
  return requirement.accept_missing_ratings && !check.unsolved;
}

}  // namespace

Verdict verdict_of(const Score& score, const Requirement& requirement) {
  bool open = false;
  for (const auto& check : score.checks) {
    if (check.pass && !*check.pass) return Verdict::breaks_limits;
    if (!check.pass && !accepted(check, requirement)) open = true;
  }
  for (const auto objective : requirement.objectives) {
    if (!known(score.objectives, objective)) open = true;
  }
  return open ? Verdict::undefined : Verdict::compliant;
}

double shortfall_of(const Check& check, const Requirement& requirement) {
  const auto headroom = check.headroom();
  double shortfall = 1;
  if (headroom) {
    shortfall = -*headroom;
  } else if (check.value && check.limit) {
    const double scale = check.id == "supply.margin"
                             ? std::max(1e-4, load_profile(requirement.output).heaviest_output_A())
                             : 1;
    shortfall = std::abs(*check.value - *check.limit) / scale;
  }
  if (!(shortfall <= kMostShortfall)) return kMostShortfall;
  return std::max(kLeastShortfall, shortfall);
}

double violation_of(const Score& score, const Requirement& requirement) {
  double sum = 0;
  for (const auto& check : score.checks) {
    if (check.pass && !*check.pass) sum += shortfall_of(check, requirement);
    if (!check.pass && !accepted(check, requirement)) sum += 1;
  }
  for (const auto objective : requirement.objectives) {
    if (!known(score.objectives, objective)) sum += 1;
  }
  return sum;
}

std::vector<std::string> cautions_of(const Design& design, const Score& score,
                                     const Requirement& requirement) {
  std::vector<std::string> cautions;
  if (design.dropper != nullptr && !design.dropper->series_rated) {
    cautions.emplace_back(
        "dropper: not stated for use in series with the mains; its end-of-life loss of capacitance is the "
        "design's weak point");
  }
  for (const auto& check : score.checks) {
    if (check.pass || check.unsolved || !requirement.accept_missing_ratings) continue;
    cautions.push_back(std::string(check.id) + ": no rating given, not judged (" + check.basis + ")");
  }
  for (const auto& supply : score.operations) {
    for (const auto& row : supply.operations) {
      if (row.state.usable() && row.state.reason.empty()) continue;
      cautions.push_back((supply.supply.empty() ? "" : supply.supply + ", ") + row.corner + ": " +
                         row.state.reason);
    }
  }
  return cautions;
}

}  // namespace dropfront::scoring
