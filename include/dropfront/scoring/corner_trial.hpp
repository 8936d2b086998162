#pragma once
#include <array>
#include <optional>
#include <vector>

#include "dropfront/scoring/tolerance_box.hpp"

namespace dropfront::scoring {

/// What one build does at the worst conditions of one supply.
using BuildFigures = std::array<std::optional<double>, kBoxQuantities>;  ///< by BoxQuantity

/// Builds of one design tried at the conditions of the corners: margin with the low line at the end of life,
/// rail and powers with the high line and no load, each at the ambient that is worse where the parts stand at
/// their unlucky ends; standby at nominal mains.
class CornerTrial {
 public:
  CornerTrial(const Design& design, const Requirement& requirement, const Supply& supply);
  /// Part axes of a build, in the order of `build_axes`.
  std::size_t parts() const { return margin_.parts(); }
  /// Figures of the build with its parts at these places (0 least, 1 greatest), one a part axis.
  BuildFigures at(const std::vector<double>& parts) const;

 private:
  std::vector<double> placed(const ToleranceBox& box, const std::vector<double>& conditions,
                             const std::vector<double>& parts) const;

  const Design design_;
  const Supply* supply_;
  ToleranceBox margin_, rich_, standby_;
  std::vector<double> margin_corner_, rich_corner_, standby_corner_;
  LeanSolution near_margin_;
};

}  // namespace dropfront::scoring
