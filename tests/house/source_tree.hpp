// The checkout as text: which files there are and what they include.
#pragma once
#include <algorithm>
#include <filesystem>
#include <fstream>
#include <string>
#include <vector>

namespace dropfront::house {

namespace fs = std::filesystem;

struct SourceFile {
  std::string path;   ///< from the top of the tree, with slashes
  std::string layer;  ///< values, parts, ... for files under include/dropfront and src, else empty
  std::vector<std::string> lines;

  bool is_header() const { return path.ends_with(".hpp"); }
  bool is_source() const { return path.ends_with(".cpp"); }
};

struct Include {
  std::string target;
  bool quoted = false;
};

inline fs::path top() { return fs::path(DROPFRONT_SOURCE_DIR); }

inline SourceFile read_file(const fs::path& file) {
  SourceFile result;
  result.path = fs::relative(file, top()).generic_string();
  for (const std::string root : {"include/dropfront/", "src/"}) {
    if (!result.path.starts_with(root)) continue;
    const std::string rest = result.path.substr(root.size());
    result.layer = rest.substr(0, rest.find('/'));
  }
  std::ifstream in(file);
  for (std::string line; std::getline(in, line);) result.lines.push_back(line);
  return result;
}

/// All files below `folder` whose name ends in one of `endings`, by path.
inline std::vector<SourceFile> files_below(const std::string& folder,
                                           const std::vector<std::string>& endings) {
  std::vector<SourceFile> found;
  if (!fs::exists(top() / folder)) return found;
  for (const auto& entry : fs::recursive_directory_iterator(top() / folder)) {
    const std::string name = entry.path().filename().string();
    const auto fits = [&](const std::string& ending) { return name.ends_with(ending); };
    if (entry.is_regular_file() && std::any_of(endings.begin(), endings.end(), fits))
      found.push_back(read_file(entry.path()));
  }
  std::sort(found.begin(), found.end(),
            [](const SourceFile& a, const SourceFile& b) { return a.path < b.path; });
  return found;
}

/// The code files under `folders`.
inline std::vector<SourceFile> code_in(const std::vector<std::string>& folders) {
  std::vector<SourceFile> all;
  for (const std::string& folder : folders) {
    const auto some = files_below(folder, {".hpp", ".cpp"});
    all.insert(all.end(), some.begin(), some.end());
  }
  return all;
}

inline std::vector<Include> includes_of(const SourceFile& file) {
  std::vector<Include> found;
  for (const std::string& line : file.lines) {
    std::size_t at = line.find_first_not_of(" \t");
    if (at == std::string::npos || line[at] != '#') continue;
    at = line.find_first_not_of(" \t", at + 1);
    if (at == std::string::npos || line.compare(at, 7, "include") != 0) continue;
    const std::size_t open = line.find_first_of("<\"", at + 7);
    if (open == std::string::npos) continue;
    const bool quoted = line[open] == '"';
    const std::size_t close = line.find(quoted ? '"' : '>', open + 1);
    if (close != std::string::npos) found.push_back({line.substr(open + 1, close - open - 1), quoted});
  }
  return found;
}

}  // namespace dropfront::house
