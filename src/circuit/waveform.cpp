#include "dropfront/circuit/waveform.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace dropfront::circuit {

namespace {
constexpr double kTwoPi = 2 * std::numbers::pi;

double tone_sum(const std::vector<Waveform::Tone>& tones, double angle) {
  double v = 0;
  for (const auto& tone : tones) v += tone.amplitude_V * std::sin(tone.order * angle + tone.phase_rad);
  return v;
}

double tone_slope(const std::vector<Waveform::Tone>& tones, double angle) {
  double d = 0;
  for (const auto& tone : tones) {
    d += tone.order * tone.amplitude_V * std::cos(tone.order * angle + tone.phase_rad);
  }
  return d;
}

/// Zero of the slope between two angles where it changes sign; bisection to the last bit that matters.
double slope_zero(const std::vector<Waveform::Tone>& tones, double low, double high) {
  const bool rising = tone_slope(tones, low) > 0;
  for (int i = 0; i < 60; ++i) {
    const double middle = 0.5 * (low + high);
    ((tone_slope(tones, middle) > 0) == rising ? low : high) = middle;
  }
  return 0.5 * (low + high);
}
}  // namespace

Waveform::Waveform(double total_voltage_Vrms, double frequency_Hz, std::vector<Harmonic> harmonics)
    : voltage_Vrms_(total_voltage_Vrms), frequency_Hz_(frequency_Hz) {
  double square_sum = 1;
  int highest = 1;
  for (const auto& h : harmonics) square_sum += h.share * h.share;
  const double amplitude = std::numbers::sqrt2 * total_voltage_Vrms / std::sqrt(square_sum);
  tones_.push_back({1, amplitude, 0});
  for (const auto& h : harmonics) {
    if (h.share == 0) continue;
    tones_.push_back({h.order, amplitude * h.share, h.phase_rad});
    highest = std::max(highest, h.order);
  }
  if (tones_.size() == 1) {
    crest_V_ = amplitude;
    crest_time_s_ = 0.25 / frequency_Hz;
    sum_of_rises_V_ = 2 * amplitude;
    return;
  }
  // Extrema are the zeros of a trigonometric polynomial of order `highest`: at most 2·highest a period.
  const int steps = 64 * highest;
  double previous_extreme = 0;
  bool have_previous = false;
  double first_extreme = 0;
  for (int i = 0; i < steps; ++i) {
    const double low = kTwoPi * (i - 0.5) / steps;
    const double high = kTwoPi * (i + 0.5) / steps;
    if ((tone_slope(tones_, low) > 0) == (tone_slope(tones_, high) > 0)) continue;
    const double angle = slope_zero(tones_, low, high);
    const double v = tone_sum(tones_, angle);
    if (std::abs(v) > crest_V_ * (1 + 1e-12)) crest_V_ = std::abs(v);
    if (v > 0 && v > crest_V_ * (1 - 1e-9) && (crest_time_s_ == 0 || v > value_V(crest_time_s_) + 1e-9 * v)) {
      crest_time_s_ = angle / kTwoPi / frequency_Hz_;
    }
    if (have_previous) {
      sum_of_rises_V_ += std::max(0.0, v - previous_extreme);
    } else {
      first_extreme = v;
    }
    previous_extreme = v;
    have_previous = true;
  }
  sum_of_rises_V_ += std::max(0.0, first_extreme - previous_extreme);
}

double Waveform::omega() const { return kTwoPi * frequency_Hz_; }
double Waveform::value_V(double time_s) const {
  double v = tone_sum(tones_, omega() * time_s);
  for (const auto& e : exponentials_) {
    if (time_s >= pulse_start_s_) v += e.amplitude_V * std::exp(-e.rate_per_s * (time_s - pulse_start_s_));
  }
  return v;
}
double Waveform::slope_V_per_s(double time_s) const { return omega() * tone_slope(tones_, omega() * time_s); }

Waveform Waveform::with_pulse(double start_s, double amplitude_V, double front_s, double tail_s) const {
  Waveform sum = *this;
  sum.pulse_start_s_ = start_s;
  sum.exponentials_ = {{amplitude_V, 1 / tail_s}, {-amplitude_V, 1 / tail_s + 1 / front_s}};
  return sum;
}

Waveform Waveform::scaled(double share) const {
  Waveform less = *this;
  less.exponentials_.clear();
  less.voltage_Vrms_ *= share;
  less.crest_V_ *= share;
  less.sum_of_rises_V_ *= share;
  for (auto& tone : less.tones_) tone.amplitude_V *= share;
  return less;
}

bool Waveform::odd_only() const {
  return std::all_of(tones_.begin(), tones_.end(), [](const Tone& t) { return t.order % 2 == 1; });
}

}  // namespace dropfront::circuit
