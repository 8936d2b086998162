#pragma once
#include <memory>

#include "dropfront/problem/problem.hpp"
#include "dropfront/search/evaluation.hpp"

namespace dropfront::problem {

/// Where search and scoring meet: a problem seen as slots and options, scored by scoring::score.
/// Slot order: arrangement, output_stage, dropper, series_resistor, clamp, reservoir, discharge, rectifier,
/// varistor, fuse, ceramic, thyristor, gate_resistor (slots that offer nothing are left out).
class BoundProblem : public search::Evaluator {
 public:
  virtual scoring::Design design(const search::Choice& choice) const = 0;
  virtual const Problem& problem() const = 0;
};

/// `problem` must outlive the result.
std::unique_ptr<BoundProblem> bind(const Problem& problem);

}  // namespace dropfront::problem
