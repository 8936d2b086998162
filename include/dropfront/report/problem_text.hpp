#pragma once
#include <string>
#include <string_view>
#include <vector>

#include "dropfront/problem/problem.hpp"
#include "dropfront/search/space.hpp"

namespace dropfront::report {

/// What a problem asks: mains, output, loads, limits; the defaults filled in with their reasons; the slots.
/// In a study, `before` is a combination already shown: its defaults and cautions are not said again.
std::string problem_text(const problem::Problem& problem, const search::Space& space,
                         const problem::Problem* before = nullptr);

/// One line a slot: how many options, from which value to which.
std::string slots_text(const problem::Problem& problem, const search::Space& space);

/// Every option of one slot with its value, size and price. `slot` as in problem files.
std::string slot_text(const problem::Problem& problem, std::string_view slot);

/// One option of a slot; a slot that may stay empty has one without part.
struct Option {
  std::string name;
  std::string value;
  const parts::PartInfo* info = nullptr;
};
std::vector<Option> slot_options(const problem::Problem& problem, std::string_view slot);

}  // namespace dropfront::report
