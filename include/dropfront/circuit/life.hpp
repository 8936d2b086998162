#pragma once

namespace dropfront::circuit {

/// Named ripple term of an electrolytic's life: the makers' formulas disagree, so the one used has a name.
enum class RippleTerm {
  none,             ///< 1: the 10 K rule alone
  halves_each_5_K,  ///< 2^(-dT/5), dT the core's own rise
};

/// Rise of an electrolytic's core over its surroundings, dT = 5 K·(I/I_rated)². `current_Arms` and
/// `rated_Arms` (> 0) at the same frequency. Returns kelvin.
/// Source: 5 K at the rated ripple of a 105 degC type, makers' life notes, from memory.
double ripple_rise_K(double current_Arms, double rated_Arms);

/// Life of a wet aluminium electrolytic in hours:
///   L = L0 · 2^((T0 - T)/10) · K_ripple
/// L0 `rated_h` hours at T0 `rated_degC`; T `surroundings_degC` around the can; K_ripple by `term` from
/// `rise_K`. The doubling per 10 K is stated from 35 degC to T0: below 35 degC, 35 degC is used (no credit);
/// above T0 the formula goes on, and the result is shorter than L0.
/// Source: makers' life notes (Le = Lo·Kt·Kr); by one of them the rule leaves the Arrhenius law below 60 degC
/// and should not be used for types above 105 degC.
double electrolytic_life_h(double rated_h, double rated_degC, double surroundings_degC, double rise_K,
                           RippleTerm term = RippleTerm::halves_each_5_K);

}  // namespace dropfront::circuit
