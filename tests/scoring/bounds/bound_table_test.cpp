// No bound may say more of a box than is true of every member, and each of its directions must matter.
#include "dropfront/scoring/bounds/bound_table.hpp"

#include <algorithm>
#include <cmath>
#include <cstdlib>
#include <map>

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
double overreach(const BoundRule& rule, const BoxQuestion& question, const test::MemberFigures& member,
                 std::optional<double>& tightness) {
  if (rule.limit != nullptr) {
    const auto& use = member.uses[check_index(rule.id)];
    const double bound = rule.limit(question);
    if (!use.known) return 0;
    if (use.share == 0) return bound > 1 ? 1 : 0;  // no rating given, or it does not apply: never broken
    tightness = bound / use.share;
    return (bound - use.share) / use.share;
  }
  const auto bound = rule.objective(question);
  if (!bound) return 0;
  if (rule.id == "current_margin") {
    if (!member.current_margin_A) return 0;
    return (*member.current_margin_A - *bound) / std::max(1e-3, std::abs(*member.current_margin_A));
  }
  const auto& figure = rule.id == "cost"         ? member.cost
                       : rule.id == "board_area" ? member.board_area
                                                 : member.standby_loss_W;
  if (!figure) return 0;
  tightness = *bound / *figure;
  return (*bound - *figure) / *figure;
}

/// Greatest overreach of a rule over boxes, with figures or lists turned round.
struct Turn {
  std::optional<Figure> figure;
  bool lists = false;
};
double worst_overreach(const BoundRule& rule, const std::vector<test::ScoredBox>& boxes, const Turn& turn,
                       std::vector<double>* tightnesses = nullptr) {
  double worst = -1;
  for (const auto& scored : boxes) {
    BoxEnds ends(scored.box, *scored.context);
    if (turn.figure) ends.turn(*turn.figure);
    for (std::size_t s = 0; s < scored.context->supplies.size(); ++s) {
      BoxQuestion question(scored.box, ends, *scored.context, scored.context->supplies[s]);
      question.lists_turned = turn.lists;
      for (const auto& member : scored.members) {
        std::optional<double> tightness;
        worst = std::max(worst, overreach(rule, question, member[s], tightness));
        if (tightness && tightnesses != nullptr) tightnesses->push_back(*tightness);
      }
    }
  }
  return worst;
}

/// Boxes of one arrangement, scored once for all tests.
const std::vector<test::ScoredBox>& boxes_of(const circuit::Arrangement& arrangement) {
  static std::map<std::string_view, std::vector<test::ScoredBox>> made;
  auto& boxes = made[arrangement.name];
  if (boxes.empty()) boxes = test::scored_boxes(arrangement, 60, 8, 20261201);
  return boxes;
}

}  // namespace

TEST_CASE("No bound says more of a box than is true of each of its members") {
  for (const auto& arrangement : circuit::arrangements()) {
    if (!plain_clamped(arrangement)) continue;
    for (const auto& rule : bound_table()) {
      std::vector<double> tightnesses;
      INFO(arrangement.name << " " << rule.id);
      const double worst = worst_overreach(rule, boxes_of(arrangement), {}, &tightnesses);
      CHECK(worst <= kRounding);
      if (std::getenv("SHOW_BOUNDS") != nullptr) {
        std::sort(tightnesses.begin(), tightnesses.end());
        const auto n = tightnesses.size();
        WARN(arrangement.name << " " << rule.id << " worst " << worst << " n " << n << " quartiles "
                              << (n ? tightnesses[n / 4] : 0) << " " << (n ? tightnesses[n / 2] : 0) << " "
                              << (n ? tightnesses[3 * n / 4] : 0) << " max " << (n ? tightnesses[n - 1] : 0));
      }
    }
  }
}
