#include <fmt/format.h>

#include <filesystem>

#include "dropfront/parts/columns.hpp"
#include "dropfront/problem/input_hash.hpp"
#include "dropfront/problem/problem.hpp"
#include "dropfront/problem/scalars.hpp"
#include "dropfront/problem/sections.hpp"
#include "dropfront/problem/study.hpp"
#include "dropfront/values/text_file.hpp"

namespace dropfront::problem {
namespace {

namespace fs = std::filesystem;

/// The file name without .json, every character outside A-Za-z0-9._- as '-'.
std::string safe_name(const std::string& path) {
  fs::path file = fs::path(path).filename();
  if (file.extension() == ".json") file = file.stem();
  std::string name = file.string();
  for (char& c : name) {
    const bool safe = (c >= 'A' && c <= 'Z') || (c >= 'a' && c <= 'z') || (c >= '0' && c <= '9') ||
                      c == '.' || c == '_' || c == '-';
    if (!safe) c = '-';
  }
  return name.find_first_not_of('.') == std::string::npos ? "problem" : name;
}

/// What the lists' columns become where a row leaves them out.
void note_column_defaults(Problem& problem) {
  for (const InputFile& input : problem.inputs) {
    for (const parts::Kind kind : parts::all_kinds) {
      const std::string file(parts::list_file_name(kind));
      if (input.name.size() < file.size() || input.name.substr(input.name.size() - file.size()) != file)
        continue;
      for (const parts::Column& column : parts::columns_of(kind)) {
        if (column.column_class != parts::ColumnClass::property) continue;
        problem.defaults.push_back(
            {input.name + " " + column.name, column.default_text, column.default_reason});
      }
    }
  }
}

Problem read_problem(const Node& root, const std::string& path, const std::string& hash) {
  Problem problem;
  problem.name = safe_name(path);
  problem.source = path;
  problem.text = canonical_json(root);
  problem.inputs.push_back({fs::path(path).filename().string(), hash});
  ObjectReader reader(Cursor(root, path), keys::problem);
  read_asked(reader, problem);
  read_parts(reader.require("parts"), fs::path(path).parent_path().string(), problem);
  read_slots(reader.take_object("slots"), problem);
  reader.finish();
  note_column_defaults(problem);
  return problem;
}

}  // namespace

void read_asked(ObjectReader& reader, Problem& problem) {
  reader.take("$schema");  // for editors
  problem.title = read_text(reader.require("title"));
  read_mains(reader.require("mains"), problem);
  read_output(reader.require("output"), problem);
  read_surroundings(reader.take_object("surroundings"), problem);
  read_connection(reader.take_object("connection"), problem);
  read_limits(reader.take_object("limits"), problem);
  read_derating(reader.take_object("derating"), problem);
  read_settings(reader, problem);
}

ProblemFile read_problem_file(const std::string& path, const std::vector<std::string>& sets) {
  const std::string text = values::read_text_file(path);
  Node root = parse_document(text, path);
  for (const std::string& assignment : sets) apply_set(root, assignment, path);
  const std::string hash = hash_of_file(path);
  ProblemFile file;
  for (const Combination& combination : expand_study(root, path)) {
    file.problems.push_back(read_problem(combination.root, path, hash));
    file.study = file.study || !combination.variation.empty();
    file.variations.push_back(combination.variation);
  }
  if (!file.study) file.variations.clear();
  file.name = file.problems.front().name;
  file.title = file.problems.front().title;
  return file;
}

}  // namespace dropfront::problem
