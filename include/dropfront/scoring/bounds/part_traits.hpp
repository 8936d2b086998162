#pragma once
#include <array>
#include <cstdint>

#include "dropfront/scoring/bounds/box_question.hpp"

namespace dropfront::scoring {

/// One entry of a list as far as replacing it goes.
struct PartTraits {
  static constexpr int kMost = 14;
  std::array<double, kMost>
      electrical{};  ///< all that currents, temperatures and life follow: to be identical
  /// More is better, never counted beyond what suffices for every member of the box; NaN: not given.
  std::array<double, kMost> ratings{};
  double price = 0;  ///< of what it places; NaN: not given
  double area = 0;   ///< likewise
};

/// Greatest stresses any member of a box can see: a rating beyond them counts no more. Infinite where no
/// upper bound is known.
struct BoxStress {
  BoxStress(const DesignBox& box, const BoxEnds& ends, const BoundContext& context);
  const BoundContext* context;
  double line_Vrms = 0;  ///< of the rich line
  double pulse_V = 0;    ///< twice its crest; infinite where a surge is asked for
  double series_least_ohm = 0;
  double clamp_W = 0;     ///< (clamp + forward)·mean current
  double chain_Vrms = 0;  ///< line + series drop + what stands behind
  double rail_V = 0;      ///< greatest steady rail, drops counted in
};

PartTraits traits_of(const parts::Dropper* part, const BoxStress& stress);
PartTraits traits_of(const parts::Resistor* part, const BoxStress& stress);
PartTraits traits_of(const parts::Clamp* part, const BoxStress& stress);
PartTraits traits_of(const parts::Reservoir* part, const BoxStress& stress);
PartTraits traits_of(const parts::Rectifier* part, const BoxStress& stress);
PartTraits traits_of(const parts::OutputStage* part, const BoxStress& stress);
PartTraits traits_of(const Chain& chain, const BoxStress& stress);

}  // namespace dropfront::scoring
