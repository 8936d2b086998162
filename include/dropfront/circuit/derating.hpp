#pragma once

namespace dropfront::circuit {

/// Share of the rated power a resistor may carry at an ambient: 1 up to 70 degC, then a straight line to 0 at
/// 155 degC. Returns 0 above 155 degC (the film's limiting temperature), 1 below 70 degC at any cold.
/// Source: thick-film chip and metal-film data sheets ("full power to 70 degC, linear to 0 at 155 degC").
double resistor_power_share(double ambient_degC);

/// Factor that carries an electrolytic's ripple-current rating from `rated_Hz` to `running_Hz`:
/// m(running)/m(rated) with m = 0.8 up to 60 Hz, 1.0 at 120 Hz, 1.6 from 100 kHz, straight in log f between.
/// So x0.8 from 120 Hz to 50/60 Hz and x0.5 from 100 kHz. Both in hertz, > 0.
/// Source: common practice (makers print such a table for each family; this one is a cautious middle).
double ripple_rating_factor(double rated_Hz, double running_Hz);

}  // namespace dropfront::circuit
