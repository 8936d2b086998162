#pragma once
#include <array>

#include "dropfront/scoring/bounds/bound_context.hpp"
#include "dropfront/scoring/bounds/box.hpp"
#include "dropfront/scoring/bounds/clamp_heat.hpp"

namespace dropfront::scoring {

/// Figures of a part (or chain) that bounds take the least or greatest of over a list.
enum class Figure {
  lean_F,           ///< dropper, end of life, low end; the most the lesser of both ambients can leave
  new_F,            ///< dropper, high end, new, over the air temperatures of standby
  rich_F,           ///< dropper, high end, over the temperatures the hot rich corner can reach
  loss_tangent,     ///< of the dropper
  series_low_ohm,   ///< series resistor, low end
  series_high_ohm,  ///< and high end
  chain_low_ohm,    ///< whole discharge chain, low end; infinite: none
  chain_high_ohm,   ///< and high end
  drop_V,           ///< rectifier threshold by its data
  least_drop_V,     ///< and at the least drop of the rich corner
  drop_ohm,         ///< its slope
  new_clamp_V,      ///< threshold of the high clamp curve over the junction temperatures of standby
  rich_clamp_V,     ///< and over the junction temperatures of the hot rich corner
  cold_clamp_V,     ///< the same from the low ambient on
  clamp_ohm,        ///< greatest slope of the clamp
  new_can_F,        ///< reservoir, nominal
  new_can_ohm,      ///< its ESR, nominal
  aged_can_F,       ///< reservoir, least at end of life at the high ambient
  aged_can_ohm,     ///< its ESR then
  required_V,       ///< rail voltage the output stage needs
  leakage_A,        ///< of the reservoir
  count
};

/// Least and greatest of every figure over a box. Costs one pass over the lists; nothing is solved.
class BoxEnds {
 public:
  BoxEnds(const DesignBox& box, const BoundContext& context);

  /// False: a part that every member must have is missing from some members, or the arrangement is one whose
  /// currents these bounds do not know. Only lists may then be judged.
  bool known_circuit() const { return known_circuit_; }
  /// True: every part is there and the arrangement is a thyristor shunt, whose parts are single in the box.
  bool known_shunt() const { return known_shunt_; }
  double least(Figure figure) const { return at(figure).least; }
  double greatest(Figure figure) const { return at(figure).greatest; }
  /// Greatest temperature of the air around the parts in any corner: ambient + enclosure·input power, the
  /// power bounded from above.
  double hottest_air_degC() const { return hottest_air_degC_; }
  /// Greatest line current at any moment of a rich or standby steady state (theorem).
  double peak_A() const { return peak_A_; }
  /// What warms one clamp part in the hot rich corner.
  const ClampHeat& rich_heat() const { return rich_heat_; }

  /// Exchanges least and greatest of one figure: for the tests that show that each direction matters.
  void turn(Figure figure);

 private:
  struct Ends {
    double least, greatest;
  };
  const Ends& at(Figure figure) const { return ends_[static_cast<std::size_t>(figure)]; }
  void take(Figure figure, double least, double greatest);
  void take(Figure figure, double value) { take(figure, value, value); }
  void take_cold_figures(const DesignBox& box, const BoundContext& context);
  void take_air(const DesignBox& box, const BoundContext& context);
  void take_warm_figures(const DesignBox& box, const BoundContext& context);
  void take_standby_figures(const DesignBox& box, const BoundContext& context);

  std::array<Ends, static_cast<std::size_t>(Figure::count)> ends_;
  bool known_circuit_ = false;
  bool known_shunt_ = false;
  double hottest_air_degC_ = 0;
  double standby_air_degC_ = 0;  ///< the same when asleep
  double peak_A_ = 0;
  ClampHeat rich_heat_;
};

/// One of the four arrangements whose currents the bounds are derived for: dropper, rectifiers, a clamp that
/// does nothing but clamp.
bool plain_clamped(const circuit::Arrangement& arrangement);

}  // namespace dropfront::scoring
