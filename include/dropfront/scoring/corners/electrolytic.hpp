#pragma once
#include "dropfront/parts/reservoir.hpp"

namespace dropfront::scoring {

/// Capacitance in the cold, relative to 20 degC: 0.9^((20 - T)/45) below 20 degC, 1 above.
double electrolytic_cold_capacitance(double local_degC);

/// ESR in the cold, relative to 20 degC: log-linear from 1 at 20 degC to esr_cold/esr at -25 degC; below
/// that twice more per 15 K (the steps from -25 to -40 degC of the impedance-ratio table of a general
/// 105 degC series: 3 to 6, 2 to 4). 1 above 20 degC.
double electrolytic_cold_esr(const parts::Reservoir& part, double local_degC);

/// Share of a capacitance left at an age in lives (0 new, 1 end of life, >= 0) when `end_of_life_loss` is
/// lost over one: 1 - loss·age. The loss goes straight with time; what is left is never taken below a
/// twentieth.
double left_of(double end_of_life_loss, double aged);

/// Least, nominal and greatest capacitance and ESR; `aged` in lives, the ESR rising straight with time too.
/// Data ESR is a maximum: its least end is a tenth of it.
double reservoir_least_F(const parts::Reservoir& part, double aged, double local_degC);
double reservoir_greatest_F(const parts::Reservoir& part);
double reservoir_least_esr_ohm(const parts::Reservoir& part, double local_degC);
double reservoir_greatest_esr_ohm(const parts::Reservoir& part, double aged, double local_degC);

}  // namespace dropfront::scoring
