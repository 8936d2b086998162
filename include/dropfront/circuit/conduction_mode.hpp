#pragma once
#include <vector>

#include "dropfront/circuit/topology.hpp"

namespace dropfront::circuit {

/// A quantity in modal coordinates: sum w_i·z_i + u·v_mains(t) + one.
struct ModalRow {
  std::array<double, kMaxStates> z{};
  double u = 0;
  double one = 0;
  double per_A = 0;  ///< growth of `one` with the first load's current
};

/// A quantity along one conduction mode apart from its own transient: the sinusoidal answer to every tone
/// and the constant. With it a guard costs one dot product and no look at the tones' modal parts.
struct ForcedRow {
  std::array<double, kMostTones> cosine, sine;  ///< one a tone; only those of the mains are set
  double constant = 0;
  double constant_per_A = 0;
  double curvature = 0;  ///< bound of the tones' second derivative: sum (k·w)^2·amplitude
  double jerk = 0;       ///< bound of their third derivative
};

/// The linear network while a given set of branches conducts: x' = A·x + b·u + c, diagonalised.
/// A is similar to a symmetric matrix (capacitances and reciprocal conductances), so the eigenvalues are
/// real and the modal basis is orthonormal in the energy norm.
struct ConductionMode {
  ConductionMask mask = 0;
  bool solvable = false;
  int states = 0;  ///< capacitors
  int modes = 0;   ///< states, then one for each exponential of the source (its own decay, fed by nothing)
  bool grows = false;                         ///< an eigenvalue above zero (constant-power loads)
  std::array<double, kMaxStates> lambda{};    ///< 1/s, <= 0 for passive networks
  std::array<bool, kMaxStates> slow{};        ///< |lambda|·period below 1e-4: the constant is kept apart
  std::array<double, kMaxStates> source{};    ///< b in modal coordinates
  std::array<double, kMaxStates> constant{};  ///< c in modal coordinates
  std::array<double, kMaxStates> constant_per_A{};
  std::array<std::array<double, kMaxStates>, kMaxStates> to_state{};  ///< x = to_state·z, all modes
  std::array<std::array<double, kMaxStates>, kMaxStates> to_modal{};  ///< z = to_modal·x, circuit modes
  /// What an exponential of the source drives in each circuit mode.
  std::array<std::array<double, 2>, kMaxStates> pulse_gain{};
  std::array<double, 2> pulse_V{};
  double pulse_start_s = 0;
  std::vector<double> forced_cosine, forced_sine;  ///< [state·tones + tone]: steady answer of each mode

  std::vector<ModalRow> element_V;  ///< voltage across each element, topology order
  /// Per mask bit: v - threshold (branches), v - cut-off (loads), and for a thyristor what is above its
  /// holding current (latched) or its gate's above the trigger current (not latched), as volts.
  std::vector<ModalRow> guard;
  std::vector<ForcedRow> guard_forced;
  std::vector<ModalRow> arming;  ///< per thyristor: the feeding branch above the holding current, as volts
  std::vector<ForcedRow> arming_forced;
  ModalRow rail;
  ForcedRow rail_forced;
  std::array<Row, kMaxStates> capacitor_A{};  ///< current in each capacitor, in (x, u, 1)
  Row source_A{};                             ///< current drawn from the line, in (x, u, 1)
};

/// Modified nodal analysis of one mode. `solvable` is false where a group of nodes hangs on nothing.
ConductionMode derive_mode(const Network& network, const Topology& topology, ConductionMask mask);

/// Moves the first load's current by `more_A`: only constants change, none of what was expensive. Valid while
/// that load stands above its cut-off in `mode`.
void shift_load(ConductionMode& mode, double more_A);

/// Turns a row in (x, u, 1) into modal coordinates.
ModalRow to_modal_row(const ConductionMode& mode, const Row& row);

/// The source voltage itself.
ModalRow source_row(const ConductionMode& mode);

/// Adds the steady sinusoidal answers and constants of the modes to a row's own.
ForcedRow forced_part(const ConductionMode& mode, const Waveform& mains, const ModalRow& row);

}  // namespace dropfront::circuit
