#include <ostream>

#include "dropfront/app/commands.hpp"
#include "dropfront/app/problem_files.hpp"
#include "dropfront/problem/binding.hpp"
#include "dropfront/report/problem_text.hpp"
#include "dropfront/search/space.hpp"
#include "dropfront/values/input_error.hpp"
#include "dropfront/values/suggest.hpp"

namespace dropfront::app {

namespace {

/// Calls `show` for each problem of a file, a study's combinations under their values.
template <typename Show>
void for_each_problem(const problem::ProblemFile& file, std::ostream& out, const Show& show) {
  for (std::size_t i = 0; i < file.problems.size(); ++i) {
    if (file.study) out << (i == 0 ? "" : "\n") << variation_text(file.variations[i]) << '\n';
    const auto bound = problem::bind(file.problems[i]);
    show(file.problems[i], bound->space());
  }
}

}  // namespace

ExitStatus check_command(const CheckArguments& arguments, Console& console) {
  const auto files = read_all(arguments.problems, arguments.sets, console.err);
  if (!files) return ExitStatus::bad_input;
  for (std::size_t i = 0; i < files->size(); ++i) {
    if (i > 0) console.out << '\n';
    console.out << arguments.problems[i] << ": can be searched\n";
    const problem::Problem& first = (*files)[i].problems.front();
    for_each_problem((*files)[i], console.out, [&](const auto& problem, const auto& space) {
      console.out << report::problem_text(problem, space, &problem == &first ? nullptr : &first);
    });
  }
  return ExitStatus::done;
}

ExitStatus parts_command(const PartsArguments& arguments, Console& console) {
  const auto file = problem::read_problem_file(arguments.problem, arguments.sets);
  for_each_problem(file, console.out, [&](const auto& problem, const search::Space& space) {
    if (!arguments.slot) {
      console.out << report::slots_text(problem, space);
      return;
    }
    std::vector<std::string> known;
    bool found = false;
    for (const auto& slot : space.slots) {
      known.push_back(slot.name);
      found = found || slot.name == *arguments.slot;
    }
    if (!found)
      throw values::InputError(
          arguments.problem, "",
          "no slot '" + *arguments.slot + "'" + values::did_you_mean(*arguments.slot, known));
    console.out << report::slot_text(problem, *arguments.slot);
  });
  return ExitStatus::done;
}

}  // namespace dropfront::app
