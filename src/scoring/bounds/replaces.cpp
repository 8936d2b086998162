#include "dropfront/scoring/bounds/replaces.hpp"

#include <algorithm>
#include <cmath>

#include "dropfront/scoring/bounds/part_traits.hpp"

namespace dropfront::scoring {

namespace {

/// Which of cost and area a problem asks for: only those make one design better than another.
struct Asked {
  explicit Asked(const Requirement& requirement) {
    for (const auto objective : requirement.objectives) {
      cost = cost || objective == Objective::cost;
      area = area || objective == Objective::board_area;
    }
  }
  bool cost = false, area = false;
};

enum class Order { worse, equal, better };

/// `other` against `part`, more is better; not given against given is worse, whichever way.
Order compare(double other, double part) {
  if (std::isnan(other) && std::isnan(part)) return Order::equal;
  if (!(other >= part)) return Order::worse;
  return other > part ? Order::better : Order::equal;
}

bool replaces(const PartTraits& other, const PartTraits& part, bool earlier, const Asked& asked) {
  if (other.electrical != part.electrical) return false;
  const auto price = compare(-other.price, -part.price);
  const auto area = compare(-other.area, -part.area);
  if (price == Order::worse || area == Order::worse) return false;
  bool better_rating = false;
  for (int k = 0; k < PartTraits::kMost; ++k) {
    const auto rating = compare(other.ratings[k], part.ratings[k]);
    if (rating == Order::worse) return false;
    better_rating = better_rating || rating == Order::better;
  }
  if ((asked.cost && price == Order::better) || (asked.area && area == Order::better)) return true;
  // Equal objectives: the earlier part stands for both, and equal parts stay as second sources.
  return earlier && (better_rating || price == Order::better || area == Order::better);
}

template <class Entry>
void drop_from(std::vector<Entry>& list, const BoxStress& stress, const Asked& asked, int& dropped) {
  if (list.size() < 2) return;
  std::vector<PartTraits> traits;
  traits.reserve(list.size());
  for (const auto& entry : list) traits.push_back(traits_of(entry, stress));
  std::vector<Entry> kept;
  for (std::size_t i = 0; i < list.size(); ++i) {
    bool replaced = false;
    for (std::size_t j = 0; j < list.size() && !replaced; ++j) {
      replaced = j != i && traits[j].electrical[0] == traits[i].electrical[0] &&
                 replaces(traits[j], traits[i], j < i, asked);
    }
    if (!replaced) kept.push_back(list[i]);
  }
  dropped += static_cast<int>(list.size() - kept.size());
  list = std::move(kept);
}

}  // namespace

int drop_replaced(DesignBox& box, const BoundContext& context) {
  const BoxEnds ends(box, context);
  if (!ends.known_circuit() && !ends.known_shunt()) return 0;  // shunts: every rating counts in full
  const BoxStress stress(box, ends, context);
  const Asked asked(*context.requirement);
  int dropped = 0;
  drop_from(box.output_stages, stress, asked, dropped);
  drop_from(box.droppers, stress, asked, dropped);
  drop_from(box.series_resistors, stress, asked, dropped);
  drop_from(box.clamps, stress, asked, dropped);
  drop_from(box.reservoirs, stress, asked, dropped);
  drop_from(box.discharges, stress, asked, dropped);
  drop_from(box.rectifiers, stress, asked, dropped);
  return dropped;
}

}  // namespace dropfront::scoring
