#include "dropfront/scoring/bounds/lean_reach.hpp"

#include <algorithm>
#include <cmath>
#include <tuple>

#include "dropfront/scoring/bounds/box_ends.hpp"
#include "dropfront/scoring/clamp_power.hpp"
#include "dropfront/scoring/lean_case.hpp"

namespace dropfront::scoring {

namespace {

/// By this much the rail must fall short: the tolerances of the searches, the ESR's own temperature and the
/// dropper's loss are of the order of millivolts.
constexpr double kShort_V = 0.02;
/// Rises are known from closed forms; they are taken so much greater.
constexpr double kRiseShare = 1.25;
constexpr int kMostLoads = 5;
constexpr circuit::SteadyOptions kRailOnly{.powers = false, .multipliers = false};

/// Entries that differ in their values, by their first representatives.
template <class Entry, class Values>
std::vector<Entry> different(const std::vector<Entry>& list, const Values& values) {
  std::vector<Entry> out;
  std::vector<decltype(values(list.front()))> seen;
  for (const auto& entry : list) {
    const auto here = values(entry);
    if (std::find(seen.begin(), seen.end(), here) != seen.end()) continue;
    seen.push_back(here);
    out.push_back(entry);
  }
  return out;
}

std::vector<const parts::Resistor*> different(const std::vector<const parts::Resistor*>& list) {
  return different(list, [](const auto* r) { return std::tuple(r->resistance_ohm, r->tolerance); });
}
std::vector<Chain> different(const std::vector<Chain>& list) {
  return different(list, [](const Chain& c) {
    return c.element == nullptr ? std::tuple(0, 0.0, 0.0)
                                : std::tuple(c.count, c.element->resistance_ohm, c.element->tolerance);
  });
}
std::vector<const parts::Rectifier*> different(const std::vector<const parts::Rectifier*>& list) {
  return different(list,
                   [](const auto* r) { return std::tuple(r->threshold_voltage_V, r->slope_resistance_ohm); });
}
std::vector<const parts::Reservoir*> different(const std::vector<const parts::Reservoir*>& list) {
  return different(list, [](const auto* r) {
    return std::tuple(r->capacitance_F, r->tolerance, r->esr_ohm, r->esr_cold_ohm, r->rated_voltage_V <= 16,
                      r->leakage_A, r->end_of_life_loss, r->end_of_life_esr);
  });
}

template <class Part>
bool any_missing(const std::vector<const Part*>& list) {
  return list.empty() || std::find(list.begin(), list.end(), nullptr) != list.end();
}

/// Span of temperatures a part can have.
struct Span {
  double cool_degC, warm_degC;
};

double greatest_F(const std::vector<const parts::Dropper*>& droppers, const Span& air,
                  const parts::Dropper*& which) {
  double most_F = 0;
  for (const auto* part : droppers) {
    const double here_F = std::max(dropper_F(*part, End::low, true, air.cool_degC),
                                   dropper_F(*part, End::low, true, air.warm_degC));
    if (!(here_F > most_F)) continue;
    most_F = here_F;
    which = part;
  }
  return most_F;
}

/// One clamp's curve, or a curve above those of several.
circuit::ClampCurve greatest_low_curve(const std::vector<const parts::Clamp*>& clamps, const Span& junction) {
  circuit::ClampCurve best;
  best.main.threshold_V = 0;
  best.main.slope_ohm = 0;
  for (const auto* part : clamps) {
    const auto cool = zener_curve(*part, ZenerCurve::low, junction.cool_degC);
    const auto warm = zener_curve(*part, ZenerCurve::low, junction.warm_degC);
    const auto& higher = warm.main.threshold_V > cool.main.threshold_V ? warm : cool;
    if (clamps.size() == 1) return higher;
    best.main.threshold_V = std::max(best.main.threshold_V, higher.main.threshold_V);
    best.main.slope_ohm = std::max(best.main.slope_ohm, higher.main.slope_ohm);
  }
  return best;  // without a knee branch: it only takes current
}

}  // namespace

struct LeanReach::Parts {
  const parts::Resistor* series_resistor;
  Chain discharge;
  const parts::Rectifier* rectifier;
  const parts::Reservoir* reservoir;
};

LeanReach::LeanReach(const Requirement& requirement)
    : requirement_(&requirement), loads_(load_profile(requirement.output)) {
  for (const auto& supply : requirement.supplies) shapes_.push_back(mains_shapes(supply));
}

bool LeanReach::falls_short(const DesignBox& box, const Parts& parts, const MainsShapes& shapes,
                            double margin_A) const {
  const auto& stages = box.output_stages;
  double required_V = INFINITY, quiescent = INFINITY, power_W = INFINITY;
  const double output_A = loads_.heaviest_output_A() + margin_A;
  for (const auto* stage : stages) {
    const auto own_V = required_rail_V(*stage, requirement_->output, loads_);
    if (!own_V) return false;
    required_V = std::min(required_V, *own_V);
    quiescent = std::min(quiescent, quiescent_A(*stage, Quiescent::data));
    if (stage->kind == parts::StageKind::step_down) {
      if (!(stage->efficiency.value_or(0) > 0)) return false;
      power_W = std::min(power_W, stage->output_voltage_V * output_A / *stage->efficiency);
    }
  }
  const bool stepping = stages.front()->kind == parts::StageKind::step_down;
  const double beside_A = quiescent + parts.reservoir->leakage_A + loads_.heaviest_rail_A();
  if (!(output_A > 0)) return false;

  Design design;
  design.arrangement = box.arrangement;
  design.series_resistor = parts.series_resistor;
  design.discharge = parts.discharge.element;
  design.discharge_count = parts.discharge.count;
  design.rectifier = parts.rectifier;
  design.reservoir = parts.reservoir;
  design.clamp = box.clamps.front();
  design.output_stage = stages.front();
  const auto& ambient = requirement_->surroundings.ambient_degC;
  for (const bool hot : {true, false}) {
    const double ambient_degC = hot ? ambient.high : ambient.low;
    if (!hot && ambient.low == ambient.high) break;
    design.dropper = box.droppers.front();
    greatest_F(box.droppers, {ambient_degC, ambient_degC}, design.dropper);
    PointSolver points(design, *requirement_, required_V);
    const LeanCaseSolver cases(points, shapes.lean, beside_A, true);
    // Where most is left, the ends that decide most often; cold, in the knee, the others.
    const LeanEnds ends =
        hot && !stepping ? LeanEnds{End::high, End::low, End::low} : LeanEnds{End::low, End::high, End::low};
    const Recipe recipe = cases.recipe(ends);
    circuit::ElementValues values = points.values(recipe, {}, ambient_degC);
    values.clamp = greatest_low_curve(box.clamps, {ambient_degC, ambient_degC});
    const Rises rises = points.estimated_rises(values, 0);
    const Span air{ambient_degC, ambient_degC + kRiseShare * rises.local_K};
    double thermal_K_per_W = 0, power_share = 0;
    for (const auto* clamp : box.clamps)
      thermal_K_per_W = std::max(thermal_K_per_W, clamp->thermal_resistance_K_per_W);
    if (design.clamp->thermal_resistance_K_per_W > 0)
      power_share = rises.junction_K / design.clamp->thermal_resistance_K_per_W;
    const Span junction{ambient_degC, air.warm_degC + kRiseShare * thermal_K_per_W * power_share};
    values.dropper_F = greatest_F(box.droppers, air, design.dropper);
    values.rectifier = rectifier_curve(*parts.rectifier, Drops::greatest, air.warm_degC);
    values.clamp = greatest_low_curve(box.clamps, junction);
    values.reservoir_F = std::max(reservoir_least_F(*parts.reservoir, true, air.cool_degC),
                                  reservoir_least_F(*parts.reservoir, true, air.warm_degC));
    values.rail_current_A = beside_A + (stepping ? 0 : output_A);
    for (int k = 0; k < kMostLoads; ++k) {
      const auto state = circuit::solve_steady_state(box.arrangement->build(values), kRailOnly);
      if (!state.usable()) break;
      if (state.rail_min_V < required_V - kShort_V) return true;
      if (!stepping) break;
      // No load up to this one can draw the power at a rail above this one.
      const double next_A = beside_A + power_W / (state.rail_min_V + kShort_V);
      if (!(next_A > 1.001 * values.rail_current_A)) break;
      values.rail_current_A = next_A;
    }
  }
  return false;
}

bool LeanReach::out_of_reach(const DesignBox& box, double margin_A) const {
  if (box.arrangement == nullptr || !plain_clamped(*box.arrangement)) return false;
  if (any_missing(box.output_stages) || any_missing(box.droppers) || any_missing(box.series_resistors) ||
      any_missing(box.clamps) || any_missing(box.reservoirs) || any_missing(box.rectifiers) ||
      box.discharges.empty())
    return false;
  const auto resistors = different(box.series_resistors);
  const auto chains = different(box.discharges);
  const auto rectifiers = different(box.rectifiers);
  const auto reservoirs = different(box.reservoirs);
  if (resistors.size() * chains.size() * rectifiers.size() * reservoirs.size() > kMostTries) return false;
  for (const auto* resistor : resistors)
    for (const auto& chain : chains)
      for (const auto* rectifier : rectifiers)
        for (const auto* reservoir : reservoirs) {
          const Parts parts{resistor, chain, rectifier, reservoir};
          const bool one_fails = std::any_of(shapes_.begin(), shapes_.end(), [&](const MainsShapes& shapes) {
            return falls_short(box, parts, shapes, margin_A);
          });
          if (!one_fails) return false;
        }
  return true;
}

}  // namespace dropfront::scoring
