#pragma once
#include <string_view>
#include <vector>

#include "dropfront/scoring/design.hpp"

namespace dropfront::scoring {

/// A figure of one part that production spreads. Parts that a design places several times (a chain, a split
/// resistor, parallel droppers) are taken to come from one lot: equal among themselves.
enum class BuildAxis {
  dropper,          ///< capacitance within its tolerance
  series_resistor,  ///< resistance within its tolerance
  clamp_voltage,    ///< at the test current, voltage_min to voltage_max
  clamp_slope,      ///< slope_min to the data maximum
  reservoir,        ///< capacitance within its tolerance
  esr,              ///< a tenth of the data maximum to the maximum, new and at 20 degC
  discharge,        ///< resistance of an element within its tolerance
  stage_output,     ///< output voltage of a regulating stage within its tolerance
  ceramic,          ///< capacitance within its tolerance
  gate_resistor     ///< resistance within its tolerance
};

std::string_view build_axis_name(BuildAxis axis);  ///< "dropper_F", "clamp_V", ... name and unit

/// The axes on which builds of a design differ: those whose part is there and whose two ends differ.
std::vector<BuildAxis> build_axes(const Design& design);

/// One built piece of a design: own copies of its parts with every figure at one place inside its tolerance
/// and no tolerance left, so that any end of them is that figure. Ageing, temperature laws and ratings stay.
class Build {
 public:
  /// Everything as the data give it: nominal values, the greatest slope and ESR.
  explicit Build(const Design& design);
  Build(const Build&) = delete;
  Build& operator=(const Build&) = delete;

  /// Moves one figure: 0 its least, 1 its greatest value, straight in between. `position` is taken into 0..1.
  void set(BuildAxis axis, double position);
  double value(BuildAxis axis) const;  ///< SI
  /// Points into this object.
  const Design& design() const { return built_; }

 private:
  const Design nominal_;
  Design built_;
  parts::Dropper dropper_;
  parts::Resistor series_resistor_, discharge_, gate_resistor_;
  parts::Clamp clamp_;
  parts::Reservoir reservoir_;
  parts::OutputStage stage_;
  parts::Ceramic ceramic_;
};

}  // namespace dropfront::scoring
