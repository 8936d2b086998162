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
constexpr double kGrowth = 1.002;  // of a load that is worth another state
constexpr int kRailPasses = 3;     // of what the load and the clamp's warmth say of each other
constexpr double kCooler_K = 1.0;  // by which another pass is worth its time
constexpr double kNear_V = 1.5;    // what other ends can make of a rail
constexpr circuit::SteadyOptions kRailOnly{.powers = false, .multipliers = false};
constexpr circuit::SteadyOptions kWithPowers{.multipliers = false};

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

using Case = LeanComposite::Case;

double load_A(const Need& need, double highest_V) {
  return need.beside_A + (need.stepping_W ? *need.stepping_W / highest_V : need.output_A);
}

/// No rail minimum of a member that meets the need is above this. A clamp across the rail carries at all
/// times what the minimum leaves on its slope, and in the mean no more than the load spares.
double highest_rail_V(const circuit::Arrangement& wiring, const LeanComposite::Lean& lean) {
  const double ceiling_V = rail_ceiling_V(lean.values);
  const auto& curve = lean.values.clamp.main;
  return wiring.clamp_ahead ? ceiling_V
                            : std::min(ceiling_V, curve.threshold_V + curve.slope_ohm * lean.spare_A);
}

/// Whether the rail falls short of the need in one case. `near`: it does not, but by so little that other
/// ends may tell; of a step-down stage they hardly ever do.
bool falls_short(const circuit::Arrangement& wiring, const LeanComposite& composite, const Case& at,
                 const Need& need, bool& near) {
  Rises most{INFINITY, INFINITY};
  double highest_V = highest_rail_V(wiring, composite.lean(at, 0, most));
  for (int k = 0; k < kRailPasses; ++k) {
    const auto lean = composite.lean(at, load_A(need, highest_V), most);
    highest_V = std::min(highest_V, highest_rail_V(wiring, lean));
  }
  double drawn_A = 0;
  bool known = false;
  circuit::StateVector start{};
  bool cooler = false;  // than the last state was taken to be
  for (int k = 0; k < kMostLoads; ++k) {
    const double next_A = load_A(need, highest_V);
    // No load up to the last one leaves a rail at which the power is there.
    if (k > 0 && !cooler && !(next_A > kGrowth * drawn_A)) break;
    drawn_A = next_A;
    auto values = composite.lean(at, drawn_A, most).values;
    values.rail_current_A = drawn_A;
    const auto network = wiring.build(values);
    auto state = circuit::solve_steady_state(network, kRailOnly, known ? &start : nullptr);
    if (!state.usable()) return false;
    start = state.start;
    known = true;
    if (state.rail_min_V < need.required_V - kShort_V) return true;
    near = !need.stepping_W && state.rail_min_V < need.required_V + kNear_V;
    if (!need.stepping_W && !near) return false;
    state = circuit::solve_steady_state(network, kWithPowers, &start);
    if (!state.usable()) return false;
    const Rises now = composite.rises(values, state);
    cooler = now.local_K < most.local_K - kCooler_K || now.junction_K < most.junction_K - kCooler_K;
    most = {std::min(most.local_K, now.local_K), std::min(most.junction_K, now.junction_K)};
    if (need.stepping_W) highest_V = std::min(highest_V, state.rail_min_V + kShort_V);
  }
  return false;
}

/// Whether it falls short at one ambient and one choice of ends: the least over all of them then does. Tried
/// is what decides most often: saturated Rs high and ESR low, in the knee, where the cold decides, the
/// opposite. A step-down stage always works in the knee.
bool falls_short_somewhere(const circuit::Arrangement& wiring, const LeanComposite& composite, Case at,
                           const Need& need) {
  constexpr LeanEnds kSaturated{End::high, End::low, End::low};
  constexpr LeanEnds kKnee{End::low, End::high, End::low};
  bool near = true;
  if (need.stepping_W) {
    at.ends = kKnee;
    return falls_short(wiring, composite, at, need, near);
  }
  for (const bool hot : composite.ambients()) {
    at.hot = hot;
    at.ends = kSaturated;
    near = true;
    if (falls_short(wiring, composite, at, need, near)) return true;
    at.ends = kKnee;
    if (near && !hot && falls_short(wiring, composite, at, need, near)) return true;
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
          const Case at{resistor, high_esr, high_chain, false, {}};
          if (!falls_short_somewhere(*box.arrangement, composite, at, *need)) return false;
        }
    return true;
  };
  return LeanComposite::possible(box) && std::any_of(shapes_.begin(), shapes_.end(), out);
}

}  // namespace dropfront::scoring
