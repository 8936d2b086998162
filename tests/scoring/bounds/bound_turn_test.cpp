// Each direction of each bound must matter. Bounds are nested: a box that holds another has no tighter bound.
// A bound that takes the wrong end of anything breaks that on boxes open in the slot that feeds it.
#include <algorithm>
#include <cmath>

#include "dropfront/scoring/bounds/bound_table.hpp"
#include "scoring/bounds/support/box_sample.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// Relative slack for rounding: a few hundred operations in double.
constexpr double kRounding = 1e-11;
/// What the engine's own tolerances leave.
constexpr double kSolved = 1e-6;

/// One thing turned round, or nothing.
struct Turn {
  std::optional<Figure> figure;
  bool lists = false;
};

/// One box and the boxes of its members alone.
struct Nest {
  const BoundContext* context = nullptr;
  DesignBox box;
  std::vector<DesignBox> alone;
};

/// How much tighter, relative, the box's bound is than that of a member alone: > 0 is wrong.
double tighter(const BoundRule& rule, const BoxQuestion& whole, const BoxQuestion& alone) {
  if (rule.limit != nullptr) {
    const double box = rule.limit(whole), member = rule.limit(alone);
    return box <= member ? 0 : member > 0 ? box / member - 1 : 1;
  }
  const auto box = rule.objective(whole), member = rule.objective(alone);
  if (!box || !member) return 0;
  const double sign = rule.id == "current_margin" ? -1 : 1;
  return sign * (*box - *member) / std::max(1e-3, std::abs(*member));
}

double slack_of(const BoundRule& rule) { return rule.depth > 0 ? kSolved : kRounding; }

struct Outcome {
  double worst = -1;     ///< greatest `tighter`
  bool changed = false;  ///< the turn made a bound tighter, well beyond the slack
};

Outcome outcome_of(const BoundRule& rule, const std::vector<Nest>& nests, const Turn& turn) {
  Outcome outcome;
  for (const auto& nest : nests) {
    const BoxEnds straight(nest.box, *nest.context);
    BoxEnds turned = straight;
    if (turn.figure) turned.turn(*turn.figure);
    for (const auto& supply : nest.context->supplies) {
      const BoxQuestion before(nest.box, straight, *nest.context, supply);
      BoxQuestion whole(nest.box, turned, *nest.context, supply);
      whole.lists_turned = turn.lists;
      if (turn.figure || turn.lists) {
        // Second-order turns (what else warms the clamp a little) drown in the engine's tolerances.
        if (!(tighter(rule, whole, before) > 100 * slack_of(rule))) continue;
        outcome.changed = true;
      }
      for (const auto& member : nest.alone) {
        const BoxEnds ends(member, *nest.context);
        const BoxQuestion single(member, ends, *nest.context, supply);
        outcome.worst = std::max(outcome.worst, tighter(rule, whole, single));
      }
    }
  }
  return outcome;
}

/// Boxes open in one slot only, and boxes open in several.
std::vector<Nest> make_nests() {
  std::vector<Nest> nests;
  const values::RandomStream all(77);
  for (std::size_t a = 0; a < circuit::arrangements().size(); ++a) {
    const auto& arrangement = circuit::arrangements()[a];
    if (!plain_clamped(arrangement)) continue;
    for (int i = 0; i < 160; ++i) {
      auto random = all.split(static_cast<std::uint64_t>(i) + 1000 * a);
      Nest nest;
      nest.context = &test::contexts()[static_cast<std::size_t>(i) % test::contexts().size()];
      nest.box = i % 8 == 0 ? test::random_box(arrangement, *nest.context->requirement, 8, random)
                            : test::box_open_in(i % 8 - 1, arrangement, *nest.context->requirement, random);
      for (const auto& member : test::members_of(nest.box)) nest.alone.push_back(test::box_of(member));
      nests.push_back(std::move(nest));
    }
  }
  return nests;
}

}  // namespace

TEST_CASE("A bound on a box is never tighter than on a box within it, and turning any direction shows") {
  const auto nests = make_nests();
  for (const auto& rule : bound_table()) {
    INFO(rule.id << ", depth " << rule.depth);
    CHECK(outcome_of(rule, nests, {}).worst <= slack_of(rule));
    int directions = 0;
    for (int f = -1; f < static_cast<int>(Figure::count); ++f) {
      Turn turn;
      turn.lists = f < 0;
      if (f >= 0) turn.figure = static_cast<Figure>(f);
      const auto outcome = outcome_of(rule, nests, turn);
      if (!outcome.changed) continue;
      ++directions;
      INFO("turned figure " << f);
      CHECK(outcome.worst > slack_of(rule));
    }
    CHECK(directions > 0);
  }
}
