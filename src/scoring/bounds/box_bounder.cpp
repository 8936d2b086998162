#include "dropfront/scoring/bounds/box_bounder.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/scoring/bounds/bound_table.hpp"
#include "dropfront/scoring/bounds/replaces.hpp"

namespace dropfront::scoring {

namespace {

/// A share of what is allowed by which a bound must be exceeded: rounding decides nothing.
constexpr double kBroken = 1 + 1e-9;

void broken(BoxBound& bound, std::string_view id, BoundClass known) {
  bound.broken = id;
  bound.broken_class = known;
}

/// Tightens a bound on an objective by one rule on one supply; a limit on that objective is judged at once.
void take_objective(const BoundRule& rule, double value, const BoundContext& context, BoxBound& bound) {
  const auto& limits = context.requirement->limits;
  if (rule.id == "cost") bound.cost_micro = std::llround(value);
  if (rule.id == "board_area") bound.board_area_um2 = std::llround(value);
  if (rule.id == "current_margin") {
    if (!bound.current_margin_A || value < *bound.current_margin_A) {
      bound.current_margin_A = value;
      bound.margin_class = rule.bound_class;
    }
    const double wanted_A = limits.current_margin * context.loads.heaviest_output_A();
    if (value < wanted_A - 1e-12) broken(bound, "supply.margin", rule.bound_class);
  }
  if (rule.id == "standby_loss") {
    if (!bound.standby_loss_W || value > *bound.standby_loss_W) {
      bound.standby_loss_W = value;
      bound.standby_class = rule.bound_class;
    }
    if (limits.standby_power_W && value > *limits.standby_power_W * kBroken) {
      broken(bound, "standby.power", rule.bound_class);
    }
  }
}

/// How much of the limit on an objective its bound leaves used at least; 0: no limit.
double objective_share(const BoundRule& rule, double value, const BoundContext& context) {
  const auto& limits = context.requirement->limits;
  if (rule.id == "standby_loss" && limits.standby_power_W) return value / *limits.standby_power_W;
  if (rule.id != "current_margin") return 0;
  const double load_A = context.loads.heaviest_output_A();
  return value + load_A > 0 ? (1 + limits.current_margin) * load_A / (value + load_A) : 2;
}

bool any_empty(const DesignBox& box) {
  return box.output_stages.empty() || box.droppers.empty() || box.series_resistors.empty() ||
         box.clamps.empty() || box.reservoirs.empty() || box.discharges.empty() || box.rectifiers.empty();
}

double members(const DesignBox& box) {
  double product = 1;
  for (const std::size_t size :
       {box.output_stages.size(), box.droppers.size(), box.series_resistors.size(), box.clamps.size(),
        box.reservoirs.size(), box.discharges.size(), box.rectifiers.size(), box.varistors.size(),
        box.fuses.size(), box.ceramics.size(), box.thyristors.size(), box.gate_resistors.size()}) {
    product *= static_cast<double>(std::max<std::size_t>(1, size));
  }
  return product;
}

}  // namespace

BoxBounder::BoxBounder(const Requirement& requirement) : context_(requirement) {}

BoxBound BoxBounder::bound(const DesignBox& box, int least_depth, int depth) const {
  return ask(box, least_depth, depth, false);
}

BoxBound BoxBounder::outlook(const DesignBox& box) const { return ask(box, 0, 0, true); }

BoxBound BoxBounder::ask(const DesignBox& box, int least_depth, int depth, bool shares) const {
  BoxBound bound;
  if (box.arrangement == nullptr || any_empty(box)) return bound;
  const BoxEnds ends(box, context_);
  std::vector<BoxQuestion> questions;
  questions.reserve(context_.supplies.size());
  for (const auto& supply : context_.supplies) {
    questions.emplace_back(box, ends, context_, supply).verdict_only = !shares;
  }
  for (const auto& rule : bound_table()) {
    if (rule.depth < least_depth || rule.depth > depth) continue;
    for (const auto& question : questions) {
      if (rule.objective != nullptr) {
        const auto value = rule.objective(question);
        if (!value || !std::isfinite(*value)) continue;
        take_objective(rule, *value, context_, bound);
        if (shares) bound.shares.push_back(objective_share(rule, *value, context_));
      } else {
        const double share = rule.limit(question);
        if (shares) bound.shares.push_back(share);
        if (share > kBroken) broken(bound, rule.id, rule.bound_class);
      }
      if (!bound.broken.empty()) return bound;
    }
  }
  return bound;
}

double BoxBounder::reduce(DesignBox& box) const {
  if (box.arrangement == nullptr || any_empty(box)) return 0;
  const double before = members(box);
  if (drop_replaced(box, context_) == 0) return 0;
  return before - members(box);
}

}  // namespace dropfront::scoring
