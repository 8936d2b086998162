#pragma once
#include <string>
#include <vector>

#include "dropfront/scoring/score.hpp"
#include "dropfront/search/evaluation.hpp"

namespace dropfront::problem {

/// Scores in the search's terms: objectives by position and all minimised, checks by index.
class ScoreView {
 public:
  explicit ScoreView(const scoring::Requirement& requirement);

  /// Cost in currency, standby loss in W, area in mm2, margin in A and negated; NaN where unknown.
  std::vector<double> objectives(const scoring::Objectives& known) const;
  /// Of a score of any depth. Shallow scores: compliant where nothing computed so far fails or is missing.
  search::Evaluation evaluation(const scoring::Score& score) const;
  const std::vector<std::string>& check_names() const { return names_; }

 private:
  int index_of(std::string_view id) const;

  const scoring::Requirement& requirement_;
  std::vector<std::string> names_;
};

}  // namespace dropfront::problem
