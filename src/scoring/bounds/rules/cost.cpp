#include "dropfront/scoring/bounds/placed.hpp"
#include "dropfront/scoring/bounds/rules.hpp"

namespace dropfront::scoring::bounds {

/// Sum over the slots of the least count·(price + placement cost) any entry of the list places. Exact: the
/// cheapest member when the slots are chosen independently, which in a box they are. A part without a price
/// counts nothing, so that it can discard nothing.
std::optional<double> cost(const BoxQuestion& question) {
  const auto& requirement = *question.context.requirement;
  return least_placed(question, [&](const parts::PartInfo& info, bool) {
    const auto price = parts::price_micro_at(info, requirement.volume);
    return price ? *price + requirement.placement_cost_micro : 0;
  });
}

}  // namespace dropfront::scoring::bounds
