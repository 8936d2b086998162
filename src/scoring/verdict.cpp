#include "dropfront/scoring/verdict.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "dropfront/scoring/fast_burst.hpp"
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

/// One element of a series chain that opens leaves the whole crest; only a rule that is checked is spoken of.
void add_open_chain(const Score& score, std::vector<std::string>& cautions) {
  for (const auto& check : score.checks) {
    if (check.id != "discharge.voltage" || !check.limit) continue;
    for (const auto& figure : check.figures) {
      if (figure.name != "line_crest_V") continue;
      cautions.push_back(
          fmt::format("discharge: with any one element of the chain open nothing discharges the dropper, and "
                      "up to {:.0f} V "
                      "stay at the plug (the rule allows {:.0f} V)",
                      figure.value, *check.limit));
    }
  }
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
        "design's weak point (such parts were found to have lost 60 to 70 % over 15 to 20 years; as "
        "restated, "
        "copy not kept)");
  }
  if (requirement.limits.fast_burst_V && design.series_resistor != nullptr) {
    cautions.push_back(fast_burst_caution(*requirement.limits.fast_burst_V, design));
  }
  if (design.discharge != nullptr) add_open_chain(score, cautions);
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
