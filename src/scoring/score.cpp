#include "dropfront/scoring/score.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <memory>

#include "dropfront/scoring/board_area.hpp"
#include "dropfront/scoring/check_table.hpp"
#include "dropfront/scoring/checks/make_check.hpp"
#include "dropfront/scoring/cost.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/margin_age.hpp"
#include "dropfront/scoring/operations.hpp"
#include "dropfront/scoring/verdict.hpp"

namespace dropfront::scoring {

namespace {

using Evidences = std::vector<std::unique_ptr<Evidence>>;

const char* missing_slot(const Design& design) {
  if (design.arrangement == nullptr || design.arrangement->build == nullptr) return "arrangement";
  if (design.output_stage == nullptr) return "output_stage";
  if (design.arrangement->dropper && design.dropper == nullptr) return "dropper";
  if (design.series_resistor == nullptr) return "series_resistor";
  if (design.clamp == nullptr) return "clamp";
  if (design.reservoir == nullptr) return "reservoir";
  if (design.rectifier == nullptr) return "rectifier";
  if (design.arrangement->thyristor_shunt) {
    if (design.thyristor == nullptr) return "thyristor";
    // Without these two nobody can say at which rail it fires, nor whether it lets go.
    if (!design.thyristor->trigger_current_A) return "trigger_current of the thyristor";
    if (!design.thyristor->holding_current_A) return "holding_current of the thyristor";
  }
  if (design.arrangement->thyristor_shunt && design.gate_resistor == nullptr) return "gate_resistor";
  return nullptr;
}

/// A figure that is not a number is no figure.
void keep_finite(std::optional<double>& figure) {
  if (figure && !std::isfinite(*figure)) figure.reset();
}

void keep_finite(std::vector<Term>& figures) {
  const auto odd = [](const Term& figure) { return !std::isfinite(figure.value); };
  figures.erase(std::remove_if(figures.begin(), figures.end(), odd), figures.end());
}

/// Worst of one rule over all supplies; absent where it applies to none.
std::optional<Check> judge(const CheckRule& rule, const Evidences& evidences) {
  std::optional<Check> worst;
  for (const auto& evidence : evidences) {
    auto check = rule.evaluate(*evidence);
    if (!check) continue;
    check->id = rule.id;
    check->at.supply = evidence->supply().name;
    keep_finite(check->value);
    keep_finite(check->limit);
    keep_finite(check->figures);
    keep_finite(check->at.values);
    worst = worst ? worse(std::move(*worst), std::move(*check)) : std::move(check);
  }
  return worst;
}

std::optional<double> greatest_standby_W(const Evidences& evidences, std::string& where) {
  std::optional<double> greatest;
  for (const auto& evidence : evidences) {
    const auto& point = evidence->standby_worst();
    if (!point.state.usable()) return std::nullopt;
    if (greatest && !(point.state.input_power_W > *greatest)) continue;
    greatest = point.state.input_power_W;
    where = evidence->supply().name;
  }
  keep_finite(greatest);
  return greatest;
}

std::optional<double> least_margin_A(const Evidences& evidences, std::string& where) {
  std::optional<double> least;
  for (const auto& evidence : evidences) {
    const auto& lean = evidence->lean();
    if (!lean.usable) return std::nullopt;
    if (least && !(lean.margin_A < *least)) continue;
    least = lean.margin_A;
    where = evidence->supply().name;
  }
  keep_finite(least);
  return least;
}

std::optional<double> least_margin_new_A(const Evidences& evidences) {
  std::optional<double> least;
  for (const auto& evidence : evidences) {
    const auto margin = evidence->margin_new_A();
    if (!margin) return std::nullopt;
    least = least ? std::min(*least, *margin) : *margin;
  }
  keep_finite(least);
  return least;
}

/// The first year without margin on any supply, and how far it was looked for.
void find_margin_year(const Evidences& evidences, double life_years, Score& score) {
  std::optional<double> first;
  for (const auto& evidence : evidences) {
    const auto age = margin_zero_age(*evidence);
    if (!age.known) return;
    if (age.year) first = first ? std::min(*first, *age.year) : *age.year;
  }
  score.current_margin_zero_year = first;
  score.current_margin_horizon_years = kHorizonLives * life_years;
}

/// Runs the checks of one tier; false: one failed and `stop_at_failure`.
bool run_tier(Tier tier, const Evidences& evidences, bool stop_at_failure,
              std::vector<std::optional<Check>>& found) {
  const auto& table = check_table();
  for (std::size_t i = 0; i < table.size(); ++i) {
    if (table[i].tier != tier) continue;
    found[i] = judge(table[i], evidences);
    if (stop_at_failure && found[i] && found[i]->pass && !*found[i]->pass) return false;
  }
  return true;
}

std::size_t index_of(std::string_view id) {
  const auto& table = check_table();
  const auto rule = std::find_if(table.begin(), table.end(), [id](const CheckRule& r) { return r.id == id; });
  return static_cast<std::size_t>(rule - table.begin());
}

/// Whether charge balance alone rules the margin out, by a twentieth of the load at least: nearer misses are
/// worked out, so that what is reported of them is exact. The check then carries the ceiling.
std::optional<Check> margin_out_of_reach(const Evidences& evidences) {
  for (const auto& evidence : evidences) {
    const double load_A = evidence->loads().heaviest_output_A();
    const double wanted_A = evidence->requirement().limits.current_margin * load_A;
    const double ceiling_A = evidence->margin_ceiling_A();
    if (!(ceiling_A < wanted_A - 0.05 * load_A)) continue;
    At at;
    at.supply = evidence->supply().name;
    at.corner = "lean";
    at.load = evidence->loads().heaviest_name;
    return at_least("supply.margin", ceiling_A, wanted_A, "A", at, "ceiling by charge balance, not solved");
  }
  return std::nullopt;
}

/// The greatest power of a step-down stage costs more than all other checks together: it waits for them.
bool margin_is_dear(const Evidences& evidences) {
  return evidences.front()->design().output_stage->kind == parts::StageKind::step_down;
}

/// Tiers by cost, and the objective that becomes known with each; false when the score stops there.
bool run_stages(Score& score, Depth depth, const Stop& stop, const Evidences& evidences,
                std::vector<std::optional<Check>>& found) {
  const bool stop_at_failure = depth == Depth::compliant;
  const auto stopped = [&] { return stop && stop(score.objectives); };
  if (stopped() || !run_tier(Tier::list, evidences, stop_at_failure, found)) return false;
  if (depth == Depth::cheap) return false;
  if (stop_at_failure) {
    if (auto ruled_out = margin_out_of_reach(evidences)) {
      found[index_of("supply.margin")] = std::move(ruled_out);
      return false;
    }
  }
  score.objectives.standby_loss_W = greatest_standby_W(evidences, score.standby_supply);
  if (!run_tier(Tier::standby, evidences, stop_at_failure, found) || stopped()) return false;
  const auto lean = [&] {
    score.objectives.current_margin_A = least_margin_A(evidences, score.margin_supply);
    return run_tier(Tier::lean, evidences, stop_at_failure, found) && !stopped();
  };
  const auto others = [&] {
    return run_tier(Tier::steady, evidences, stop_at_failure, found) &&
           run_tier(Tier::transient, evidences, stop_at_failure, found);
  };
  const auto events = [&] { return run_tier(Tier::events, evidences, stop_at_failure, found); };
  if (depth == Depth::screen) return lean() && false;
  const bool last = stop_at_failure && margin_is_dear(evidences);
  return (last ? others() && lean() : lean() && others()) && events();
}

}  // namespace

Scorer::Scorer(const Requirement& requirement) : requirement_(&requirement) {
  shapes_.reserve(requirement.supplies.size());
  for (const auto& supply : requirement.supplies) shapes_.push_back(mains_shapes(supply));
}

Score Scorer::score(const Design& design, Depth depth, const Stop& stop) const {
  Score score;
  score.objectives.cost_micro = cost_micro(design, *requirement_);
  score.objectives.board_area_um2 = board_area_um2(design, *requirement_);
  if (const char* slot = missing_slot(design)) {
    score.cautions.push_back(std::string("the design has no ") + slot);
    score.violation = violation_of(score, *requirement_);
    return score;
  }
  Evidences evidences;
  for (std::size_t i = 0; i < requirement_->supplies.size(); ++i) {
    evidences.push_back(
        std::make_unique<Evidence>(design, *requirement_, requirement_->supplies[i], shapes_[i]));
  }
  std::vector<std::optional<Check>> found(check_table().size());
  score.complete = run_stages(score, depth, stop, evidences, found);
  for (auto& check : found) {
    if (check) score.checks.push_back(std::move(*check));
  }
  if (depth == Depth::full && score.complete) {
    score.current_margin_new_A = least_margin_new_A(evidences);
    find_margin_year(evidences, requirement_->surroundings.life_years, score);
    for (const auto& evidence : evidences) score.operations.push_back(operations_of(*evidence));
  }
  score.verdict = verdict_of(score, *requirement_);
  score.violation = violation_of(score, *requirement_);
  for (const auto& evidence : evidences) {
    score.steady_states += evidence->steady_states();
    score.transients += evidence->transients();
  }
  if (depth == Depth::compliant || depth == Depth::full) {
    score.cautions = cautions_of(design, score, *requirement_);
  }
  return score;
}

Score score(const Design& design, const Requirement& requirement, Depth depth) {
  return Scorer(requirement).score(design, depth);
}

}  // namespace dropfront::scoring
