#pragma once
#include "dropfront/scoring/bounds/box_question.hpp"

namespace dropfront::scoring {

/// Drops from every list of the box the parts another part of the same list replaces at no loss:
///   - all that the circuit, its temperatures and its life calculations read is identical, so every figure of
///     the score stays to the bit;
///   - price and area (and the height, where one is limited) are no greater;
///   - every rating a check reads is no worse, unless the least rating of the list suffices for every member
///     whatever the others are (the check then passes for both);
///   - it is better in price, area or height, or a rating that counts. Parts equal in all of these stay: they
///     are second sources, and the first of them stays the first.
/// What is not given is given by nothing and replaces nothing that is. Returns the number of parts dropped.
int drop_replaced(DesignBox& box, const BoundContext& context);

}  // namespace dropfront::scoring
