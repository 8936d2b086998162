#pragma once
#include "dropfront/scoring/bounds/charge.hpp"

namespace dropfront::scoring {

/// What the fundamental alone does on the mains side. The line sees Z = Rs + 1/Yp, Yp = G + jB of film and
/// chain, in series with the voltage behind the dropper, whose fundamental is at most 4/pi of its greatest
/// (bridge), 2/pi of its span (half-wave). So |I1| >= (A1 - that)/|Z|, and r.m.s. values are at least those
/// of the fundamental. With b = Rs·B < 1 + Rs·G: Re 1/Z grows with Rs, G and B; |1/Z| with B, and falls with
/// G only through 1 + Rs·G. Theorem in that range, 0 outside it.
struct Fundamental {
  double least_loss_W = 0;  ///< in series resistor, film and chain together
  double line_Arms = 0;     ///< least r.m.s. current of the line
  double chain_Vrms = 0;    ///< least r.m.s. voltage on the chain
};

/// At a series resistance: the loss is the least over members with at least that much, the other two over
/// members with at most that much.
Fundamental fundamental(const BoxQuestion& question, BoxCorner corner, const CornerCharge& charge,
                        double series_ohm);

}  // namespace dropfront::scoring
