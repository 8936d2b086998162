#pragma once
#include <optional>
#include <string>
#include <vector>

#include "dropfront/report/result.hpp"

namespace dropfront::report {

/// One problem of a study. Without a result: not searched, the run was interrupted before.
struct Combination {
  std::string folder;  ///< inside the study's own
  problem::Variation values;
  std::optional<Result> result;
};

/// A problem file with `vary`, searched combination by combination.
struct Study {
  std::string name;
  std::string title;
  std::string version;
  std::vector<Combination> combinations;
  std::vector<std::string> cautions;
};

/// "01-3.3-V": number from 1 and the values, characters other than A-Z a-z 0-9 . _ - turned to '-'.
std::string combination_folder(int number, const problem::Variation& values);

/// The least (for the margin: greatest) value of an objective on the front. Absent: no front, or unknown.
std::optional<double> best_on_front(const Result& result, scoring::Objective objective);

/// study.json: format, title, name, combinations (folder, values, status, front, best), cautions.
std::string study_json(const Study& study);

/// study.csv: folder, one column a varied key, status, front, then the best of each objective.
std::string study_csv(const Study& study);

/// The study across its combinations for people, then the cheapest design of each.
std::string study_text(const Study& study);
std::string study_body(const Study& study);  ///< the same without the cautions

}  // namespace dropfront::report
