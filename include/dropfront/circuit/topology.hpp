#pragma once
#include <array>
#include <cstdint>
#include <string>
#include <vector>

#include "dropfront/circuit/network.hpp"
#include "dropfront/circuit/steady_state.hpp"

namespace dropfront::circuit {

/// Which branches conduct (one bit each, network order), then which loads stand above their cut-off, then
/// which thyristors are latched.
using ConductionMask = std::uint32_t;

inline constexpr int kMaxRoots = 12;     ///< groups of nodes tied together by capacitors and source
inline constexpr int kMaxElements = 48;  ///< all but capacitors; branches, loads, thyristors share the mask
inline constexpr int kColumns = kMaxStates + 3;  ///< capacitor voltages, source voltage, one, per ampere

/// A row affine in (x_0 .. x_{n-1}, u, 1): states in their places, u at kSource, the constant at kOne, and at
/// kPerAmpere how the constant grows with the first load's current while that load stands above its cut-off.
using Row = std::array<double, kColumns>;
inline constexpr int kSource = kMaxStates;
inline constexpr int kOne = kMaxStates + 1;
inline constexpr int kPerAmpere = kMaxStates + 2;

/// What of a network does not depend on which branches conduct. Capacitors and the source form a forest of
/// tied node groups; inside a group every node differs from the group's root by capacitor and source
/// voltages, so only the roots are unknown (two or three instead of one a node).
struct Topology {
  struct Element {
    std::array<double, kColumns> offset{};           ///< v_a - v_b apart from the roots
    std::array<std::int8_t, kMaxRoots> roots{};      ///< coefficient of each root voltage in v_a - v_b
    std::array<std::int8_t, kMaxStates + 1> tree{};  ///< share of its current in each tree edge (source last)
  };
  int states = 0;
  int roots = 0;
  std::vector<Element> elements;  ///< resistors, then branches, then loads, then thyristors
  Element rail;                   ///< v(rail) - v(rail_return)
  std::string fault;              ///< empty, or why this network cannot be solved
};

/// Valid: every capacitor and resistor > 0, slopes > 0, no loop of capacitors and source, sizes within the
/// limits above. Otherwise `fault` says what is wrong.
Topology analyse(const Network& network);

}  // namespace dropfront::circuit
