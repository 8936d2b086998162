#include "dropfront/circuit/conduction_mode.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/circuit/forced_modes.hpp"
#include "dropfront/circuit/symmetric_eigen.hpp"

namespace dropfront::circuit {

namespace {

/// Conductance and threshold of each element in this mode; a constant current where it has none.
struct Conducting {
  double conductance_S = 0;
  double threshold_V = 0;
  double constant_A = 0;
  double per_A = 0;  ///< 1 for the first load above its cut-off
};

std::vector<Conducting> conducting_elements(const Network& network, ConductionMask mask) {
  std::vector<Conducting> list;
  list.reserve(network.resistors.size() + network.branches.size() + network.loads.size());
  for (const auto& r : network.resistors) list.push_back({1 / r.resistance_ohm, 0, 0});
  int bit = 0;
  for (const auto& d : network.branches) {
    const bool on = (mask >> bit++) & 1u;
    list.push_back({on ? 1 / d.slope_ohm : 0, d.threshold_V, 0});
  }
  for (const auto& load : network.loads) {
    const bool above = (mask >> bit++) & 1u;
    if (above) {
      list.push_back(
          {load.slope_S, load.cutoff_V, load.current_A, &load == &network.loads.front() ? 1.0 : 0.0});
    } else {
      list.push_back({load.current_A / load.cutoff_V, 0, 0});
    }
  }
  for (const auto& t : network.thyristors) {
    const bool latched = (mask >> bit++) & 1u;
    list.push_back({latched ? 1 / t.slope_ohm : 0, t.on_voltage_V, 0});
  }
  return list;
}

using RootRows = std::array<Row, kMaxRoots>;  ///< each root voltage in (x, u, 1)

/// Kirchhoff's current law of every floating group, solved by symmetric elimination.
bool solve_roots(const Topology& topology, const std::vector<Conducting>& conducting, RootRows& roots) {
  const int n = topology.roots;
  double g[kMaxRoots][kMaxRoots] = {};
  for (int m = 0; m < n; ++m) roots[m] = Row{};
  for (std::size_t e = 0; e < conducting.size(); ++e) {
    const auto& element = topology.elements[e];
    const auto& c = conducting[e];
    if (c.conductance_S == 0 && c.constant_A == 0 && c.per_A == 0) continue;
    for (int m = 0; m < n; ++m) {
      if (element.roots[m] == 0) continue;
      const double weight = element.roots[m] * c.conductance_S;
      for (int k = 0; k < n; ++k) g[m][k] += weight * element.roots[k];
      for (int column = 0; column <= kSource; ++column) roots[m][column] -= weight * element.offset[column];
      roots[m][kOne] += weight * c.threshold_V - element.roots[m] * c.constant_A;
      roots[m][kPerAmpere] -= element.roots[m] * c.per_A;
    }
  }
  for (int p = 0; p < n; ++p) {
    const double pivot = g[p][p];
    if (!(pivot > 1e-15)) return false;  // a group that hangs on less than a picosiemens' thousandth
    for (int r = p + 1; r < n; ++r) {
      const double factor = g[r][p] / pivot;
      if (factor == 0) continue;
      for (int k = p; k < n; ++k) g[r][k] -= factor * g[p][k];
      for (int column = 0; column < kColumns; ++column) roots[r][column] -= factor * roots[p][column];
    }
  }
  for (int p = n - 1; p >= 0; --p) {
    for (int column = 0; column < kColumns; ++column) {
      double sum = roots[p][column];
      for (int k = p + 1; k < n; ++k) sum -= g[p][k] * roots[k][column];
      roots[p][column] = sum / g[p][p];
    }
  }
  return true;
}

Row voltage_row(const Topology::Element& element, const RootRows& roots, int root_count) {
  Row row = element.offset;
  for (int m = 0; m < root_count; ++m) {
    if (element.roots[m] == 0) continue;
    for (int column = 0; column < kColumns; ++column) row[column] += element.roots[m] * roots[m][column];
  }
  return row;
}

/// Eigenvalues and modal transforms from the capacitor-current rows.
void diagonalise(const Network& network, ConductionMode& mode) {
  const int n = mode.states;
  std::array<double, kMaxStates> root_C{};
  for (int i = 0; i < n; ++i) root_C[i] = std::sqrt(network.capacitors[i].capacitance_F);
  SmallMatrix s{};
  for (int i = 0; i < n; ++i) {
    for (int k = 0; k < n; ++k) {
      // Reciprocity makes this symmetric up to rounding; averaging keeps it exactly so.
      s[i][k] = 0.5 * (mode.capacitor_A[i][k] + mode.capacitor_A[k][i]) / (root_C[i] * root_C[k]);
    }
  }
  SmallMatrix q{};
  symmetric_eigen(n, s, mode.lambda, q);
  for (int i = 0; i < n; ++i) {
    for (int k = 0; k < n; ++k) {
      mode.to_state[i][k] = q[i][k] / root_C[i];
      mode.to_modal[k][i] = q[i][k] * root_C[i];
    }
  }
  const double period_s = network.source.waveform.period_s();
  const bool active = std::any_of(network.loads.begin(), network.loads.end(),
                                  [](const LoadElement& load) { return load.slope_S < 0; });
  for (int k = 0; k < n; ++k) {
    if (mode.lambda[k] > 0 && !active) mode.lambda[k] = 0;  // rounding only: the network is passive
    mode.grows = mode.grows || mode.lambda[k] > 0;
    mode.slow[k] = std::abs(mode.lambda[k]) * period_s < 1e-4;
    for (int i = 0; i < n; ++i) {
      mode.source[k] += q[i][k] * mode.capacitor_A[i][kSource] / root_C[i];
      mode.constant[k] += q[i][k] * mode.capacitor_A[i][kOne] / root_C[i];
      mode.constant_per_A[k] += q[i][k] * mode.capacitor_A[i][kPerAmpere] / root_C[i];
    }
  }
}

/// Latched: current above holding. Not latched: gate above trigger, and the feeding branch above holding.
void add_thyristor_guards(const Network& network, ConductionMode& mode) {
  const auto& mains = network.source.waveform;
  const std::size_t before = network.branches.size() + network.loads.size();
  for (std::size_t t = 0; t < network.thyristors.size(); ++t) {
    const auto& part = network.thyristors[t];
    const auto& feed = network.branches[part.feed_branch];
    ModalRow arming = mode.element_V[network.resistors.size() + part.feed_branch];
    arming.one -= feed.threshold_V + feed.slope_ohm * part.holding_A;
    ModalRow guard;
    if ((mode.mask >> (before + t)) & 1u) {
      guard = mode.element_V[network.resistors.size() + before + t];
      guard.one -= part.on_voltage_V + part.slope_ohm * part.holding_A;
    } else {
      guard = mode.element_V[part.gate_resistor];
      guard.one -= network.resistors[part.gate_resistor].resistance_ohm * part.trigger_A;
    }
    mode.guard.push_back(guard);
    mode.guard_forced.push_back(forced_part(mode, mains, guard));
    mode.arming.push_back(arming);
    mode.arming_forced.push_back(forced_part(mode, mains, arming));
  }
}

}  // namespace

ModalRow source_row(const ConductionMode& mode) {
  Row row{};
  row[kSource] = 1;
  return to_modal_row(mode, row);
}

ModalRow to_modal_row(const ConductionMode& mode, const Row& row) {
  ModalRow modal;
  for (int k = 0; k < mode.modes; ++k) {
    for (int i = 0; i < mode.states; ++i) modal.z[k] += row[i] * mode.to_state[i][k];
    if (k >= mode.states) modal.z[k] += row[kSource] * mode.pulse_V[k - mode.states];
  }
  modal.u = row[kSource];
  modal.one = row[kOne];
  modal.per_A = row[kPerAmpere];
  return modal;
}

ForcedRow forced_part(const ConductionMode& mode, const Waveform& mains, const ModalRow& row) {
  const auto& tones = mains.tones();
  const auto count = tones.size();
  ForcedRow forced;
  forced.constant = row.one;
  forced.constant_per_A = row.per_A;
  for (int i = 0; i < mode.states; ++i) {
    if (mode.slow[i]) continue;
    forced.constant -= row.z[i] * mode.constant[i] / mode.lambda[i];
    forced.constant_per_A -= row.z[i] * mode.constant_per_A[i] / mode.lambda[i];
  }
  for (std::size_t h = 0; h < count; ++h) {
    double c = row.u * tones[h].amplitude_V * std::sin(tones[h].phase_rad);
    double s = row.u * tones[h].amplitude_V * std::cos(tones[h].phase_rad);
    for (int i = 0; i < mode.states; ++i) {
      c += row.z[i] * mode.forced_cosine[i * count + h];
      s += row.z[i] * mode.forced_sine[i * count + h];
    }
    forced.cosine[h] = c;
    forced.sine[h] = s;
    const double w = tones[h].order * mains.omega();
    const double amplitude = std::sqrt(c * c + s * s);
    forced.curvature += w * w * amplitude;
    forced.jerk += w * w * w * amplitude;
  }
  return forced;
}

void shift_load(ConductionMode& mode, double more_A) {
  const auto shift_row = [more_A](ModalRow& row) { row.one += more_A * row.per_A; };
  const auto shift_forced = [more_A](ForcedRow& row) { row.constant += more_A * row.constant_per_A; };
  for (int i = 0; i < mode.states; ++i) {
    mode.constant[i] += more_A * mode.constant_per_A[i];
    mode.capacitor_A[i][kOne] += more_A * mode.capacitor_A[i][kPerAmpere];
  }
  mode.source_A[kOne] += more_A * mode.source_A[kPerAmpere];
  for (auto& row : mode.element_V) shift_row(row);
  for (auto& row : mode.guard) shift_row(row);
  for (auto& row : mode.guard_forced) shift_forced(row);
  shift_row(mode.rail);
  shift_forced(mode.rail_forced);
}

ConductionMode derive_mode(const Network& network, const Topology& topology, ConductionMask mask) {
  ConductionMode mode;
  mode.mask = mask;
  mode.states = topology.states;
  const auto conducting = conducting_elements(network, mask);
  RootRows roots;
  if (!solve_roots(topology, conducting, roots)) return mode;
  mode.solvable = true;

  std::vector<Row> element_rows(conducting.size());
  for (std::size_t e = 0; e < conducting.size(); ++e) {
    const auto& element = topology.elements[e];
    const auto& c = conducting[e];
    element_rows[e] = voltage_row(element, roots, topology.roots);
    Row current = element_rows[e];
    for (auto& entry : current) entry *= c.conductance_S;
    current[kOne] += c.constant_A - c.conductance_S * c.threshold_V;
    current[kPerAmpere] += c.per_A;
    for (int k = 0; k < topology.states; ++k) {
      if (element.tree[k] == 0) continue;
      for (int column = 0; column < kColumns; ++column) {
        mode.capacitor_A[k][column] += element.tree[k] * current[column];
      }
    }
    if (element.tree[kMaxStates] != 0) {
      // The tree edge counts current into the source's `a`; drawn from the line is the opposite.
      for (int column = 0; column < kColumns; ++column) {
        mode.source_A[column] -= element.tree[kMaxStates] * current[column];
      }
    }
  }
  diagonalise(network, mode);
  const auto& mains = network.source.waveform;
  force_modes(mains, mode);
  append_exponentials(mains, mode);

  mode.element_V.reserve(element_rows.size());
  for (const auto& row : element_rows) mode.element_V.push_back(to_modal_row(mode, row));
  const std::size_t first_branch = network.resistors.size();
  for (std::size_t b = 0; b < network.branches.size() + network.loads.size(); ++b) {
    ModalRow guard = mode.element_V[first_branch + b];
    guard.one -= b < network.branches.size() ? network.branches[b].threshold_V
                                             : network.loads[b - network.branches.size()].cutoff_V;
    mode.guard.push_back(guard);
    mode.guard_forced.push_back(forced_part(mode, mains, guard));
  }
  add_thyristor_guards(network, mode);
  mode.rail = to_modal_row(mode, voltage_row(topology.rail, roots, topology.roots));
  mode.rail_forced = forced_part(mode, mains, mode.rail);
  return mode;
}

}  // namespace dropfront::circuit
