#pragma once
#include <optional>
#include <string_view>
#include <vector>

#include "dropfront/scoring/build.hpp"
#include "dropfront/scoring/check.hpp"
#include "dropfront/scoring/lean_case.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::scoring {

/// What is looked for inside the tolerances.
enum class BoxQuantity {
  margin,          ///< A at the output (supply.margin): the least counts
  rail,            ///< V, greatest rail (rail.max)
  standby,         ///< W at nominal mains, new parts, 23 degC (standby.power)
  clamp_power,     ///< W in one clamp part (clamp.power)
  resistor_power,  ///< W in one series resistor, over the ambient line: what it would be at 70 degC
  input_power      ///< W from the line; no limit of its own
};
inline constexpr int kBoxQuantities = 6;

std::string_view box_quantity_name(BoxQuantity quantity);  ///< the check's id; input.power
std::string_view box_quantity_unit(BoxQuantity quantity);
inline bool least_counts(BoxQuantity quantity) { return quantity == BoxQuantity::margin; }

/// The limit it is held to; absent: no limit, or a rating is not given.
std::optional<double> box_limit(BoxQuantity quantity, const Design& design, const Requirement& requirement);

/// The value the corners say is the worst on one supply. Absent: no answer.
std::optional<double> corner_value(BoxQuantity quantity, const Design& design, const Requirement& requirement,
                                   const Supply& supply);

/// All that one quantity of one design may meet on one supply, as a unit cube: the figures of its parts
/// inside their tolerances (build.hpp) and, but for standby, the line's voltage, frequency and the phase of
/// its harmonics, the ambient, the load (but for the margin) and the parts' age. Points of the cube are
/// physical ones; the corners' envelope curves of a zener, for one, lie outside it on the unlucky side. The
/// design must be complete (see Evidence). Everything is total and depends on its arguments only.
class ToleranceBox {
 public:
  ToleranceBox(const Design& design, const Requirement& requirement, const Supply& supply,
               BoxQuantity quantity);

  struct Axis {
    std::string_view name;  ///< with its unit: "dropper_F", "line_voltage_Vrms", "ambient_degC", ...
    std::optional<BuildAxis> part;
    double low = 0, high = 0;  ///< of a condition
    double corner = 0;         ///< 0 or 1: the end the corner takes, or the first of two it tries
  };
  /// Parts first; only axes with two different ends.
  const std::vector<Axis>& axes() const { return axes_; }
  std::size_t parts() const { return parts_; }  ///< how many of them are parts
  /// The vertex that stands for the corner.
  std::vector<double> corner() const;

  /// The quantity at a point of the cube. Absent: no steady state. `position` has one entry an axis.
  /// `near`: the answer at some point of this box to start from, or null: it saves time, and changes an
  /// answer by no more than the solver's tolerance.
  std::optional<double> at(const std::vector<double>& position, const LeanSolution* near = nullptr) const;
  /// The steady state behind it, at a point; for the margin one that is not usable.
  OperatingPoint point_at(const std::vector<double>& position) const;
  /// The whole lean solution at a point, for `near`; not usable for other quantities than the margin.
  LeanSolution lean_at(const std::vector<double>& position) const;
  /// The values of a point by axis name, SI.
  std::vector<Term> where(const std::vector<double>& position) const;

 private:
  struct Conditions {
    double voltage_Vrms, frequency_Hz;
    std::vector<double> turns;
    double ambient_degC, load_share, age;
  };
  void add_conditions();
  void set(const std::vector<double>& position, Build& build, Conditions& conditions) const;
  circuit::Waveform mains(const Conditions& conditions) const;
  std::optional<double> margin_A(const Build& build, const Conditions& conditions, const LeanSolution* near,
                                 LeanSolution* whole) const;
  OperatingPoint steady(const Build& build, const Conditions& conditions) const;

  const Design design_;
  const Requirement* requirement_;
  const Supply* supply_;
  BoxQuantity quantity_;
  std::vector<circuit::Harmonic> harmonics_;
  Conditions corner_{};
  circuit::Waveform corner_mains_;  ///< the search for a crest is not free
  std::vector<Axis> axes_;
  std::size_t parts_ = 0;
};

}  // namespace dropfront::scoring
