#include "dropfront/scoring/clamp_trace.hpp"

#include <cmath>

#include "support/catch.hpp"

using Catch::Matchers::WithinRel;
using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// Samples an exponential current into a clamp at a constant voltage.
std::vector<circuit::PowerStep> exponential_pulse(double peak_A, double clamp_V, double time_constant_s,
                                                  const circuit::Curve* forward) {
  circuit::Network network;
  network.branches.push_back({0, 0, clamp_V, 1, circuit::Owner::clamp});
  network.branches.push_back({0, 0, 0.7, 1, circuit::Owner::rectifier});
  ClampTrace trace(network, forward);
  const double step_s = time_constant_s / 500;
  for (int i = 1; i <= 5000; ++i) {
    const double middle_s = (i - 0.5) * step_s;
    const std::vector<double> currents{peak_A * std::exp(-middle_s / time_constant_s), 100.0};
    const std::vector<double> voltages{clamp_V, 1.0};
    const std::vector<double> none;
    trace.add({i * step_s, step_s, 0, 0, currents, voltages, none});
  }
  return trace.take();
}

}  // namespace

TEST_CASE("The trace keeps the energy and the length, in few stretches") {
  const auto steps = exponential_pulse(10, 12, 50e-6, nullptr);
  double energy = 0, length = 0;
  for (const auto& s : steps) {
    energy += s.power_W * s.duration_s;
    length += s.duration_s;
  }
  // Midpoint samples of an exponential, 500 a time constant: 2e-7; e^-10 is left over.
  REQUIRE_THAT(energy, WithinRel(10 * 12 * 50e-6, 1e-4));
  REQUIRE_THAT(length, WithinRel(500e-6, 1e-9));
  REQUIRE(steps.size() < 120);
}

TEST_CASE("An exponential pulse stresses by P·sqrt(T) times the greatest Dawson integral") {
  // Half of the integral of exp(-u/T)·(t - u)^-1/2 is sqrt(T)·D(sqrt(t/T)), D Dawson's integral, whose
  // greatest value is 0.5410442246 at 0.9241388730 (Abramowitz and Stegun 7.1.17 and table 7.5, from memory).
  const double T = 50e-6;
  const double stress = circuit::greatest_diffusion_W_sqrt_s(exponential_pulse(10, 12, T, nullptr));
  // Joined stretches blur the pulse by a few per cent of its length at most.
  REQUIRE_THAT(stress, WithinRel(120 * std::sqrt(T) * 0.5410442246, 0.01));
}

TEST_CASE("Back to back, the forward zener's share is taken off the part in breakdown") {
  const circuit::Curve forward{0.7, 0.0};
  const auto both = exponential_pulse(10, 12.7, 50e-6, nullptr);
  const auto one = exponential_pulse(10, 12.7, 50e-6, &forward);
  REQUIRE_THAT(one.front().power_W / both.front().power_W, WithinRel(12.0 / 12.7, 1e-9));
}
