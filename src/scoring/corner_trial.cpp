#include "dropfront/scoring/corner_trial.hpp"

#include <algorithm>

#include "dropfront/scoring/box_values.hpp"

namespace dropfront::scoring {

namespace {

/// The corner of a box, its ambient at the end where the quantity is worse.
std::vector<double> worse_ambient(const ToleranceBox& box, bool least) {
  std::vector<double> hot = box.corner();
  std::vector<double> cold = hot;
  for (std::size_t k = 0; k < hot.size(); ++k)
    if (box.axes()[k].name == "ambient_degC") cold[k] = 1 - hot[k];
  if (cold == hot) return hot;
  const auto at_hot = box.at(hot), at_cold = box.at(cold);
  if (!at_hot || !at_cold) return hot;
  return (least ? *at_cold < *at_hot : *at_cold > *at_hot) ? cold : hot;
}

}  // namespace

CornerTrial::CornerTrial(const Design& design, const Requirement& requirement, const Supply& supply)
    : design_(design),
      supply_(&supply),
      margin_(design, requirement, supply, BoxQuantity::margin),
      rich_(design, requirement, supply, BoxQuantity::rail),
      standby_(design, requirement, supply, BoxQuantity::standby),
      margin_corner_(worse_ambient(margin_, true)),
      rich_corner_(worse_ambient(rich_, false)),
      standby_corner_(standby_.corner()),
      near_margin_(margin_.lean_at(margin_corner_)) {}

std::vector<double> CornerTrial::placed(const ToleranceBox& box, const std::vector<double>& conditions,
                                        const std::vector<double>& parts) const {
  std::vector<double> position = conditions;
  std::copy_n(parts.begin(), std::min(parts.size(), box.parts()), position.begin());
  return position;
}

BuildFigures CornerTrial::at(const std::vector<double>& parts) const {
  BuildFigures figures;
  const auto set = [&](BoxQuantity quantity, std::optional<double> value) {
    figures[static_cast<std::size_t>(quantity)] = value;
  };
  set(BoxQuantity::margin,
      margin_.at(placed(margin_, margin_corner_, parts), near_margin_.usable ? &near_margin_ : nullptr));
  // Cold starts: an empty rail drifts down to its rest far slower than up to it.
  set(BoxQuantity::standby, standby_.at(placed(standby_, standby_corner_, parts)));
  const OperatingPoint empty = rich_.point_at(placed(rich_, rich_corner_, parts));
  for (const auto quantity :
       {BoxQuantity::rail, BoxQuantity::clamp_power, BoxQuantity::resistor_power, BoxQuantity::input_power})
    set(quantity, box_value(quantity, design_, *supply_, empty));
  return figures;
}

}  // namespace dropfront::scoring
