#include "dropfront/circuit/pulse.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace dropfront::circuit {
namespace {

/// The trace as jumps of power at given times: the diffusion value is then a sum of jump·√(t - time).
struct Jumps {
  std::vector<double> time_s, power_W;
};

double value_at(const Jumps& jumps, std::size_t count, double t) {
  double sum = 0;
  for (std::size_t j = 0; j < count; ++j) sum += jumps.power_W[j] * std::sqrt(t - jumps.time_s[j]);
  return sum;
}

/// The greatest value inside (from, to) by golden section; only jumps before `to` count.
double peak_between(const Jumps& jumps, std::size_t count, double from, double to) {
  constexpr double kGolden = 0.6180339887498949;
  double low = from, high = to, best = 0;
  for (int pass = 0; pass < 60; ++pass) {
    const double left = high - kGolden * (high - low), right = low + kGolden * (high - low);
    const double at_left = value_at(jumps, count, left), at_right = value_at(jumps, count, right);
    best = std::max({best, at_left, at_right});
    (at_left < at_right ? low : high) = at_left < at_right ? left : right;
  }
  return best;
}

}  // namespace

double greatest_diffusion_W_sqrt_s(const std::vector<PowerStep>& trace) {
  Jumps jumps;
  double time = 0, before = 0, best = 0;
  for (std::size_t k = 0; k < trace.size(); ++k) {
    if (!(trace[k].duration_s > 0)) continue;
    const double power = trace[k].power_W;
    const bool rises = power > before;
    if (power != before) {
      jumps.time_s.push_back(time);
      jumps.power_W.push_back(power - before);
    }
    before = power;
    const double end = time + trace[k].duration_s;
    const std::size_t count = jumps.time_s.size();
    if (count > 0) {
      const double at_end = value_at(jumps, count, end);
      best = std::max(best, at_end);
      // After a step up on top of older heat the peak can lie inside the stretch: then the value falls again
      // towards its end.
      const double just_before = value_at(jumps, count, end - 1e-4 * trace[k].duration_s);
      if (rises && count > 1 && just_before > at_end)
        best = std::max(best, peak_between(jumps, count, time, end));
    }
    time = end;
  }
  return best;
}

double pulse_stress_W_sqrt_s(const std::vector<PowerStep>& trace, double shortest_s) {
  double peak_W = 0;
  for (const PowerStep& step : trace)
    if (step.duration_s > 0) peak_W = std::max(peak_W, step.power_W);
  return std::max(greatest_diffusion_W_sqrt_s(trace), peak_W * std::sqrt(shortest_s));
}

double pulse_use(double stress_W_sqrt_s, const PulseRating& rating, double start_degC) {
  const double room_K = rating.max_junction_degC - std::max(start_degC, 25.0);
  if (!(room_K > 0)) return std::numeric_limits<double>::infinity();
  return stress_W_sqrt_s / (rating.power_W * std::sqrt(rating.time_s)) * (rating.max_junction_degC - 25) /
         room_K;
}

double film_pulse_energy_J(double rated_J, double rated_s, double pulse_s) {
  return rated_J * std::sqrt(pulse_s / rated_s);
}

}  // namespace dropfront::circuit
