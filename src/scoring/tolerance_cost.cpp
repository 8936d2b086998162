#include "dropfront/scoring/tolerance_cost.hpp"

#include <algorithm>

#include "dropfront/scoring/evidence.hpp"

namespace dropfront::scoring {

namespace {

std::optional<double> margin_A(const Design& design, const Requirement& requirement) {
  std::optional<double> least;
  for (const Supply& supply : requirement.supplies) {
    Evidence evidence(design, requirement, supply);
    const LeanAnswer& lean = evidence.lean();
    if (!lean.usable) return std::nullopt;
    least = least ? std::min(*least, lean.margin_A) : lean.margin_A;
  }
  return least;
}

}  // namespace

std::vector<ToleranceCost> tolerance_costs(const Design& design, const Requirement& requirement) {
  std::vector<ToleranceCost> costs;
  const auto as_is = margin_A(design, requirement);
  if (!as_is) return costs;
  const auto add = [&](std::string_view slot, std::string_view what, const Design& other) {
    if (const auto margin = margin_A(other, requirement)) costs.push_back({slot, what, *margin - *as_is});
  };
  /// `change` alters a copy of the part and says whether that changed anything.
  const auto with = [&](std::string_view slot, std::string_view what, auto Design::*member, auto change) {
    if (design.*member == nullptr) return;
    auto part = *(design.*member);
    if (!change(part)) return;
    Design other = design;
    other.*member = &part;
    add(slot, what, other);
  };
  const auto exact = [](auto& part) {
    const bool spread = part.tolerance > 0;
    part.tolerance = 0;
    return spread;
  };
  with("dropper", "tolerance", &Design::dropper, exact);
  with("dropper", "ageing", &Design::dropper, [](parts::Dropper& part) {
    const bool ages = part.end_of_life_loss > 0;
    part.end_of_life_loss = 0;
    return ages;
  });
  with("series_resistor", "tolerance", &Design::series_resistor, exact);
  with("clamp", "tolerance", &Design::clamp, [](parts::Clamp& part) {
    const bool spread = part.voltage_min_V < part.voltage_max_V;
    part.voltage_min_V = part.voltage_max_V = part.voltage_V;
    part.tolerance = 0;
    return spread;
  });
  with("reservoir", "tolerance", &Design::reservoir, exact);
  with("reservoir", "ageing", &Design::reservoir, [](parts::Reservoir& part) {
    const bool ages = part.end_of_life_loss > 0 || part.end_of_life_esr > 1;
    part.end_of_life_loss = 0;
    part.end_of_life_esr = 1;
    return ages;
  });
  if (design.discharge_count > 0) with("discharge", "tolerance", &Design::discharge, exact);
  if (design.output_stage->kind != parts::StageKind::direct)
    with("output_stage", "tolerance", &Design::output_stage, exact);
  return costs;
}

}  // namespace dropfront::scoring
