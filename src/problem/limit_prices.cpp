#include "dropfront/problem/limit_prices.hpp"

#include <algorithm>
#include <optional>

namespace dropfront::problem {
namespace {

using scoring::Objective;

/// `value`: smaller is better.
struct Point {
  int number;
  double cost, value;
};

std::optional<double> value_of(Objective objective, const scoring::Objectives& of) {
  switch (objective) {
    case Objective::current_margin:
      if (of.current_margin_A) return -*of.current_margin_A;
      break;
    case Objective::standby_loss:
      return of.standby_loss_W;
    case Objective::board_area:
      if (of.board_area_um2) return static_cast<double>(*of.board_area_um2) / 1e6;
      break;
    case Objective::cost:
      break;
  }
  return std::nullopt;
}

double unit_of(Objective objective) {
  if (objective == Objective::current_margin) return 1e-3;
  return objective == Objective::standby_loss ? 0.1 : 100;
}

/// Corners of the lower left hull, from the cheapest on: each cheaper than the next and worse in value.
std::vector<Point> hull_of(std::vector<Point> points) {
  std::sort(points.begin(), points.end(), [](const Point& a, const Point& b) {
    if (a.cost != b.cost) return a.cost < b.cost;
    return a.value != b.value ? a.value < b.value : a.number < b.number;
  });
  std::vector<Point> hull;
  for (const Point& next : points) {
    if (!hull.empty() && !(next.value < hull.back().value)) continue;
    while (hull.size() >= 2) {
      const Point& a = hull[hull.size() - 2];
      const Point& b = hull.back();
      // b stands on or above the straight line from a to next: dearer per gain before it than after.
      const bool above =
          (b.cost - a.cost) * (b.value - next.value) >= (next.cost - b.cost) * (a.value - b.value);
      if (!above) break;
      hull.pop_back();
    }
    hull.push_back(next);
  }
  return hull;
}

}  // namespace

std::vector<LimitPrice> limit_prices(const std::vector<Objective>& asked,
                                     const std::vector<PricedMember>& front) {
  std::vector<LimitPrice> prices;
  const auto is_asked = [&](Objective which) {
    return std::find(asked.begin(), asked.end(), which) != asked.end();
  };
  if (!is_asked(Objective::cost)) return prices;
  for (const auto objective : {Objective::current_margin, Objective::standby_loss, Objective::board_area}) {
    if (!is_asked(objective)) continue;
    std::vector<Point> points;
    for (const auto& member : front) {
      const auto value = value_of(objective, member.objectives);
      if (!value || !member.objectives.cost_micro) continue;
      points.push_back({member.number, static_cast<double>(*member.objectives.cost_micro) / 1e6, *value});
    }
    const auto hull = hull_of(std::move(points));
    LimitPrice price{objective, unit_of(objective), {}};
    for (std::size_t i = 1; i < hull.size(); ++i)
      price.steps.push_back({hull[i - 1].number, hull[i].number, hull[i - 1].value - hull[i].value,
                             hull[i].cost - hull[i - 1].cost});
    if (!price.steps.empty()) prices.push_back(std::move(price));
  }
  return prices;
}

}  // namespace dropfront::problem
