#pragma once
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/scoring/design.hpp"
#include "dropfront/scoring/requirement.hpp"

namespace dropfront::report {

/// Corners a deck can be written for: those of an assessment's `operation`.
const std::vector<std::string>& deck_corners();

/// A simulator deck of one design at one corner, or why there is none.
struct CornerDeck {
  bool usable = false;
  std::string reason;  ///< the corner has no steady state
  std::string text;
};

/// Solves the corner anew, then writes the deck beginning at its steady state, with our figures as comments
/// beside the simulator's measures. `corner` is one of deck_corners().
CornerDeck corner_deck(const std::string& title, const scoring::Design& design,
                       const scoring::Requirement& requirement, const scoring::Supply& supply,
                       std::string_view corner);

}  // namespace dropfront::report
