#include "dropfront/circuit/period_totals.hpp"

#include <cmath>
#include <numeric>

namespace dropfront::circuit {

namespace {

constexpr int kMostBasis = 2 * kMaxStates + 1 + 2 * kMostTones;

/// The functions a segment's quantities are made of, in this order: two per state (e^(lambda·s) and nothing,
/// or s and s^2 where the mode is slow), then 1, then cos and sin of each tone.
struct Basis {
  int states = 0;
  int tones = 0;
  int size() const { return 2 * states + 1 + 2 * tones; }
  int one() const { return 2 * states; }
  int cosine(int h) const { return 2 * states + 1 + 2 * h; }
  int sine(int h) const { return 2 * states + 2 + 2 * h; }
};

using Coefficients = std::array<double, kMostBasis>;
struct Gram {
  double m[kMostBasis][kMostBasis];  // only [i][j], i <= j, is filled
  double mean[kMostBasis];           // integral of each function
};

/// A row's coefficients in the basis. Slow modes to second order in lambda·s, which is below 1e-4.
Coefficients expand(const Segment& segment, const Basis& basis, const ModalRow& row,
                    const ForcedRow& forced) {
  Coefficients c{};
  const auto& mode = *segment.mode;
  c[basis.one()] = forced.constant;
  for (int i = 0; i < basis.states; ++i) {
    if (mode.slow[i]) {
      const double slope = mode.lambda[i] * segment.alpha[i] + segment.drift[i];
      c[basis.one()] += row.z[i] * segment.alpha[i];
      c[2 * i] = row.z[i] * slope;
      c[2 * i + 1] = row.z[i] * slope * mode.lambda[i] / 2;
    } else {
      c[2 * i] = row.z[i] * segment.alpha[i];
    }
  }
  for (int h = 0; h < basis.tones; ++h) {
    c[basis.cosine(h)] = forced.cosine[h];
    c[basis.sine(h)] = forced.sine[h];
  }
  return c;
}

/// Integral of s^k·e^(l·s) from 0 to `length`, k <= 2. By its series where closed forms would cancel.
double power_exponential(int k, double l, double length) {
  const double x = l * length;
  if (std::abs(x) < 1) {
    double term = 1;
    double sum = 1.0 / (k + 1);
    for (int j = 1; j < 20; ++j) {
      term *= x / j;
      sum += term / (k + 1 + j);
    }
    return sum * std::pow(length, k + 1);
  }
  const double decay = std::exp(x);
  if (k == 0) return (decay - 1) / l;
  if (k == 1) return (decay * (x - 1) + 1) / (l * l);
  return (decay * (x * x - 2 * x + 2) - 2) / (l * l * l);
}

/// Integral of cos(a·t) and sin(a·t) from t0 to t1; a = 0 gives the length and zero.
struct TrigIntegral {
  double cosine, sine;
};
TrigIntegral trig_integral(double a, double t0, double t1) {
  if (a == 0) return {t1 - t0, 0};
  return {(std::sin(a * t1) - std::sin(a * t0)) / a, (std::cos(a * t0) - std::cos(a * t1)) / a};
}

/// The power of s that stands in a state's slot, and its exponent's rate.
struct StateFunction {
  bool used;
  int power;
  double rate;
};
StateFunction state_function(const ConductionMode& mode, int slot) {
  const int i = slot / 2;
  if (mode.slow[i]) return {true, slot % 2 + 1, 0};
  return {slot % 2 == 0, 0, mode.lambda[i]};
}

/// Products of state functions with each other and with the constant.
void fill_states(const Segment& segment, const Basis& basis, Gram& gram) {
  const auto& mode = *segment.mode;
  const double length = segment.length_s;
  for (int i = 0; i < 2 * basis.states; ++i) {
    const auto f = state_function(mode, i);
    gram.mean[i] = f.used ? power_exponential(f.power, f.rate, length) : 0;
    gram.m[i][basis.one()] = gram.mean[i];
    for (int k = i; k < 2 * basis.states; ++k) {
      const auto g = state_function(mode, k);
      if (!f.used || !g.used) {
        gram.m[i][k] = 0;
      } else if (f.power + g.power > 2) {
        gram.m[i][k] = std::pow(length, f.power + g.power + 1) / (f.power + g.power + 1);  // both slow
      } else {
        gram.m[i][k] = power_exponential(f.power + g.power, f.rate + g.rate, length);
      }
    }
  }
  gram.m[basis.one()][basis.one()] = gram.mean[basis.one()] = length;
}

/// Products of each state function with each tone.
void fill_mixed(const Segment& segment, const Basis& basis, const Waveform& mains, Gram& gram) {
  const auto& mode = *segment.mode;
  const double length = segment.length_s;
  const double t0 = segment.start_s;
  const double t1 = t0 + length;
  for (int h = 0; h < basis.tones; ++h) {
    const double w = mains.tones()[h].order * mains.omega();
    const double c0 = std::cos(w * t0), s0 = std::sin(w * t0);
    const double c1 = std::cos(w * t1), s1 = std::sin(w * t1);
    const int jc = basis.cosine(h), js = basis.sine(h);
    gram.mean[jc] = gram.m[basis.one()][jc] = (s1 - s0) / w;
    gram.mean[js] = gram.m[basis.one()][js] = (c0 - c1) / w;
    for (int i = 0; i < basis.states; ++i) {
      if (mode.slow[i]) {
        gram.m[2 * i][jc] = length * s1 / w + (c1 - c0) / (w * w);
        gram.m[2 * i][js] = -length * c1 / w + (s1 - s0) / (w * w);
        gram.m[2 * i + 1][jc] = length * length * s1 / w + 2 * (length * c1 - (s1 - s0) / w) / (w * w);
        gram.m[2 * i + 1][js] = -length * length * c1 / w + 2 * (length * s1 + (c1 - c0) / w) / (w * w);
      } else {
        const double l = mode.lambda[i];
        const double decay = l * length > -60 ? std::exp(l * length) : 0;
        const double scale = 1 / (l * l + w * w);
        gram.m[2 * i][jc] = (decay * (l * c1 + w * s1) - (l * c0 + w * s0)) * scale;
        gram.m[2 * i][js] = (decay * (l * s1 - w * c1) - (l * s0 - w * c0)) * scale;
        gram.m[2 * i + 1][jc] = gram.m[2 * i + 1][js] = 0;
      }
    }
  }
}

/// Products of tones with tones, by sums and differences of their angles.
void fill_tones(const Segment& segment, const Basis& basis, const Waveform& mains, Gram& gram) {
  const double t0 = segment.start_s;
  const double t1 = t0 + segment.length_s;
  for (int h = 0; h < basis.tones; ++h) {
    for (int k = h; k < basis.tones; ++k) {
      const double a = mains.tones()[h].order * mains.omega();
      const double b = mains.tones()[k].order * mains.omega();
      const auto sum = trig_integral(a + b, t0, t1);
      const auto difference = trig_integral(h == k ? 0 : a - b, t0, t1);
      gram.m[basis.cosine(h)][basis.cosine(k)] = (difference.cosine + sum.cosine) / 2;
      gram.m[basis.sine(h)][basis.sine(k)] = (difference.cosine - sum.cosine) / 2;
      gram.m[basis.cosine(h)][basis.sine(k)] = (sum.sine - difference.sine) / 2;
      if (k > h) gram.m[basis.sine(h)][basis.cosine(k)] = (sum.sine + difference.sine) / 2;
    }
  }
}

double product(const Gram& gram, int size, const Coefficients& a, const Coefficients& b) {
  double total = 0;
  for (int i = 0; i < size; ++i) {
    double row = a[i] * b[i] * gram.m[i][i];
    for (int k = i + 1; k < size; ++k) row += gram.m[i][k] * (a[i] * b[k] + a[k] * b[i]);
    total += row;
  }
  return total;
}

double mean_of(const Gram& gram, int size, const Coefficients& a) {
  double total = 0;
  for (int i = 0; i < size; ++i) total += a[i] * gram.mean[i];
  return total;
}

/// Current of a branch, load or latched thyristor as conductance·v + constant.
struct Affine {
  double conductance_S = 0, constant_A = 0;
};
Affine law_of(const Network& network, std::size_t element, bool set) {
  std::size_t k = element - network.resistors.size();
  if (k < network.branches.size()) {
    const auto& branch = network.branches[k];
    return {1 / branch.slope_ohm, -branch.threshold_V / branch.slope_ohm};
  }
  k -= network.branches.size();
  if (k < network.loads.size()) {
    const auto& load = network.loads[k];
    if (!set) return {load.current_A / load.cutoff_V, 0};
    return {load.slope_S, load.current_A - load.slope_S * load.cutoff_V};
  }
  const auto& thyristor = network.thyristors[k - network.loads.size()];
  return {1 / thyristor.slope_ohm, -thyristor.on_voltage_V / thyristor.slope_ohm};
}

}  // namespace

double WalkTotals::dissipated_J() const { return std::accumulate(element_J.begin(), element_J.end(), 0.0); }

WalkTotals integrate(const Walker& walker, const std::vector<Segment>& segments) {
  const auto& network = walker.network();
  const auto& mains = network.source.waveform;
  const std::size_t resistors = network.resistors.size();
  const std::size_t branches = network.branches.size();
  WalkTotals totals;
  const std::size_t loads = network.loads.size();
  totals.element_J.assign(resistors + branches + loads + network.thyristors.size(), 0);
  totals.element_As.assign(totals.element_J.size(), 0);
  totals.capacitor_A2s.assign(network.capacitors.size(), 0);
  const Basis basis{walker.topology().states + static_cast<int>(mains.exponentials().size()),
                    static_cast<int>(mains.tones().size())};
  const int size = basis.size();
  Gram gram;
  for (const auto& segment : segments) {
    const auto& mode = *segment.mode;
    fill_states(segment, basis, gram);
    fill_mixed(segment, basis, mains, gram);
    fill_tones(segment, basis, mains, gram);
    const auto expand_row = [&](const ModalRow& row) {
      return expand(segment, basis, row, forced_part(mode, mains, row));
    };
    totals.duration_s += segment.length_s;
    totals.rail_Vs += mean_of(gram, size, expand(segment, basis, mode.rail, mode.rail_forced));
    for (std::size_t e = 0; e < totals.element_J.size(); ++e) {
      const bool set = e >= resistors && ((mode.mask >> (e - resistors)) & 1u);
      const bool is_load = e >= resistors + branches && e < resistors + branches + loads;
      if (e >= resistors && !is_load && !set) continue;
      Coefficients v = expand_row(mode.element_V[e]);
      if (e < resistors) {
        const double g = 1 / network.resistors[e].resistance_ohm;
        totals.element_J[e] += g * product(gram, size, v, v);
        totals.element_As[e] += g * mean_of(gram, size, v);
      } else {
        const Affine law = law_of(network, e, set);
        Coefficients current = v;
        for (int i = 0; i < size; ++i) current[i] *= law.conductance_S;
        current[basis.one()] += law.constant_A;
        totals.element_J[e] += product(gram, size, v, current);
        totals.element_As[e] += mean_of(gram, size, current);
      }
    }
    for (std::size_t k = 0; k < network.capacitors.size(); ++k) {
      const Coefficients i = expand_row(to_modal_row(mode, mode.capacitor_A[k]));
      totals.capacitor_A2s[k] += product(gram, size, i, i);
    }
    const Coefficients line_A = expand_row(to_modal_row(mode, mode.source_A));
    const Coefficients line_V = expand_row(source_row(mode));
    totals.input_J += product(gram, size, line_A, line_V);
    totals.input_A2s += product(gram, size, line_A, line_A);
  }
  return totals;
}

double stored_J(const Network& network, const StateVector& x) {
  double sum = 0;
  for (std::size_t k = 0; k < network.capacitors.size(); ++k) {
    sum += 0.5 * network.capacitors[k].capacitance_F * x[k] * x[k];
  }
  return sum;
}

}  // namespace dropfront::circuit
