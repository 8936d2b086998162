// Random boxes of designs from the demonstration parts lists, and every member of them scored.
#pragma once
#include <optional>
#include <string_view>
#include <vector>

#include "dropfront/parts/catalogue.hpp"
#include "dropfront/scoring/bounds/bound_context.hpp"
#include "dropfront/scoring/bounds/box.hpp"
#include "dropfront/scoring/requirement.hpp"
#include "dropfront/values/random.hpp"

namespace dropfront::scoring::test {

/// The demonstration parts lists with some odd parts of our own added, made once.
const parts::Catalogue& demo_parts();

/// Requirements to bound against: 230 V and 120 V, warm enclosure or none, given harmonics, two supplies;
/// three output voltages for the three kinds of stage. Invented.
const std::vector<Requirement>& requirements();

/// One context a requirement, of static life.
const std::vector<BoundContext>& contexts();

/// A box with three entries in one slot (0: output stages, 1: droppers, 2: series resistors, 3: clamps,
/// 4: reservoirs, 5: discharge chains, 6: rectifiers) and one in each other.
DesignBox box_open_in(int slot, const circuit::Arrangement& arrangement, const Requirement& requirement,
                      values::RandomStream& random);

/// A box of at most `most_members` members; its output stages are of one kind.
DesignBox random_box(const circuit::Arrangement& arrangement, const Requirement& requirement,
                     int most_members, values::RandomStream& random);

std::vector<Design> members_of(const DesignBox& box);
/// The box that holds one design only.
DesignBox box_of(const Design& design);

/// How far a member is from breaking one check on one supply.
struct Use {
  bool known = false;  ///< false: no answer, nothing to compare with
  double share = 0;    ///< value/limit, or limit/value for ">="; 0: no rating given
};

/// A member's figures, by supply: uses in the order of the check table.
struct MemberFigures {
  std::optional<double> cost, board_area, standby_loss_W, current_margin_A;
  std::vector<Use> uses;
};
std::vector<MemberFigures> figures_of(const Design& member, const BoundContext& context);

/// A box with everything known of its members.
struct ScoredBox {
  const BoundContext* context = nullptr;
  DesignBox box;
  std::vector<std::vector<MemberFigures>> members;  ///< by member, then supply
};
/// `count` boxes of one arrangement, spread over the requirements.
std::vector<ScoredBox> scored_boxes(const circuit::Arrangement& arrangement, int count, int most_members,
                                    std::uint64_t seed);

}  // namespace dropfront::scoring::test
