#pragma once
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/circuit/faults.hpp"
#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// What one part that still works meets while another has failed.
struct FaultStress {
  std::string part;
  std::string_view quantity;  ///< with its kind: "power", "voltage r.m.s.", "reverse voltage", ...
  double value = 0;
  std::optional<double> rating;  ///< the part's own, without derating; absent: not given
  std::string_view unit;
  bool exceeded() const { return rating && !(value <= *rating); }
};

/// One part open or short, all others as they should be, at the high line, hot, without load.
struct FaultRow {
  std::string part;  ///< slot, with a number where the arrangement has several
  circuit::FaultKind kind = circuit::FaultKind::open;
  std::string reason;  ///< why nothing could be solved; else empty
  double rail_min_V = 0, rail_max_V = 0;
  double input_power_W = 0, input_current_Arms = 0;
  std::vector<FaultStress> stresses;
  /// From the fault until the rail passes the least of reservoir rating and stage input; absent: it does not
  /// within ten seconds.
  std::optional<double> rail_over_s;
  /// Parts known to open by what they meet, the furthest above its opening level first, in words.
  std::vector<std::string> opens;
  bool exceeds() const;
};

/// The table of single faults of a design with all mandatory parts, on the supply with the greatest high
/// line. Ratings are compared as given, without derating: a fault is no running condition. What changes with
/// time (a rail that creeps up) is given where it ends.
std::vector<FaultRow> faults_of(const Design& design, const Requirement& requirement);

}  // namespace dropfront::scoring
