// What the score's own rich corners and plug-ins say of the mildest design of a box.
#include "dropfront/scoring/bounds/rules.hpp"
#include "dropfront/scoring/checks/checks.hpp"
#include "dropfront/scoring/clamp_power.hpp"

namespace dropfront::scoring::bounds {

namespace {

/// Temperatures settle to 0.05 K only: a box of several designs must break its limit by more than that makes.
double settled(const BoxQuestion& question, double share) {
  constexpr double kSettled = 1e-3;
  const auto& box = question.box;
  const bool one = box.output_stages.size() == 1 && box.droppers.size() == 1 &&
                   box.series_resistors.size() == 1 && box.clamps.size() == 1 && box.reservoirs.size() == 1 &&
                   box.discharges.size() == 1;
  return one ? share : share * (1 - kSettled);
}

double share_of(const BoxQuestion& question, const std::optional<Check>& check) {
  if (!check || check->unsolved || !check->value || !check->limit || !(*check->limit > 0)) return 0;
  return settled(question, *check->value / *check->limit);
}

}  // namespace

/// The composite's empty rail, the greater of both ambients. Monotone by test.
double rail_max_by_engine(const BoxQuestion& question) {
  auto* rich = question.rich();
  return rich == nullptr ? 0 : share_of(question, rail_max(rich->evidence()));
}

/// The composite's plug-ins. Monotone by test.
double rail_transient_by_engine(const BoxQuestion& question) {
  auto* rich = question.rich();
  return rich == nullptr ? 0 : share_of(question, rail_transient(rich->evidence()));
}

/// The composite's clamp, empty and hot, over each part's own rating. What the reservoir's ESR does to it has
/// no fixed sign: reservoirs must be single. Monotone by test.
double clamp_power_by_engine(const BoxQuestion& question) {
  if (question.box.reservoirs.size() > 1) return 0;
  auto* rich = question.rich();
  if (rich == nullptr) return 0;
  const auto& point = rich->evidence().rich_empty_hot();
  if (!point.state.usable()) return 0;
  const double power_W = clamp_power_W(*question.box.arrangement, point.values, point.state);
  const double derating = question.context.requirement->derating.clamp_power;
  return settled(question, question.least_share(question.box.clamps, [&](const parts::Clamp* part) {
    return part->rated_power_W ? power_W / (*part->rated_power_W * derating) : 0;
  }));
}

/// Each part's own resistance times the composite's power above its air; reservoirs as above. Monotone by
/// test.
double clamp_junction_by_engine(const BoxQuestion& question) {
  if (question.box.reservoirs.size() > 1) return 0;
  auto* rich = question.rich();
  if (rich == nullptr) return 0;
  const auto& point = rich->evidence().rich_empty_hot();
  if (!point.state.usable()) return 0;
  const double power_W = clamp_power_W(*question.box.arrangement, point.values, point.state);
  return settled(question, question.least_share(question.box.clamps, [&](const parts::Clamp* part) {
    const double resistance_K_per_W = part->thermal_resistance_K_per_W;
    const double limit_degC = part->max_junction_degC - question.context.requirement->derating.junction_K;
    if (!(resistance_K_per_W > 0) || !(limit_degC > 0)) return 0.0;
    return (point.local_degC + resistance_K_per_W * power_W) / limit_degC;
  }));
}

/// The composite's clamp pulse over the rating. What it takes from the reservoir turns either way with the
/// clamp's slope and the ESR: both must be single. Monotone by test.
double clamp_pulse_by_engine(const BoxQuestion& question) {
  if (question.box.clamps.size() > 1 || question.box.reservoirs.size() > 1) return 0;
  auto* rich = question.rich();
  return rich == nullptr ? 0 : share_of(question, clamp_pulse(rich->evidence()));
}

}  // namespace dropfront::scoring::bounds
