#pragma once
#include <array>

#include "dropfront/scoring/bounds/box_question.hpp"

namespace dropfront::scoring {

/// Greatest mean current that can reach the rail while its minimum is at `rail_V`, drops `drop_V` a diode.
/// Between the end of one reverse stroke and the end of the forward one after it the film's voltage rises at
/// most from v⁻ to v⁺ less what stands behind it at both moments (half-wave: rail + drop and one drop;
/// bridge: rail + 2 drops at both), and what crosses the line in that time is C times that rise plus the
/// chain's share, the integral of v/Rb: with it the rise is that of C·v + ∫v/Rb, whose tones are
/// A_k·√(C² + 1/(Rb·k·w)²). So
///   half-wave I <= f·[C·(S - V - 2·Vd) + chain],  bridge I <= 2f·[C·(S - 2V - 4·Vd) + chain],
///   chain = 2·A1·(√(C² + g²) - C) + g·sum 2k·A_k·(k + 1/k) + T·(behind)/Rb,  g = 1/(Rb·w),
/// S the sum of rises; the film's own resistance adds its share of Rb. Theorem: every term is taken at its
/// greatest over C in the interval (convex: at an end). Shunts that fire behind the dropper are not covered.
struct ChargeLine {
  double at_0_A = 0;  ///< I <= at_0_A - per_V·V
  double per_V = 0;
  double at_A(double rail_V) const { return at_0_A - per_V * rail_V; }
};
/// One line for each end of the interval of C: the greater counts.
std::array<ChargeLine, 2> charge_lines(const BoxQuestion& question);
/// The greater of both at `rail_V`, at least 0.
double charge_ceiling_A(const BoxQuestion& question, double rail_V);

/// The least charge: from the trough to the crest of the line the film takes up
///   C·(2·Vcrest - node - reverse - 2·lag) - (node·T/2 + |∫v|)/Rb,
/// lag what the line current of that moment leaves on the series resistance R: the current is C·dv/dt through
/// a low-pass of time constant R·C, so at a crest at most R·C²·max|d²v/dt²| and C times the rail's fall.
/// Concave in C: the lesser of both ends of the interval. Theorem; symmetric waveforms only, else nothing is
/// shown.
CornerCharge corner_charge(const BoxQuestion& question, BoxCorner corner);

/// Greatest rail current a member draws in the corner: asleep (standby), `share` of the heaviest load (rich).
double load_most_A(const BoxQuestion& question, BoxCorner corner, double share);

/// Least rail voltage at any moment of the corner while no member draws more than `load_A`: as long as the
/// least charge exceeds the load, the clamp conducts once a period; the rail then stands at its threshold
/// (clamp ahead: a drop below) and falls by no more than ESR·(peak + load) + load·T/Cr until the next time.
/// 0 where that is not shown. Theorem.
double rail_floor_V(const BoxQuestion& question, BoxCorner corner, const CornerCharge& charge, double load_A);

}  // namespace dropfront::scoring
