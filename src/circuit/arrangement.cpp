#include "dropfront/circuit/arrangement.hpp"

#include <algorithm>

#include "dropfront/circuit/arrangements/builders.hpp"

namespace dropfront::circuit {

const std::vector<Arrangement>& arrangements() {
  // name, full wave, clamp ahead, clamps, rectifiers, builder, shunt, dropper
  static const std::vector<Arrangement> table{
      {"half-wave-clamp-ahead", false, true, 1, 1, &build_half_wave_clamp_ahead},
      {"half-wave-clamp-across", false, false, 1, 2, &build_half_wave_clamp_across},
      {"bridge-clamp-across", true, false, 1, 4, &build_bridge_clamp_across},
      {"bridge-clamp-ahead", true, true, 2, 4, &build_bridge_clamp_ahead},
      {"half-wave-thyristor-shunt", false, false, 1, 2, &build_half_wave_thyristor_shunt, true},
      {"bridge-thyristor-shunt", true, false, 1, 5, &build_bridge_thyristor_shunt, true},
      {"resistive", false, false, 1, 1, &build_resistive, false, false},
  };
  return table;
}

const Arrangement* find_arrangement(std::string_view name) {
  const auto& table = arrangements();
  const auto found =
      std::find_if(table.begin(), table.end(), [name](const Arrangement& a) { return a.name == name; });
  return found == table.end() ? nullptr : &*found;
}

}  // namespace dropfront::circuit
