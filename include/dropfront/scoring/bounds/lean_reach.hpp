#pragma once
#include <vector>

#include "dropfront/scoring/bounds/box.hpp"
#include "dropfront/scoring/corners/mains_shape.hpp"
#include "dropfront/scoring/load_profile.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// Whether a margin is out of reach of every member of a box, by steady states of the lean corner at the load
/// that goes with it: where the rail falls short at one ambient and one choice of ends, the least over all
/// ends falls short too. For a step-down stage the load is raised to what the power wants at the rail last
/// solved, until the rail falls short or the load no longer grows (nothing is then said). `requirement` must
/// outlive it; thread-safe.
///
/// The rail is solved for the best of everything it is monotone in (class monotone): greatest dropper and
/// reservoir, greatest low clamp curve, least drop, V_required and overhead, every part at the temperature
/// that suits it, within what the air and the junction can reach. What it is not monotone in is tried: every
/// series resistor, both ends of the list of ESRs and of chains; with more than kMostResistors different
/// series resistors nothing is said.
class LeanReach {
 public:
  static constexpr std::size_t kMostResistors = 6;

  explicit LeanReach(const Requirement& requirement);
  /// True: no member has a worst-case margin of `margin_A` or more.
  bool out_of_reach(const DesignBox& box, double margin_A) const;

 private:
  const Requirement* requirement_;
  LoadProfile loads_;
  std::vector<MainsShapes> shapes_;
};

}  // namespace dropfront::scoring
