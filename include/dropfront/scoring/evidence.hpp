#pragma once
#include <memory>
#include <optional>
#include <string>
#include <vector>

#include "dropfront/scoring/corners/mains_shape.hpp"
#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/lean.hpp"
#include "dropfront/scoring/load_profile.hpp"
#include "dropfront/scoring/operating_point.hpp"
#include "dropfront/scoring/plug_in.hpp"
#include "dropfront/scoring/requirement.hpp"
#include "dropfront/scoring/surge.hpp"

namespace dropfront::scoring {

struct BurstAnswer;      // load_bursts.hpp
struct DipAnswer;        // dips.hpp
struct StabilityAnswer;  // stability.hpp
struct StartUpAnswer;    // start_up.hpp

/// The corners of one design on one supply, each solved once, when first asked for. What a corner holds does
/// not depend on which others were asked for, nor in which order.
/// The design must have arrangement, dropper, series resistor, clamp, reservoir, rectifier and output stage.
class Evidence {
 public:
  Evidence(const Design& design, const Requirement& requirement, const Supply& supply);
  /// With shapes made before (`shapes` must outlive this).
  Evidence(const Design& design, const Requirement& requirement, const Supply& supply,
           const MainsShapes& shapes);
  ~Evidence();
  Evidence(const Evidence&) = delete;
  Evidence& operator=(const Evidence&) = delete;

  const Design& design() const;
  const Requirement& requirement() const;
  const Supply& supply() const;
  const MainsShapes& shapes() const;
  const LoadProfile& loads() const;

  double required_rail_V() const;  ///< V_required
  const LeanAnswer& lean();
  const OperatingPoint& lean_cold();  ///< at the heaviest sustained load, at the ends that decide there
  const OperatingPoint& lean_hot();
  /// Rail current the lean corner delivers with the rail minimum at `rail_V` (least of both ambients, at the
  /// deciding ends), without Iq and leakage taken off. Absent: no answer.
  std::optional<double> lean_current_at_A(double rail_V);
  /// Rail current taken beside the output load: Iq (greatest; in dropout: the greater of the two), leakage,
  /// rail loads with the mean of their bursts.
  double overhead_A(bool in_dropout) const;
  /// The margin with parts of an age in lives (0 new, 1 end of life), else as lean().margin_A. Absent: no
  /// answer. Solved anew at each call but for the ages 0 and 1.
  std::optional<double> margin_at_A(double age);
  std::optional<double> margin_new_A();  ///< at age 0

  /// A margin no lean search can exceed, by charge balance alone (theorem): nothing is solved. Infinite where
  /// the rail the stage needs is not known.
  double margin_ceiling_A();

  const OperatingPoint& nominal();
  const OperatingPoint& rich_empty();       ///< the ambient with the greatest rail (rail_greatest_V)
  const OperatingPoint& rich_empty_hot();   ///< the same load at the high ambient, for powers
  const OperatingPoint& rich_empty_cold();  ///< at the low ambient: more film capacitance, low zeners higher
  const OperatingPoint& rich_loaded();      ///< of rich_loads(), the one with the greatest input power
  /// Rich loaded from no load to the heaviest, in that order: stresses that grow with load are worst at the
  /// last, powers somewhere between. A check takes the worst of these.
  const std::vector<OperatingPoint>& rich_loads();
  const OperatingPoint& standby();
  const OperatingPoint& standby_worst();  ///< production worst: the standby objective
  const PlugInAnswer& plug_in();
  const SurgeAnswer& surge();  ///< only where limits.surge is given
  const std::vector<BurstAnswer>& load_bursts();  ///< one a burst of the load profile
  const DipAnswer& dip();                         ///< the worst of limits.dips, of which there must be one
  /// Given up after twice limits.start_time_s, which must be set.
  const StartUpAnswer& start_up();
  const StabilityAnswer& stability();

  /// Available rail current with the values of `point` (its own V_required at nominal). Absent: no answer.
  std::optional<double> available_A(const OperatingPoint& point);

  int steady_states() const;  ///< solved so far, searches included
  int transients() const;     ///< run so far

 private:
  struct Impl;
  std::unique_ptr<Impl> impl_;
};

}  // namespace dropfront::scoring
