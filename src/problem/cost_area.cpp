#include "dropfront/problem/cost_area.hpp"

#include <algorithm>

#include "dropfront/scoring/board_area.hpp"
#include "dropfront/scoring/cost.hpp"

namespace dropfront::problem {
namespace {

using Step = CostArea::Step;
using Steps = std::vector<Step>;

/// Leaves those that no other undercuts in both.
void keep_lower_steps(Steps& steps) {
  std::sort(steps.begin(), steps.end(), [](const Step& a, const Step& b) {
    return a.cost_micro != b.cost_micro ? a.cost_micro < b.cost_micro : a.area_um2 < b.area_um2;
  });
  std::size_t kept = 0;
  for (const Step& step : steps)
    if (kept == 0 || step.area_um2 < steps[kept - 1].area_um2) steps[kept++] = step;
  steps.resize(kept);
}

/// Draws neighbours together until few enough are left: the cost of the first, the area of the last.
void thin_out(Steps& steps) {
  while (steps.size() > CostArea::kMostSteps) {
    Steps fewer;
    for (std::size_t i = 0; i < steps.size(); i += 2)
      fewer.push_back({steps[i].cost_micro, steps[std::min(i + 1, steps.size() - 1)].area_um2});
    steps = std::move(fewer);
  }
}

}  // namespace

CostArea::CostArea(const Problem& problem, const SlotSpace& slots) {
  const auto at = std::find(slots.ids.begin(), slots.ids.end(), SlotId::arrangement);
  if (at == slots.ids.end() || slots.space.size() < 1) return;
  arrangement_slot_ = static_cast<int>(at - slots.ids.begin());
  for (std::int32_t option = 0; option < slots.space.slots[arrangement_slot_].size; ++option)
    wirings_.push_back(wiring(problem, slots, option));
}

CostArea::Wiring CostArea::wiring(const Problem& problem, const SlotSpace& slots,
                                  std::int32_t arrangement) const {
  search::Choice choice(slots.ids.size(), 0);
  choice[arrangement_slot_] = arrangement;
  const auto sums = [&](Step& step) {
    const scoring::Design design = design_of(problem.offers, slots.ids, choice);
    const auto cost = scoring::cost_micro(design, problem.requirement);
    const auto area = scoring::board_area_um2(design, problem.requirement);
    step = {cost.value_or(0), area.value_or(0)};
    return cost.has_value() && area.has_value();
  };
  Wiring out;
  out.known = sums(out.base);
  for (std::size_t slot = 0; slot < choice.size(); ++slot) {
    std::vector<Part> parts(static_cast<std::size_t>(slots.space.slots[slot].size));
    if (static_cast<int>(slot) == arrangement_slot_) {
      out.parts.push_back(std::move(parts));
      continue;
    }
    for (std::size_t option = 0; option < parts.size(); ++option) {
      choice[slot] = static_cast<std::int32_t>(option);
      parts[option].known = sums(parts[option].adds);
      parts[option].adds.cost_micro -= out.base.cost_micro;
      parts[option].adds.area_um2 -= out.base.area_um2;
    }
    choice[slot] = 0;
    out.parts.push_back(std::move(parts));
  }
  return out;
}

std::vector<CostArea::Step> CostArea::steps(const search::Box& box) const {
  if (arrangement_slot_ < 0) return {};
  const Wiring& wiring = wirings_[box.options[arrangement_slot_].front()];
  if (!wiring.known) return {};
  Steps sums{wiring.base};
  for (std::size_t slot = 0; slot < box.options.size(); ++slot) {
    if (static_cast<int>(slot) == arrangement_slot_) continue;
    Steps adds;
    for (const auto option : box.options[slot]) {
      const Part& part = wiring.parts[slot][option];
      if (!part.known) return {};
      adds.push_back(part.adds);
    }
    keep_lower_steps(adds);
    Steps longer;
    longer.reserve(sums.size() * adds.size());
    for (const Step& sum : sums)
      for (const Step& add : adds)
        longer.push_back({sum.cost_micro + add.cost_micro, sum.area_um2 + add.area_um2});
    if (adds.size() > 1) keep_lower_steps(longer);
    thin_out(longer);
    sums = std::move(longer);
  }
  return sums;
}

}  // namespace dropfront::problem
