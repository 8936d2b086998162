#include "dropfront/problem/confirm.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/problem/box_search.hpp"
#include "dropfront/search/parallel.hpp"

namespace dropfront::problem {
namespace {

using scoring::BoxQuantity;

bool complete(const scoring::Design& design) {
  if (design.arrangement == nullptr) return false;
  if (design.arrangement->dropper && design.dropper == nullptr) return false;
  if (design.arrangement->thyristor_shunt &&
      (design.thyristor == nullptr || design.gate_resistor == nullptr ||
       !design.thyristor->trigger_current_A || !design.thyristor->holding_current_A))
    return false;
  return design.series_resistor != nullptr && design.clamp != nullptr && design.reservoir != nullptr &&
         design.rectifier != nullptr && design.output_stage != nullptr;
}

bool worse(BoxQuantity quantity, double a, double b) {
  return scoring::least_counts(quantity) ? a < b : a > b;
}

BoxFinding find(BoxQuantity quantity, const Problem& problem, const scoring::Design& design,
                const scoring::Supply& supply, int evaluations) {
  BoxFinding finding;
  finding.quantity = quantity;
  finding.supply = supply.name;
  finding.limit = scoring::box_limit(quantity, design, problem.requirement);
  finding.corner = scoring::corner_value(quantity, design, problem.requirement, supply);
  const scoring::ToleranceBox box(design, problem.requirement, supply, quantity);
  const BoxWorst worst = search_box(box, quantity, evaluations, problem.seed);
  finding.inside = worst.value;
  finding.evaluations = worst.evaluations;
  if (worst.value) finding.where = box.where(worst.position);
  if (finding.corner && finding.inside) {
    // A margin is a difference: what it is uncertain by goes with the current it is the rest of.
    const double load_A = scoring::load_profile(problem.requirement.output).heaviest_output_A();
    const double scale = std::abs(*finding.corner) + (quantity == BoxQuantity::margin ? load_A : 0);
    finding.corner_exceeded = worse(quantity, *finding.inside, *finding.corner) &&
                              std::abs(*finding.inside - *finding.corner) > kBoxTolerance * scale;
  }
  const auto value = finding.worst();
  if (value && finding.limit)
    finding.pass = scoring::least_counts(quantity) ? *value >= *finding.limit : *value <= *finding.limit;
  return finding;
}

/// Of one quantity on two supplies, the one that says more against the design.
const BoxFinding& graver(const BoxFinding& a, const BoxFinding& b) {
  if (a.corner_exceeded != b.corner_exceeded) return a.corner_exceeded ? a : b;
  const auto left = a.worst(), right = b.worst();
  if (!left || !right) return left ? b : a;
  return worse(a.quantity, *right, *left) ? b : a;
}

Confirmation confirmed(const Problem& problem, const scoring::Design& design, const ConfirmPlan& plan) {
  Confirmation confirmation;
  if (!complete(design)) return confirmation;
  for (int q = 0; q < scoring::kBoxQuantities; ++q) {
    const auto quantity = static_cast<BoxQuantity>(q);
    const int evaluations =
        quantity == BoxQuantity::margin ? plan.margin_evaluations : plan.other_evaluations;
    std::optional<BoxFinding> gravest;
    for (const auto& supply : problem.requirement.supplies) {
      auto finding = find(quantity, problem, design, supply, evaluations);
      confirmation.evaluations += finding.evaluations;
      gravest = gravest ? graver(*gravest, finding) : std::move(finding);
    }
    confirmation.box.push_back(std::move(*gravest));
  }
  confirmation.costs = scoring::tolerance_costs(design, problem.requirement);
  return confirmation;
}

/// Which designs are sampled, of `order`.
std::vector<int> sampled(const std::vector<scoring::Design>& designs, const std::vector<int>& order,
                         int units) {
  constexpr int kStepDownUnits = 4;
  std::vector<int> chosen;
  for (const int i : order) {
    if (i < 0 || i >= static_cast<int>(designs.size()) || !complete(designs[i])) continue;
    if (std::find(chosen.begin(), chosen.end(), i) != chosen.end()) continue;
    const bool dear = designs[i].output_stage->kind == parts::StageKind::step_down;
    if (units >= 0) {
      if (units < (dear && !chosen.empty() ? kStepDownUnits : 1)) continue;
      units = std::max(0, units - (dear ? kStepDownUnits : 1));
    }
    chosen.push_back(i);
  }
  return chosen;
}

}  // namespace

std::optional<double> BoxFinding::worst() const {
  if (!corner || !inside) return corner ? corner : inside;
  return worse(quantity, *inside, *corner) ? inside : corner;
}

std::optional<double> BoxFinding::headroom() const {
  const auto value = worst();
  if (!value || !limit || *limit == 0) return std::nullopt;
  return scoring::least_counts(quantity) ? *value / *limit - 1 : 1 - *value / *limit;
}

bool Confirmation::corners_hold() const {
  return std::none_of(box.begin(), box.end(), [](const BoxFinding& f) { return f.corner_exceeded; });
}

bool Confirmation::limits_hold() const {
  return std::all_of(box.begin(), box.end(), [](const BoxFinding& f) { return f.pass.value_or(true); });
}

ConfirmPlan confirm_plan(search::Effort effort) {
  switch (effort) {
    case search::Effort::quick:
      return {30, 24, 0};
    case search::Effort::deep:
      return {400, 300, -1};
    case search::Effort::normal:
      break;
  }
  return {};
}

std::vector<std::optional<Confirmation>> confirm(const Problem& problem,
                                                 const std::vector<scoring::Design>& designs,
                                                 const std::vector<int>& sample_order,
                                                 const ConfirmPlan& plan, int threads,
                                                 const std::atomic<bool>* stop) {
  const auto stopped = [&] { return stop != nullptr && stop->load(std::memory_order_relaxed); };
  std::vector<std::optional<Confirmation>> confirmations(designs.size());
  search::Workers workers(threads);
  workers.for_each(designs.size(), 1, [&](std::size_t i) {
    if (!stopped()) confirmations[i] = confirmed(problem, designs[i], plan);
  });
  const std::vector<int> chosen = sampled(designs, sample_order, plan.sample_units);
  std::vector<std::optional<ScrambleTally>> tallies(chosen.size() * kScrambles);
  workers.for_each(tallies.size(), 1, [&](std::size_t i) {
    if (stopped()) return;
    tallies[i] = try_scramble(problem, designs[chosen[i / kScrambles]], static_cast<int>(i % kScrambles));
  });
  for (std::size_t c = 0; c < chosen.size(); ++c) {
    std::vector<ScrambleTally> scrambles;
    for (std::size_t s = 0; s < kScrambles; ++s)
      if (auto& tally = tallies[c * kScrambles + s]) scrambles.push_back(std::move(*tally));
    auto& confirmation = confirmations[chosen[c]];
    if (confirmation && scrambles.size() == kScrambles)
      confirmation->sample = summed(problem, designs[chosen[c]], scrambles);
  }
  return confirmations;
}

}  // namespace dropfront::problem
