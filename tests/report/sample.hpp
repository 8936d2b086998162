#pragma once
#include <memory>
#include <string>

#include "dropfront/problem/problem.hpp"

namespace dropfront::report {

inline std::string source_path(const std::string& relative) {
  return std::string(DROPFRONT_SOURCE_DIR) + "/" + relative;
}

/// A shipped problem with one of the shipped designs read against it.
struct Sample {
  problem::ProblemFile file;
  scoring::Design design;
  const problem::Problem& problem() const { return file.problems.front(); }
};

inline Sample sample(const std::string& problem, const std::string& design) {
  Sample s{problem::read_problem_file(source_path("problems/" + problem + ".json")), {}};
  s.design =
      problem::read_design_file(source_path("problems/designs/" + design + ".json"), s.file.problems.front());
  return s;
}

}  // namespace dropfront::report
