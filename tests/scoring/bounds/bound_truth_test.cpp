// No bound may say more of a box than is true of every member: random boxes of the demonstration parts, every
// member worked out in full.
#include <algorithm>
#include <cmath>

#include "dropfront/scoring/bounds/bound_table.hpp"
#include "dropfront/scoring/check_table.hpp"
#include "scoring/bounds/support/box_sample.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using namespace dropfront::scoring;

namespace {

/// Relative slack for rounding: a few hundred operations in double.
constexpr double kRounding = 1e-9;

std::size_t check_index(std::string_view id) {
  const auto& table = check_table();
  const auto it = std::find_if(table.begin(), table.end(), [&](const CheckRule& r) { return r.id == id; });
  return static_cast<std::size_t>(it - table.begin());
}

/// How far a rule's bound stands on the wrong side of a member, relative; <= 0: it holds.
double overreach(const BoundRule& rule, const BoxQuestion& question, const test::MemberFigures& member) {
  if (rule.limit != nullptr) {
    const auto& use = member.uses[check_index(rule.id)];
    const double bound = rule.limit(question);
    if (!use.known || bound <= use.share) return 0;
    if (use.share == 0) return bound > 1 ? 1 : 0;  // no rating given, or it does not apply: never broken
    return (bound - use.share) / use.share;
  }
  const auto bound = rule.objective(question);
  if (rule.id == "current_margin") {
    if (!bound || !member.current_margin_A) return 0;
    return (*member.current_margin_A - *bound) / std::max(1e-3, std::abs(*member.current_margin_A));
  }
  const auto& figure = rule.id == "cost"         ? member.cost
                       : rule.id == "board_area" ? member.board_area
                                                 : member.standby_loss_W;
  return bound && figure ? (*bound - *figure) / *figure : 0;
}

void require_true(const circuit::Arrangement& arrangement, int boxes, int most_members, std::uint64_t seed) {
  for (const auto& scored : test::scored_boxes(arrangement, boxes, most_members, seed)) {
    const BoxEnds ends(scored.box, *scored.context);
    for (std::size_t s = 0; s < scored.context->supplies.size(); ++s) {
      const BoxQuestion question(scored.box, ends, *scored.context, scored.context->supplies[s]);
      for (const auto& rule : bound_table()) {
        for (const auto& member : scored.members) {
          INFO(arrangement.name << " " << rule.id << ", seed " << seed);
          REQUIRE(overreach(rule, question, member[s]) <= kRounding);
        }
      }
    }
  }
}

}  // namespace

TEST_CASE("No bound says more of a box than is true of each of its members") {
  for (const auto& arrangement : circuit::arrangements()) {
    if (!arrangement.dropper) continue;
    require_true(arrangement, plain_clamped(arrangement) ? 60 : 40, 4, 20261201);
  }
}

TEST_CASE("Ten thousand boxes an arrangement: no bound says more than is true of each member", "[.long]") {
  for (std::uint64_t part = 0; part < 100; ++part) {
    for (const auto& arrangement : circuit::arrangements()) {
      if (arrangement.dropper) require_true(arrangement, 100, 8, 1000 + part);
    }
  }
}
