#pragma once
#include <cstdint>

#include "dropfront/problem/conflict.hpp"

namespace dropfront::problem {

/// Whether a design complies with `requirement` in place of the problem's.
struct Feasibility {
  bool found = false;
  bool proven = false;  ///< not found, and none exists
  std::int64_t scored = 0;
};
Feasibility feasible(const Problem& problem, const scoring::Requirement& requirement,
                     const search::SearchOptions& options);

/// The nearest value of one limit at which a design complies with all others, by a search that knows no other
/// aim. Adds to `scored`.
ConflictLimit nearest_value(const Problem& problem, const LimitKnob& knob,
                            const search::SearchOptions& options, std::int64_t& scored);

}  // namespace dropfront::problem
