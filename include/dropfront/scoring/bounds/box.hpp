#pragma once
#include <cstdint>
#include <optional>
#include <string_view>
#include <vector>

#include "dropfront/scoring/design.hpp"

namespace dropfront::scoring {

/// A discharge chain: `count` equal elements in series; element null: none.
struct Chain {
  const parts::Resistor* element = nullptr;
  int count = 0;
};

/// Many designs at once: one arrangement, output stages of one kind, and a list of parts a slot. Every
/// combination of the lists is a member. Lists are never empty; where a slot may stay empty a null stands for
/// it, where the problem offers nothing the list is one null.
struct DesignBox {
  const circuit::Arrangement* arrangement = nullptr;
  std::vector<const parts::OutputStage*> output_stages;
  std::vector<const parts::Dropper*> droppers;
  std::vector<const parts::Resistor*> series_resistors;
  std::vector<const parts::Clamp*> clamps;
  std::vector<const parts::Reservoir*> reservoirs;
  std::vector<Chain> discharges;
  std::vector<const parts::Rectifier*> rectifiers;
  std::vector<const parts::Varistor*> varistors;
  std::vector<const parts::Fuse*> fuses;
  std::vector<const parts::Ceramic*> ceramics;
  std::vector<const parts::Thyristor*> thyristors;
  std::vector<const parts::Resistor*> gate_resistors;
};

/// How a bound is known. exact: integer sums. theorem: derived for every member. monotone: the engine at the
/// best corner of the box, inside the range in which a test found every member on the right side.
enum class BoundClass { exact, theorem, monotone };

/// What no member of a box can beat. Absent: no bound is known, so nothing may be concluded.
struct BoxBound {
  std::optional<std::int64_t> cost_micro;      ///< no member is cheaper
  std::optional<double> standby_loss_W;        ///< no member loses less
  std::optional<std::int64_t> board_area_um2;  ///< no member is smaller
  std::optional<double> current_margin_A;      ///< no member has more
  BoundClass standby_class = BoundClass::monotone;
  BoundClass margin_class = BoundClass::theorem;
  /// Only of outlook(), in the order of the table and its supplies: the share of each limit (limit over value
  /// where more is better) that no member stays below.
  std::vector<double> shares;
  /// A check that every member breaks, by its id in the check table; empty: none shown.
  std::string_view broken;
  BoundClass broken_class = BoundClass::theorem;
};

}  // namespace dropfront::scoring
