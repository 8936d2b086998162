// Members of boxes worked out in full.
#include "dropfront/scoring/board_area.hpp"
#include "dropfront/scoring/check_table.hpp"
#include "dropfront/scoring/cost.hpp"
#include "dropfront/scoring/evidence.hpp"
#include "scoring/bounds/support/box_sample.hpp"

namespace dropfront::scoring::test {

std::vector<MemberFigures> figures_of(const Design& member, const BoundContext& context) {
  std::vector<MemberFigures> by_supply;
  for (const auto& supply : context.supplies) {
    Evidence evidence(member, *context.requirement, *supply.supply, supply.shapes);
    MemberFigures figures;
    if (const auto cost = cost_micro(member, *context.requirement)) figures.cost = static_cast<double>(*cost);
    if (const auto area = board_area_um2(member, *context.requirement)) {
      figures.board_area = static_cast<double>(*area);
    }
    if (evidence.standby_worst().state.usable()) {
      figures.standby_loss_W = evidence.standby_worst().state.input_power_W;
    }
    if (evidence.lean().usable) figures.current_margin_A = evidence.lean().margin_A;
    // Where a corner has no answer, what its check shows is another corner's figure.
    bool solved = evidence.rich_empty().state.usable();
    for (const auto& point : evidence.rich_loads()) solved = solved && point.state.usable();
    for (const auto& rule : check_table()) {
      const auto check = rule.evaluate(evidence);
      Use use;
      if (!solved && rule.tier >= Tier::steady) {
        figures.uses.push_back(use);
        continue;
      }
      if (!check) {
        use.known = true;
      } else if (!check->unsolved) {
        use.known = !check->pass || check->value.has_value();
        if (check->pass && check->value && check->limit) {
          use.share = check->at_most ? *check->value / *check->limit : *check->limit / *check->value;
        }
      }
      figures.uses.push_back(use);
    }
    by_supply.push_back(std::move(figures));
  }
  return by_supply;
}

std::vector<ScoredBox> scored_boxes(const circuit::Arrangement& arrangement, int count, int most_members,
                                    std::uint64_t seed) {
  std::vector<ScoredBox> boxes;
  const values::RandomStream all(seed);
  for (int i = 0; i < count; ++i) {
    auto random = all.split(static_cast<std::uint64_t>(i));
    const auto& context = contexts()[static_cast<std::size_t>(i) % contexts().size()];
    ScoredBox scored;
    scored.context = &context;
    scored.box = random_box(arrangement, *context.requirement, most_members, random);
    for (const auto& member : members_of(scored.box)) scored.members.push_back(figures_of(member, context));
    boxes.push_back(std::move(scored));
  }
  return boxes;
}

}  // namespace dropfront::scoring::test
