#include <fmt/format.h>

#include <filesystem>
#include <set>

#include "dropfront/parts/columns.hpp"
#include "dropfront/problem/input_hash.hpp"
#include "dropfront/problem/scalars.hpp"
#include "dropfront/problem/sections.hpp"

namespace dropfront::problem {

void read_parts(const Cursor& folders, const std::string& base, Problem& problem) {
  namespace fs = std::filesystem;
  problem.catalogue = std::make_shared<parts::Catalogue>();
  problem.derived = std::make_shared<DerivedParts>();
  std::set<std::string> seen;
  for (const Cursor& entry : read_one_or_list(folders, "folders of parts lists")) {
    const std::string name = read_text(entry);
    const fs::path path = (fs::path(base) / name).lexically_normal();
    if (!seen.insert(path.string()).second)
      throw entry.error(fmt::format("found the folder \"{}\" twice", name));
    std::error_code fault;
    if (!fs::is_directory(path, fault)) {
      throw entry.error(
          fmt::format("found \"{}\"; there is no such folder (looked for {}, relative to the problem file)",
                      name, path.generic_string()));
    }
    parts::read_parts_folder(path.string(), *problem.catalogue);
    for (const parts::Kind kind : parts::all_kinds) {
      const fs::path file = path / parts::list_file_name(kind);
      if (!fs::is_regular_file(file, fault)) continue;
      problem.inputs.push_back(
          {name + "/" + std::string(parts::list_file_name(kind)), hash_of_file(file.string())});
    }
  }
}

}  // namespace dropfront::problem
