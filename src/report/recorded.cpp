#include "dropfront/report/recorded.hpp"

#include <fmt/core.h>

#include <algorithm>
#include <filesystem>

#include "dropfront/problem/document.hpp"
#include "dropfront/problem/keys.hpp"
#include "dropfront/problem/sections.hpp"
#include "dropfront/report/candidates_json.hpp"
#include "dropfront/values/input_error.hpp"
#include "dropfront/values/text_file.hpp"

namespace dropfront::report {

namespace {

namespace fs = std::filesystem;
using problem::Node;

std::string result_file(const std::string& folder) {
  const fs::path path = fs::path(folder) / "candidates.json";
  if (fs::exists(path)) return path.string();
  if (!fs::exists(fs::path(folder) / "study.json"))
    throw values::InputError(folder, "",
                             "not a result folder: it holds neither candidates.json nor study.json");
  std::vector<std::string> names;
  for (const auto& entry : fs::directory_iterator(folder))
    if (entry.is_directory()) names.push_back(entry.path().filename().string());
  std::sort(names.begin(), names.end());
  std::string known;
  for (const auto& name : names) known += fmt::format("{}{}", known.empty() ? "" : ", ", name);
  throw values::InputError(folder, "", fmt::format("this is a study; name one of its folders: {}", known));
}

/// The design of that number on the front or among the extras, or null; `greatest` becomes the last number.
const Node* find_design(const Node& root, int number, int& greatest) {
  for (const char* list : {"front", "extras"}) {
    const Node* entries = root.find(list);
    if (entries == nullptr) continue;
    for (const Node& entry : entries->items) {
      const Node* own = entry.find("number");
      if (own == nullptr) continue;
      greatest = std::max(greatest, static_cast<int>(own->number));
      if (own->number == number) return entry.find("design");
    }
  }
  return nullptr;
}

}  // namespace

Recorded read_recorded(const std::string& folder, int number) {
  const std::string file = result_file(folder);
  const Node root = problem::parse_document(values::read_text_file(file), file);
  const Node* format = root.find("format");
  const Node* asked = root.find("problem");
  if (format == nullptr || format->text != kCandidatesFormat || asked == nullptr)
    throw values::InputError(file, "",
                             fmt::format("not a result of this version (format \"{}\")", kCandidatesFormat));
  int greatest = 0;
  const Node* design = find_design(root, number, greatest);
  if (design == nullptr)
    throw values::InputError(file, "",
                             fmt::format("no candidate {}; the numbers go from 1 to {}", number, greatest));
  Recorded recorded;
  recorded.problem.source = file;
  recorded.problem.catalogue = std::make_shared<parts::Catalogue>();
  recorded.problem.derived = std::make_shared<problem::DerivedParts>();
  problem::ObjectReader reader(problem::Cursor(*asked, file), problem::keys::problem);
  problem::read_asked(reader, recorded.problem);
  recorded.design = problem::read_design(problem::Cursor(*design, file), recorded.problem);
  return recorded;
}

}  // namespace dropfront::report
