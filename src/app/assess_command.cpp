#include <fmt/core.h>

#include <ostream>

#include "dropfront/app/commands.hpp"
#include "dropfront/app/problem_files.hpp"
#include "dropfront/problem/problem.hpp"
#include "dropfront/report/assess_text.hpp"
#include "dropfront/report/score_json.hpp"
#include "dropfront/values/input_error.hpp"

namespace dropfront::app {

namespace {

problem::Problem& chosen_problem(problem::ProblemFile& file, const AssessArguments& arguments) {
  const int count = static_cast<int>(file.problems.size());
  const int number = arguments.combination.value_or(count == 1 ? 1 : 0);
  if (number >= 1 && number <= count) return file.problems[number - 1];
  std::string known;
  for (int i = 0; i < count; ++i)
    known += fmt::format("{}{} ({})", i == 0 ? "" : ", ", i + 1,
                         file.study ? variation_text(file.variations[i]) : file.title);
  throw values::InputError(
      arguments.problem, "",
      fmt::format("this is a study of {} problems; choose one with --combination: {}", count, known));
}

}  // namespace

ExitStatus assess_command(const AssessArguments& arguments, Console& console) {
  auto file = problem::read_problem_file(arguments.problem, arguments.sets);
  problem::Problem& problem = chosen_problem(file, arguments);
  const scoring::Design design = problem::read_design_file(arguments.design, problem);
  scoring::Score score = scoring::score(design, problem.requirement, scoring::Depth::full);
  if (score.complete) score.faults = scoring::faults_of(design, problem.requirement);
  score.cautions.insert(score.cautions.begin(), problem.cautions.begin(), problem.cautions.end());
  if (arguments.json)
    console.out << report::score_document(design, problem.requirement, score);
  else
    console.out << report::assess_text(problem.title, design, problem.requirement, score,
                                       {arguments.explain, console.colour});
  return score.verdict == scoring::Verdict::compliant ? ExitStatus::done : ExitStatus::no_design;
}

}  // namespace dropfront::app
