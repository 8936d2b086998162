#pragma once
#include <string_view>

namespace dropfront::values {

/// Kinds of quantity a person may write. The comment gives the unit of the number kept inside.
enum class Unit {
  count,         ///< plain number, no unit
  volt,          ///< V
  ampere,        ///< A
  ohm,           ///< ohm
  farad,         ///< F
  watt,          ///< W
  joule,         ///< J
  second,        ///< s
  hour,          ///< h, for keys that are stated in hours
  hertz,         ///< Hz
  share,         ///< fraction (5 % is 0.05)
  degC,          ///< degrees Celsius, a point on the scale
  kelvin,        ///< K, a difference
  per_kelvin,    ///< fraction per kelvin (-200 ppm/K is -2e-4)
  K_per_W,       ///< K/W
  V_per_s,       ///< V/s
  A2s,           ///< A2s
  square_metre,  ///< m2
  metre,         ///< m
  millimetre,    ///< mm, for keys that are stated in millimetres
  degree         ///< degrees of angle
};

/// "a voltage", "a capacitance": for messages.
std::string_view quantity_name(Unit unit);

/// A text that is accepted for the kind: "230 V", "470 nF".
std::string_view example_text(Unit unit);

}  // namespace dropfront::values
