#include "dropfront/app/problem_files.hpp"

#include <fmt/core.h>

#include <map>
#include <ostream>

#include "dropfront/values/input_error.hpp"

namespace dropfront::app {

std::optional<std::vector<problem::ProblemFile>> read_all(const std::vector<std::string>& paths,
                                                          const std::vector<std::string>& sets,
                                                          std::ostream& err) {
  std::vector<problem::ProblemFile> files;
  std::map<std::string, std::string> path_of_name;
  bool fine = true;
  for (const auto& path : paths) {
    try {
      files.push_back(problem::read_problem_file(path, sets));
    } catch (const values::InputError& error) {
      err << "error: " << error.what() << '\n';
      fine = false;
      continue;
    }
    const auto [same, fresh] = path_of_name.emplace(files.back().name, path);
    if (fresh) continue;
    err << fmt::format("error: {}: its results would go to the same folder '{}' as those of {}; rename one\n",
                       path, files.back().name, same->second);
    fine = false;
  }
  if (!fine) return std::nullopt;
  return files;
}

std::string variation_text(const problem::Variation& variation) {
  std::string text;
  for (const auto& [key, value] : variation)
    text += fmt::format("{}{} = {}", text.empty() ? "" : ", ", key, value);
  return text;
}

}  // namespace dropfront::app
