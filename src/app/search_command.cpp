#include <unistd.h>

#include <filesystem>
#include <map>
#include <ostream>

#include "dropfront/app/commands.hpp"
#include "dropfront/app/interrupt.hpp"
#include "dropfront/app/problem_files.hpp"
#include "dropfront/app/progress_line.hpp"
#include "dropfront/problem/binding.hpp"
#include "dropfront/problem/box_binding.hpp"
#include "dropfront/report/candidates_json.hpp"
#include "dropfront/report/cautions.hpp"
#include "dropfront/report/confirm_ranked.hpp"
#include "dropfront/report/explain.hpp"
#include "dropfront/report/folder_writer.hpp"
#include "dropfront/report/make_result.hpp"
#include "dropfront/report/summary_text.hpp"
#include "dropfront/values/input_error.hpp"
#include "dropfront/values/quantity.hpp"

namespace dropfront::app {

namespace {

namespace fs = std::filesystem;

search::Effort effort_of(const std::string& word) {
  if (word == "quick") return search::Effort::quick;
  if (word == "deep") return search::Effort::deep;
  return search::Effort::normal;
}

std::optional<double> time_limit(const SearchArguments& arguments) {
  if (!arguments.time) return std::nullopt;
  try {
    const double seconds = values::parse_quantity(*arguments.time, values::Unit::second);
    if (seconds > 0) return seconds;
  } catch (const values::ParseError& error) {
    throw values::InputError("--time", "", error.what());
  }
  throw values::InputError("--time", "", "found \"" + *arguments.time + "\"; a time above zero is allowed");
}

/// What one search command does with its files, one after the other.
class Run {
 public:
  Run(const SearchArguments& arguments, Console& console)
      : arguments_(arguments), console_(console), time_s_(time_limit(arguments)) {}

  /// True when every result folder may be written: said before the work, not after it.
  bool places_are_free(const std::vector<problem::ProblemFile>& files) {
    bool free = true;
    fs::path there = fs::absolute(arguments_.out).lexically_normal();
    while (!fs::exists(fs::status(there)) && there.has_relative_path()) there = there.parent_path();
    if (!fs::is_directory(there))
      throw report::DiskFault("--out: " + there.string() + " is a file, a folder is wanted");
    if (::access(there.c_str(), W_OK) != 0)
      throw report::DiskFault("--out: " + there.string() + " may not be written to");
    for (const auto& file : files) {
      const fs::path folder = fs::path(arguments_.out) / file.name;
      if (report::place_at(folder) != report::Place::foreign) continue;
      console_.err
          << "error: " << folder.string()
          << ": something other than a result folder stands there; move it or choose another --out\n";
      free = false;
    }
    return free;
  }

  void file(const problem::ProblemFile& file) {
    if (!file.study) {
      const auto result = search(file.problems.front(), file.name);
      if (!result) {
        console_.err << "interrupted: " << file.name << " was not searched\n";
        return;
      }
      write(file.name, report::result_files(*result), report::summary_body(*result));
      return;
    }
    report::Study study{file.name, file.title, DROPFRONT_VERSION, {}, {}};
    std::vector<std::string> cautions;
    for (std::size_t i = 0; i < file.problems.size(); ++i) {
      const auto& problem = file.problems[i];
      cautions.insert(cautions.end(), problem.cautions.begin(), problem.cautions.end());
      const std::string folder = report::combination_folder(static_cast<int>(i) + 1, file.variations[i]);
      study.combinations.push_back({folder, file.variations[i], search(problem, file.name + "/" + folder)});
    }
    study.cautions = report::with_standing_cautions(cautions);
    write(file.name, report::study_files(study), report::study_body(study));
  }

  ExitStatus finish() {
    if (arguments_.json)
      console_.out << report::problems_json(documents_);
    else if (!arguments_.quiet && wrote_)
      console_.out << report::cautions_text(report::with_standing_cautions(cautions_));
    if (*stop_) return ExitStatus::interrupted;
    return none_ ? ExitStatus::no_design : ExitStatus::done;
  }

 private:
  /// Nothing when the run was interrupted before this search began.
  std::optional<report::Result> search(const problem::Problem& problem, const std::string& name) {
    if (*stop_) return std::nullopt;
    search::SearchOptions options;
    options.effort = effort_of(arguments_.effort.value_or(problem.effort));
    options.seed = arguments_.seed.value_or(problem.seed);
    options.threads = arguments_.threads;
    options.top = arguments_.top.value_or(problem.top);
    options.prove = arguments_.prove;
    options.budget = arguments_.budget;
    options.time_s = time_s_;
    options.stop = stop_;
    ProgressLine line(console_.err, console_.progress && !arguments_.quiet, name);
    options.progress = [&line](const search::Progress& progress) { line.show(progress); };
    const auto bound = problem::bind(problem);
    const auto bounds = problem::bind_bounds(problem);
    const auto outcome = search::run_search(*bound, options, bounds.get());
    auto result = report::make_result(*bound, outcome, options, DROPFRONT_VERSION);
    report::confirm_ranked(result, options);
    report::explain(result, *bound, options);
    none_ = none_ || result.front.empty();
    cautions_.insert(cautions_.end(), problem.cautions.begin(), problem.cautions.end());
    if (arguments_.json) documents_.push_back(report::candidates_json(result));
    return result;
  }

  void write(const std::string& name, const std::vector<report::File>& files, const std::string& text) {
    const fs::path folder = fs::path(arguments_.out) / name;
    report::write_folder(folder, files);
    wrote_ = true;
    if (arguments_.json) return;
    if (!arguments_.quiet) console_.out << text << '\n';
    console_.out << "Files: " << folder.string() << "/\n";
    if (!arguments_.quiet) console_.out << '\n';
    console_.out.flush();
  }

  const SearchArguments& arguments_;
  Console& console_;
  std::optional<double> time_s_;
  const std::atomic<bool>* stop_ = watch_interrupts();
  std::vector<std::string> documents_;
  std::vector<std::string> cautions_;
  bool none_ = false;
  bool wrote_ = false;
};

}  // namespace

ExitStatus search_command(const SearchArguments& arguments, Console& console) {
  Run run(arguments, console);
  const auto files = read_all(arguments.problems, arguments.sets, console.err);
  if (!files || !run.places_are_free(*files)) return ExitStatus::bad_input;
  for (const auto& file : *files) run.file(file);
  return run.finish();
}

}  // namespace dropfront::app
