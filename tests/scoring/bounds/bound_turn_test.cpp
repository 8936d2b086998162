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

double slack_of(const BoundRule& rule) { return rule.depth > 0 ? kSolved : kRounding; }

/// What a rule says, so that less is looser; absent: nothing.
std::optional<double> say(const BoundRule& rule, const BoxQuestion& question) {
  if (rule.limit != nullptr) {
    const double share = rule.limit(question);
    // Where the engine has no answer it says nothing.
    return rule.depth > 0 && share == 0 ? std::nullopt : std::optional(share);
  }
  const auto bound = rule.objective(question);
  return bound && rule.id == "current_margin" ? std::optional(-*bound) : bound;
}

/// How much tighter one is than another, relative: > 0 is wrong of a box and a member of it.
double tighter(const std::optional<double>& box, const std::optional<double>& member) {
  if (!box || !member || *box <= *member) return 0;
  return (*box - *member) / std::max(1e-3, std::abs(*member));
}

/// A rule asked of one nest on one supply, nothing turned.
struct Asked {
  const Nest* nest;
  const SupplyLines* supply;
  std::optional<double> box;
  std::vector<std::optional<double>> alone;

  double worst(const std::optional<double>& of_box) const {
    double worst = 0;
    for (const auto& member : alone) worst = std::max(worst, tighter(of_box, member));
    return worst;
  }
};

std::vector<Asked> ask(const BoundRule& rule, const std::vector<Nest>& nests) {
  std::vector<Asked> all;
  // The engine's rules cost a thousand times more: fewer boxes, of all kinds alike.
  for (std::size_t n = 0; n<nests.size(); n += rule.depth> 1 ? 5 : 1) {
    for (const auto& supply : nests[n].context->supplies) {
      const auto of = [&](const DesignBox& box) {
        const BoxEnds ends(box, *nests[n].context);
        return say(rule, BoxQuestion(box, ends, *nests[n].context, supply));
      };
      Asked asked{&nests[n], &supply, of(nests[n].box), {}};
      for (const auto& member : nests[n].alone) asked.alone.push_back(of(member));
      all.push_back(std::move(asked));
    }
  }
  return all;
}

struct Outcome {
  double worst = 0;      ///< greatest `tighter` of a turned box against a member
  bool changed = false;  ///< the turn made a bound tighter, well beyond the slack
};

Outcome turned(const BoundRule& rule, const std::vector<Asked>& all, const Turn& turn) {
  Outcome outcome;
  for (const auto& asked : all) {
    const auto& nest = *asked.nest;
    BoxEnds ends(nest.box, *nest.context);
    if (turn.figure) ends.turn(*turn.figure);
    BoxQuestion question(nest.box, ends, *nest.context, *asked.supply);
    question.lists_turned = turn.lists;
    const auto box = say(rule, question);
    // Second-order turns (what else warms the clamp a little) drown in the engine's tolerances.
    if (!(tighter(box, asked.box) > 1000 * slack_of(rule))) continue;
    outcome.changed = true;
    outcome.worst = std::max(outcome.worst, asked.worst(box));
  }
  return outcome;
}

/// Boxes open in one slot only, and boxes open in several.
std::vector<Nest> make_nests() {
  std::vector<Nest> nests;
  const values::RandomStream all(77);
  for (std::size_t a = 0; a < circuit::arrangements().size(); ++a) {
    const auto& arrangement = circuit::arrangements()[a];
    if (!arrangement.dropper) continue;
    for (int i = 0; i < (plain_clamped(arrangement) ? 160 : 120); ++i) {
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
    const auto all = ask(rule, nests);
    for (const auto& asked : all) REQUIRE(asked.worst(asked.box) <= slack_of(rule));
    int directions = 0;
    for (int f = -1; f < static_cast<int>(Figure::count); ++f) {
      Turn turn;
      turn.lists = f < 0;
      if (f >= 0) turn.figure = static_cast<Figure>(f);
      const auto outcome = turned(rule, all, turn);
      if (!outcome.changed) continue;
      ++directions;
      INFO("turned figure " << f);
      CHECK(outcome.worst > slack_of(rule));
    }
    CHECK(directions > 0);
  }
}
