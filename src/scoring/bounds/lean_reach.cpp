#include "dropfront/scoring/bounds/lean_reach.hpp"

#include <algorithm>
#include <cmath>
#include <optional>

#include "dropfront/scoring/bounds/box_ends.hpp"
#include "dropfront/scoring/bounds/lean_composite.hpp"
#include "dropfront/scoring/stage_law.hpp"

namespace dropfront::scoring {

namespace {

/// By this much the rail must fall short: the tolerances of the searches, the temperature of an ESR and a
/// dropper's loss are of the order of millivolts.
constexpr double kShort_V = 0.02;
constexpr int kMostLoads = 10;
constexpr circuit::SteadyOptions kRailOnly{.powers = false, .multipliers = false};

/// What the best of the output stages asks of the rail.
struct Need {
  double required_V = INFINITY;
  double beside_A = INFINITY;        ///< overhead
  double output_A = 0;               ///< linear and direct: rail current over it
  std::optional<double> stepping_W;  ///< step-down: power of the rail over it
};

std::optional<Need> need_of(const DesignBox& box, const Requirement& requirement, const LoadProfile& loads,
                            double margin_A) {
  Need need;
  need.output_A = loads.heaviest_output_A() + margin_A;
  double leakage_A = INFINITY;
  for (const auto* can : box.reservoirs) leakage_A = std::min(leakage_A, can->leakage_A);
  for (const auto* stage : box.output_stages) {
    const auto own_V = required_rail_V(*stage, requirement.output, loads);
    if (!own_V) return std::nullopt;
    need.required_V = std::min(need.required_V, *own_V);
    need.beside_A = std::min(need.beside_A, quiescent_A(*stage, Quiescent::data));
    if (stage->kind != parts::StageKind::step_down) continue;
    const double efficiency = stage->efficiency.value_or(0);
    if (!(efficiency > 0)) return std::nullopt;
    const double power_W = stage_output_V(*stage, End::high) * need.output_A / efficiency;
    need.stepping_W = std::min(need.stepping_W.value_or(INFINITY), power_W);
  }
  need.beside_A += leakage_A + loads.heaviest_rail_A();
  return need;
}

/// Whether the rail falls short of the need at these values.
bool falls_short(const circuit::Arrangement& wiring, circuit::ElementValues values, const Need& need) {
  double highest_V = rail_ceiling_V(values);
  for (int k = 0; k < kMostLoads; ++k) {
    const double over_A = need.stepping_W ? *need.stepping_W / highest_V : need.output_A;
    // No load up to the last one leaves a rail at which the power is there.
    if (k > 0 && !(need.beside_A + over_A > 1.0005 * values.rail_current_A)) return false;
    values.rail_current_A = need.beside_A + over_A;
    const auto state = circuit::solve_steady_state(wiring.build(values), kRailOnly);
    if (!state.usable()) return false;
    if (state.rail_min_V < need.required_V - kShort_V) return true;
    if (!need.stepping_W) return false;
    highest_V = std::min(highest_V, state.rail_min_V + kShort_V);
  }
  return false;
}

}  // namespace

LeanReach::LeanReach(const Requirement& requirement)
    : requirement_(&requirement), loads_(load_profile(requirement.output)) {
  for (const auto& supply : requirement.supplies) shapes_.push_back(mains_shapes(supply));
}

bool LeanReach::out_of_reach(const DesignBox& box, double margin_A) const {
  if (box.arrangement == nullptr || !plain_clamped(*box.arrangement)) return false;
  const auto need = need_of(box, *requirement_, loads_, margin_A);
  if (!need || !(need->output_A > 0)) return false;
  const auto out = [&](const MainsShapes& shapes) {
    const LeanComposite composite(box, *requirement_, shapes, need->required_V, need->stepping_W.has_value());
    if (composite.series_resistors().size() > kMostResistors) return false;
    for (const auto* resistor : composite.series_resistors())
      for (const bool high_esr : composite.esr_ends())
        for (const bool high_chain : composite.chain_ends()) {
          bool short_somewhere = false;
          for (const bool hot : composite.ambients()) {
            const auto values = composite.values(*resistor, high_esr, high_chain, hot);
            short_somewhere = falls_short(*box.arrangement, values, *need);
            if (short_somewhere) break;
          }
          if (!short_somewhere) return false;
        }
    return true;
  };
  return LeanComposite::possible(box) && std::any_of(shapes_.begin(), shapes_.end(), out);
}

}  // namespace dropfront::scoring
