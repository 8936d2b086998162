#pragma once
#include <memory>

#include "dropfront/problem/problem.hpp"
#include "dropfront/search/box.hpp"

namespace dropfront::problem {

/// Bounds on boxes of a problem's designs, in the terms of bind(): same slots, same options, objectives by
/// position and all minimised. `problem` must outlive the result.
std::unique_ptr<search::Bounder> bind_bounds(const Problem& problem);

}  // namespace dropfront::problem
