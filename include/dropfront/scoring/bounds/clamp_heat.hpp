#pragma once
#include "dropfront/parts/clamp.hpp"

namespace dropfront::scoring {

/// Above this no local or junction temperature is reckoned (as in the operating points).
inline constexpr double kHottest_degC = 1000;

/// Junctions are settled to this in the operating points: air and junction, half of it each.
inline constexpr double kSettled_K = 0.1;

/// What may warm one clamp part.
struct ClampHeat {
  double coolest_degC = 25;  ///< least temperature of its junction
  double air_degC = 25;      ///< greatest temperature of the air around it
  double mean_A = 0;         ///< greatest mean current through it
  double peak_A = 0;         ///< greatest current through it
  double forward_V = 0;      ///< drop of its forward direction, carrying as much
};

/// Threshold V0 = V·(1 + tempco·(Tj - 25 degC)) - back_ohm·Izt of a clamp, least and greatest over the
/// junction temperatures it can have. The junction warms by Rth·P with P <= (v + forward)·mean and
/// v <= V0(Tj) + slope·peak: linear in v, so v <= (V0(air) + slope·peak + k·forward)/(1 - k),
/// k = V·tempco·Rth·mean. Where k nears 1, or that is hotter than kHottest_degC, that temperature counts.
struct ClampSpan {
  double least_V, greatest_V;
};
ClampSpan clamp_span(const parts::Clamp& part, double voltage_V, double back_ohm, double slope_ohm,
                     const ClampHeat& heat);
/// Of its high curve.
ClampSpan high_clamp_span(const parts::Clamp& part, const ClampHeat& heat);

/// Least threshold of a clamp's high curve that warms itself: its mean power is at least V0·mean_A + other_W,
/// so the junction stands at least Rth times that above `air_degC`, and with the slope of V0 over the
/// junction's temperature, s = Vmax·tempco > 0,
///   V0 >= (V0(air) + s·Rth·other_W)/(1 - s·Rth·mean_A).
/// A tempco that lowers V0 shows nothing here: 0.
double self_heated_V(const parts::Clamp& part, double air_degC, double mean_A, double other_W);

}  // namespace dropfront::scoring
