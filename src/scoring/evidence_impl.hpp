// What an Evidence holds, shared by its source files.
#pragma once
#include <algorithm>
#include <array>
#include <memory>
#include <optional>
#include <utility>
#include <vector>

#include "dropfront/scoring/dips.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "dropfront/scoring/lean_search.hpp"
#include "dropfront/scoring/load_bursts.hpp"
#include "dropfront/scoring/point_solver.hpp"
#include "dropfront/scoring/recipes.hpp"
#include "dropfront/scoring/stability.hpp"
#include "dropfront/scoring/start_up.hpp"

namespace dropfront::scoring {

struct Evidence::Impl {
  Impl(const Design& d, const Requirement& r, const Supply& s, const MainsShapes* m)
      : own_shapes(m == nullptr ? std::make_unique<MainsShapes>(mains_shapes(s)) : nullptr),
        design(d),
        requirement(&r),
        supply(&s),
        shapes(m == nullptr ? own_shapes.get() : m),
        loads(load_profile(r.output)),
        required(scoring::required_rail_V(*d.output_stage, r.output, loads)),
        points(design, r, required.value_or(0)),
        lean_search(points, shapes->lean, overhead_A(Quiescent::data), 1) {}

  double overhead_A(Quiescent quiescent) const {
    return quiescent_A(*design.output_stage, quiescent) + design.reservoir->leakage_A +
           loads.heaviest_rail_A();
  }

  /// Loads of the corners. Rich corners take nothing that may be missing: no leakage, least Iq.
  LoadCase heaviest(bool at_trough, End output) const {
    return {loads.heaviest_name,
            loads.heaviest_output_A(),
            design.reservoir->leakage_A + loads.heaviest_rail_A(),
            Quiescent::data,
            at_trough,
            output};
  }
  LoadCase asleep(End output) const {
    return {loads.standby_name, loads.standby_A, design.reservoir->leakage_A + loads.rail_A,
            Quiescent::data,    false,           output};
  }
  /// A zener takes what the load leaves, at a voltage no lower: least input power comes with most load. A
  /// shunt takes it at about a volt, and input rises with load.
  LoadCase worst_asleep() const { return asleep(design.arrangement->thyristor_shunt ? End::high : End::low); }
  /// An unloaded rail still feeds the reservoir's own leakage, at least a tenth of the data maximum: without
  /// it a reservoir behind a diode would keep any charge, and the rail would have no steady state of its own.
  LoadCase rich_share(double share, const char* name) const {
    const double leakage_A = std::max(1e-7, 0.1 * design.reservoir->leakage_A);
    return {name, share * loads.heaviest_output_A(),
            leakage_A + loads.rail_A + share * loads.burst_mean_rail_A, Quiescent::least, false};
  }

  double ambient_degC(bool hot) const {
    const auto& ambient = requirement->surroundings.ambient_degC;
    return hot ? ambient.high : ambient.low;
  }
  bool bled() const { return design.discharge != nullptr && design.discharge_count > 0; }
  bool one_ambient() const { return ambient_degC(false) == ambient_degC(true); }

  const OperatingPoint& lean_point(bool hot) {
    auto& point = lean_points[hot ? 1 : 0];
    if (point) return *point;
    const auto& found = lean_search.at(hot);
    point = points.solve(hot ? "lean_hot" : "lean_cold", lean_search.solver().recipe(found.where.ends),
                         heaviest(true, End::high), ambient_degC(hot));
    point->ends = ends_text(found.where.ends, bled());
    return *point;
  }

  const OperatingPoint& rest(bool hot) {
    auto& point = rests[hot ? 1 : 0];
    if (point) return *point;
    if (!hot && one_ambient()) {
      point = rest(true);
    } else {
      point = points.solve("rich_empty", rich_recipe(*shapes), rich_share(0, "none"), ambient_degC(hot));
      point->ends = rich_ends(bled());
    }
    return *point;
  }

  /// The unloaded high line at both ambients, hot first; one where they are the same.
  std::vector<const OperatingPoint*> all_at_rest() {
    std::vector<const OperatingPoint*> all{&rest(true)};
    if (!one_ambient()) all.push_back(&rest(false));
    return all;
  }

  std::unique_ptr<MainsShapes> own_shapes;
  Design design;
  const Requirement* requirement;
  const Supply* supply;
  const MainsShapes* shapes;
  LoadProfile loads;
  std::optional<double> required;
  PointSolver points;
  LeanSearch lean_search;
  std::optional<LeanAnswer> lean;
  std::array<std::optional<OperatingPoint>, 2> lean_points, rests;
  std::optional<OperatingPoint> nominal, standby, standby_worst;
  std::vector<OperatingPoint> rich_loads;
  std::optional<PlugInAnswer> plug_in;
  std::optional<SurgeAnswer> surge;
  /// Runs from the lean corner; see evidence_events.cpp.
  struct Events {
    std::vector<OperatingPoint> heaviest;
    std::optional<LeanRuns> runs;
    std::optional<std::vector<BurstAnswer>> bursts;
    std::optional<DipAnswer> dip;
    std::optional<StartUpAnswer> start_up;
    std::optional<StabilityAnswer> stability;
  } events;
  const LeanRuns& lean_runs();
  std::optional<std::optional<double>> margin_new;
  int transients = 0;
};

}  // namespace dropfront::scoring
