#include "dropfront/circuit/pulse.hpp"

#include <algorithm>
#include <cmath>

#include "support/catch.hpp"

namespace dropfront::circuit {
namespace {

using Catch::Matchers::WithinRel;
constexpr double kRounding = 1e-12;

const PulseRating kRating{4.5, 8.3e-3, 150};

double use(const std::vector<PowerStep>& trace, double start_degC = 25) {
  return pulse_use(greatest_diffusion_W_sqrt_s(trace), kRating, start_degC);
}

/// P0·exp(-t/tau) in `pieces` equal stretches over `length` time constants, each with its mean power.
std::vector<PowerStep> decay(double peak_W, double tau_s, int pieces, double length = 6) {
  std::vector<PowerStep> trace;
  const double step = length * tau_s / pieces;
  for (int k = 0; k < pieces; ++k) {
    const double mean =
        peak_W * tau_s / step * (std::exp(-k * step / tau_s) - std::exp(-(k + 1) * step / tau_s));
    trace.push_back({step, mean});
  }
  return trace;
}

TEST_CASE("the rated pulse from a junction at 25 degC uses exactly the whole rating") {
  CHECK_THAT(use({{8.3e-3, 4.5}}, 25), WithinRel(1.0, kRounding));
}

TEST_CASE("a pulse a hundred times shorter may have ten times the power") {
  CHECK_THAT(use({{8.3e-5, 45}}, 25), WithinRel(1.0, kRounding));
}

TEST_CASE("cutting a trace into more stretches changes nothing") {
  std::vector<PowerStep> fine;
  for (int k = 0; k < 83; ++k) fine.push_back({1e-4, 4.5});
  CHECK_THAT(use(fine), WithinRel(1.0, 1e-9));  // sums of 83 times
}

TEST_CASE("the use is proportional to the power and never falls when a stretch is added") {
  const std::vector<PowerStep> once{{1e-4, 20}, {2e-4, 5}};
  const std::vector<PowerStep> twice{{1e-4, 40}, {2e-4, 10}};
  const std::vector<PowerStep> longer{{1e-4, 20}, {2e-4, 5}, {1e-5, 100}};
  CHECK_THAT(use(twice), WithinRel(2 * use(once), kRounding));
  CHECK(use(longer) >= use(once));
  CHECK(use({}) == 0);
}

TEST_CASE("a warm junction leaves a smaller share of the rating and one at its maximum leaves none") {
  // Half of the 125 K is gone at 87.5 degC.
  CHECK_THAT(use({{8.3e-3, 4.5}}, 87.5), WithinRel(2.0, kRounding));
  CHECK(std::isinf(use({{8.3e-3, 4.5}}, 150)));
  CHECK(use({{8.3e-3, 4.5}}, -20) == use({{8.3e-3, 4.5}}, 25));
}

TEST_CASE("an exponential pulse heats as Dawson's integral says") {
  // ½·int_0^t exp(-x/tau)·(t-x)^-½ dx = √tau·D(√(t/tau)); the greatest value of Dawson's integral D is
  // 0.5410442246 (Abramowitz and Stegun, 7.1 table of Dawson's integral). 0.1 %: 2000 stretches stand for it.
  const double tau = 32e-6;
  CHECK_THAT(greatest_diffusion_W_sqrt_s(decay(100, tau, 2000)),
             WithinRel(100 * std::sqrt(tau) * 0.5410442246, 1e-3));
}

TEST_CASE("a peak inside a stretch after a step up is found") {
  // Old heat decays while new heat comes in: compare with a trace cut into a thousand pieces, whose ends are
  // all looked at.
  const std::vector<PowerStep> whole{{1e-6, 1000}, {9e-6, 0}, {1e-3, 0.5}};
  std::vector<PowerStep> cut{{1e-6, 1000}, {9e-6, 0}};
  for (int k = 0; k < 1000; ++k) cut.push_back({1e-6, 0.5});
  CHECK_THAT(greatest_diffusion_W_sqrt_s(whole), WithinRel(greatest_diffusion_W_sqrt_s(cut), 1e-9));
  const std::vector<PowerStep> late{{1e-4, 1}, {1e-6, 0}, {1e-3, 0.95}};
  double best = 0;
  for (int k = 1; k <= 4000; ++k) {
    const double t = 101e-6 + k * 0.25e-6;
    best = std::max(best, std::sqrt(t) - std::sqrt(t - 100e-6) + 0.95 * std::sqrt(t - 101e-6));
  }
  CHECK_THAT(greatest_diffusion_W_sqrt_s(late), WithinRel(best, 1e-6));  // a grid of 0.25 us beside a search
}

TEST_CASE("a spike shorter than the shortest stated pulse counts as that long") {
  const std::vector<PowerStep> spike{{1e-9, 100}};
  CHECK(pulse_stress_W_sqrt_s(spike, 10e-6) == greatest_diffusion_W_sqrt_s({{10e-6, 100}}));
  CHECK(pulse_stress_W_sqrt_s(spike, 0) == greatest_diffusion_W_sqrt_s(spike));
  CHECK(pulse_stress_W_sqrt_s({{1e-3, 100}}, 10e-6) == greatest_diffusion_W_sqrt_s({{1e-3, 100}}));
}

TEST_CASE("a film resistor takes less energy in a shorter pulse") {
  CHECK_THAT(film_pulse_energy_J(0.4, 1e-3, 1e-3), WithinRel(0.4, kRounding));
  CHECK_THAT(film_pulse_energy_J(0.4, 1e-3, 1e-5), WithinRel(0.04, kRounding));
}

TEST_CASE("the plug-in pulse's rectangle holds the energy that the capacitor brings") {
  // E = ½·C·V² whatever R is (energy balance): peak V²/R times R·C/2.
  const double resistance = 47, capacitance = 0.47e-6, step_V = 2 * 357.8;
  const double energy = step_V * step_V / resistance * exponential_pulse_s(resistance, capacitance);
  CHECK_THAT(energy, WithinRel(0.1203, 5e-4));  // 120.3 mJ, worst re-plug at 253 V; printed to 0.1 mJ
}

}  // namespace
}  // namespace dropfront::circuit
