// The steady operating points of an Evidence.
#include "evidence_impl.hpp"

namespace dropfront::scoring {

const OperatingPoint& Evidence::nominal() {
  auto& point = impl_->nominal;
  if (!point) {
    const double ambient_degC = impl_->requirement->surroundings.ambient_degC.nominal;
    point = impl_->points.solve("nominal", nominal_recipe(*impl_->shapes),
                                impl_->heaviest(false, End::nominal), ambient_degC);
    point->ends = kNominalEnds;
  }
  return *point;
}

const OperatingPoint& Evidence::rich_empty() {
  const auto& hot = impl_->rest(true);
  const auto& cold = impl_->rest(false);
  if (!hot.state.usable()) return hot;
  if (!cold.state.usable()) return cold;
  return cold.rail_greatest_V > hot.rail_greatest_V ? cold : hot;
}

const OperatingPoint& Evidence::rich_empty_hot() { return impl_->rest(true); }
const OperatingPoint& Evidence::rich_empty_cold() { return impl_->rest(false); }

const std::vector<OperatingPoint>& Evidence::rich_loads() {
  auto& loads = impl_->rich_loads;
  if (!loads.empty()) return loads;
  constexpr std::array<const char*, 4> kNames{"none", "a third of the heaviest", "two thirds of the heaviest",
                                              ""};
  loads.reserve(kNames.size());
  loads.push_back(impl_->rest(true));
  loads.front().corner = "rich_loaded";
  for (std::size_t i = 1; i < kNames.size(); ++i) {
    const bool last = i + 1 == kNames.size();
    const double share = last ? 1 : static_cast<double>(i) / 3;
    auto load = impl_->rich_share(share, kNames[i]);
    if (last) load.name = impl_->loads.heaviest_name;
    const auto& warm = loads.back();
    loads.push_back(impl_->points.solve("rich_loaded", rich_recipe(*impl_->shapes), load,
                                        impl_->ambient_degC(true), warm.state.usable() ? &warm : nullptr));
    loads.back().ends = rich_ends(impl_->bled());
  }
  return loads;
}

const OperatingPoint& Evidence::rich_loaded() {
  const auto& loads = rich_loads();
  const OperatingPoint* worst = &loads.front();
  for (const auto& point : loads) {
    if (!point.state.usable()) return point;
    if (point.state.input_power_W > worst->state.input_power_W) worst = &point;
  }
  return *worst;
}

const OperatingPoint& Evidence::standby() {
  auto& point = impl_->standby;
  if (!point) {
    point = impl_->points.solve("standby", nominal_recipe(*impl_->shapes), impl_->asleep(End::nominal),
                                kStandby_degC);
    point->ends = kNominalEnds;
  }
  return *point;
}

const OperatingPoint& Evidence::standby_worst() {
  auto& point = impl_->standby_worst;
  if (point) return *point;
  const auto at = [&](End series, const OperatingPoint* warm) {
    auto solved = impl_->points.solve("standby_worst", production_recipe(*impl_->shapes, series),
                                      impl_->worst_asleep(), kStandby_degC, warm);
    solved.ends = production_ends(series, impl_->bled());
    return solved;
  };
  auto high = at(End::high, nullptr);
  if (high.state.usable()) {
    auto low = at(End::low, &high);
    if (!low.state.usable() || low.state.input_power_W > high.state.input_power_W) high = std::move(low);
  }
  point = std::move(high);
  return *point;
}

}  // namespace dropfront::scoring
