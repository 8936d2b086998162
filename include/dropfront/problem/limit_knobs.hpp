#pragma once
#include <optional>
#include <string_view>
#include <vector>

#include "dropfront/scoring/check.hpp"
#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::problem {

/// A limit that the problem sets (ratings and what parts are stay as they are), and how it is widened.
struct LimitKnob {
  std::string_view key;                  ///< as in the problem file: "limits.standby_power"
  std::string_view unit;                 ///< of asked() and needed(); empty: a share
  bool at_most = true;                   ///< relaxing raises the value; else it lowers it
  std::vector<std::string_view> checks;  ///< that it sets
  /// The value asked for; absent: the problem sets no such limit.
  std::optional<double> (*asked)(const scoring::Requirement&) = nullptr;
  /// Makes it so wide that nothing breaks it, its checks still worked out where they can be.
  void (*widen)(scoring::Requirement&) = nullptr;
  /// The value at which one of its checks, made with the limit widened, would just hold. Null: the limit has
  /// no value of its own and can only be dropped.
  double (*needed)(const scoring::Check&, const scoring::Design&, const scoring::Requirement& wide) = nullptr;
};

/// All knobs, in the order of the problem file.
const std::vector<LimitKnob>& limit_knobs();

/// Least relaxed value of a knob at which a design complies as far as the knob goes, by a score made with it
/// widened. Absent: nothing to relax (no check of it applies), or it can only be dropped.
std::optional<double> needed_value(const LimitKnob& knob, const std::vector<scoring::Check>& checks,
                                   const scoring::Design& design, const scoring::Requirement& wide);

/// Whether `value` keeps to what is asked.
bool keeps(const LimitKnob& knob, double value, double asked);

}  // namespace dropfront::problem
