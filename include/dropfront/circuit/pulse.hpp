#pragma once
#include <vector>

namespace dropfront::circuit {

/// A stretch of constant power. Traces are stretches one after the other from time 0.
struct PowerStep {
  double duration_s = 0;  ///< >= 0
  double power_W = 0;     ///< >= 0
};

/// Greatest value over t of ½·∫ P(τ)·(t - τ)^(-½) dτ, in W·√s: surface temperature of a half-space (heat
/// spreads by diffusion alone), up to a material constant that a rating cancels. Constant power P for a time
/// t gives P·√t, so ratings "P for t" of any length on the t^(-½) line have one and the same value. Exact for
/// the piecewise-constant trace given. Source: heat diffusion into a half-space (Carslaw and Jaeger,
/// Conduction of Heat in Solids, §2.9, as restated, copy not kept); t^(-½) for zeners below 10 ms, from
/// memory.
double greatest_diffusion_W_sqrt_s(const std::vector<PowerStep>& trace);

/// Greatest diffusion value, but not less than √shortest times the peak power: below `shortest_s` (the
/// shortest pulse the data speak of, 0: none) a spike counts as if it lasted so long.
double pulse_stress_W_sqrt_s(const std::vector<PowerStep>& trace, double shortest_s);

/// Single-pulse rating of a junction that starts at 25 degC.
struct PulseRating {
  double power_W = 0;  ///< > 0, constant for time_s
  double time_s = 0;   ///< > 0
  double max_junction_degC = 150;
};

/// Share of the rating that a pulse of the given stress uses up, from a junction at `start_degC`:
///   stress / (P_ref·√t_ref) · (Tjmax - 25)/(Tjmax - Tstart)
/// 1 is the rating. Infinite when the junction starts at or above its maximum; a start below 25 degC earns no
/// credit.
double pulse_use(double stress_W_sqrt_s, const PulseRating& rating, double start_degC);

/// Energy in joules a film resistor takes in a pulse of `pulse_s` when it takes `rated_J` in one of
/// `rated_s`, by P·√t = constant: E = E_ref·√(t/t_ref). Both times > 0. Wirewound parts hold a fixed energy
/// instead. Source: film pulse-load curves fall as t^(-½) over µs to ms, common practice.
double film_pulse_energy_J(double rated_J, double rated_s, double pulse_s);

/// Length of the rectangle with the same peak power and energy as the plug-in pulse of R and C in series:
/// power falls as exp(-2t/(R·C)), so t = R·C/2.
constexpr double exponential_pulse_s(double resistance_ohm, double capacitance_F) {
  return resistance_ohm * capacitance_F / 2;
}

}  // namespace dropfront::circuit
