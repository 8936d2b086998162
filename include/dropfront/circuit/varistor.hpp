#pragma once
#include <vector>

#include "dropfront/circuit/element_values.hpp"

namespace dropfront::circuit {

/// Voltage-current law of a metal-oxide varistor between its 1 mA point and its clamping point, straight on
/// logarithmic axes and carried on beyond: V = clamp_V·(I/clamp_A)^alpha,
/// alpha = ln(clamp_V/one_mA_V)/ln(clamp_A/1 mA). Valid: 0 < one_mA_V < clamp_V, clamp_A > 1 mA; data sheets
/// curve up a little more above some hundred amperes (from memory), so the let-through there is a low guess.
struct VaristorLaw {
  double one_mA_V = 0;
  double clamp_V = 0;
  double clamp_A = 0;
  double exponent() const;
  double voltage_V(double current_A) const;
};

/// The law as parallel one-way branches, one straight piece from each of some currents to the next, the last
/// carried on. Touches the law at 1 mA, 0.1, 1, 10, 30, 100, 300, 1000 and 3000 A; between them no more
/// than 4 % of the voltage below it.
std::vector<Curve> varistor_branches(const VaristorLaw& law);

/// The same for a run in which no more than about `greatest_A` flows: few pieces, which touch the law at 1 mA
/// and at 1/300, 1/30, 1/5 and all of that current; from a thirtieth of it up no more than 2 % of the voltage
/// below the law (0.1 A and more). Empty where `greatest_A` is below 1 mA.
std::vector<Curve> varistor_branches(const VaristorLaw& law, double greatest_A);

/// Current where the law meets a source of `open_V` behind `source_ohm`; 0 where that stays below the 1 mA
/// point. All > 0.
double current_behind_A(const VaristorLaw& law, double open_V, double source_ohm);

/// A disc's voltage at 1 mA follows its continuous a.c. rating: 430 V +/- 10 % for 275 V (size 431K).
double varistor_one_mA_V(double continuous_Vrms);

}  // namespace dropfront::circuit
