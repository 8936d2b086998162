#include <set>

#include "house/source_tree.hpp"
#include "support/catch.hpp"

namespace dropfront::house {
namespace {

TEST_CASE("no code file is longer than 300 lines and the median is at most 120") {
  std::vector<std::size_t> lengths;
  for (const SourceFile& file : code_in({"include", "src", "tests"})) {
    INFO(file.path << ": " << file.lines.size() << " lines");
    CHECK(file.lines.size() <= 300);
    lengths.push_back(file.lines.size());
  }
  REQUIRE(!lengths.empty());
  std::sort(lengths.begin(), lengths.end());
  CHECK(lengths[lengths.size() / 2] <= 120);
}

TEST_CASE("every header guards itself with the pragma") {
  for (const SourceFile& file : code_in({"include", "src", "tests"})) {
    if (!file.is_header()) continue;
    INFO(file.path);
    CHECK(std::count(file.lines.begin(), file.lines.end(), "#pragma once") == 1);
  }
}

TEST_CASE("the top level holds what the contributor's guide lists and nothing else") {
  const std::set<std::string> listed{
      "CMakeLists.txt", "CMakePresets.json", "README.md", "DEVELOPERS.md", "LICENSE", "src", "include",
      "tests",          "problems",          "results",   "docs",          "build"};
  for (const auto& entry : fs::directory_iterator(top())) {
    const std::string name = entry.path().filename().string();
    INFO(name);
    CHECK((name.starts_with(".") || listed.count(name) == 1));
  }
}

/// Put together here so that this file does not hold the words it looks for.
std::vector<std::string> unfinished_marks() {
  return {std::string("TO") + "DO", std::string("FIX") + "ME", std::string("Appr") + "ox(",
          std::string("Appr") + "ox ("};
}

TEST_CASE("no mark of unfinished work and no hidden-tolerance comparison stands in the tree") {
  const std::vector<std::string> endings{".hpp", ".cpp", ".txt", ".md", ".json", ".csv", ".cmake"};
  std::vector<SourceFile> files;
  for (const std::string folder : {"include", "src", "tests", "problems", "docs", ".ci"}) {
    const auto some =
        files_below(folder, folder == std::string(".ci") ? std::vector<std::string>{""} : endings);
    files.insert(files.end(), some.begin(), some.end());
  }
  for (const std::string name : {"CMakeLists.txt", "CMakePresets.json", "README.md", "DEVELOPERS.md"})
    if (fs::exists(top() / name)) files.push_back(read_file(top() / name));
  REQUIRE(files.size() > 20);
  const auto marks = unfinished_marks();
  for (const SourceFile& file : files)
    for (std::size_t i = 0; i < file.lines.size(); ++i)
      for (const std::string& mark : marks)
        if (file.lines[i].find(mark) != std::string::npos)
          FAIL_CHECK(file.path << ":" << i + 1 << " holds \"" << mark << "\"");
}

}  // namespace
}  // namespace dropfront::house
