#include <map>
#include <set>

#include "house/source_tree.hpp"
#include "support/catch.hpp"

namespace dropfront::house {
namespace {

/// Who may include whom: values -> parts -> circuit -> scoring -> problem -> report -> app and
/// values -> search -> problem; skipping forward is fine, backward and sideways is not.
const std::map<std::string, std::set<std::string>>& allowed() {
  static const std::map<std::string, std::set<std::string>> arrows{
      {"values", {}},
      {"parts", {"values"}},
      {"circuit", {"values", "parts"}},
      {"scoring", {"values", "parts", "circuit"}},
      {"search", {"values"}},
      {"problem", {"values", "parts", "circuit", "scoring", "search"}},
      {"report", {"values", "parts", "circuit", "scoring", "search", "problem"}},
      {"app", {"values", "parts", "circuit", "scoring", "search", "problem", "report"}}};
  return arrows;
}

const std::vector<SourceFile>& product() {
  static const std::vector<SourceFile> files = code_in({"include", "src"});
  return files;
}

std::string layer_of_include(const std::string& target) {
  const std::string root = "dropfront/";
  if (!target.starts_with(root)) return {};
  const std::string rest = target.substr(root.size());
  return rest.substr(0, rest.find('/'));
}

bool is_from(const Include& include, const std::vector<std::string>& prefixes) {
  return std::any_of(prefixes.begin(), prefixes.end(),
                     [&](const std::string& prefix) { return include.target.starts_with(prefix); });
}

/// Paths of the files under include/ and src/ that include something beginning with `prefix`.
std::vector<std::string> users_of(const std::vector<std::string>& prefixes) {
  std::vector<std::string> users;
  for (const SourceFile& file : product()) {
    const auto includes = includes_of(file);
    if (std::any_of(includes.begin(), includes.end(), [&](const Include& i) { return is_from(i, prefixes); }))
      users.push_back(file.path);
  }
  return users;
}

TEST_CASE("the tree is found and every file of it belongs to a known layer") {
  REQUIRE(product().size() > 20);
  for (const SourceFile& file : product()) {
    INFO(file.path);
    CHECK(allowed().count(file.layer) == 1);
  }
}

TEST_CASE("an include follows an arrow between layers") {
  for (const SourceFile& file : product()) {
    const auto arrows = allowed().find(file.layer);
    if (arrows == allowed().end()) continue;
    for (const Include& include : includes_of(file)) {
      const std::string target = layer_of_include(include.target);
      if (target.empty()) continue;
      INFO(file.path << " includes " << include.target);
      CHECK((target == file.layer || arrows->second.count(target) == 1));
    }
  }
}

TEST_CASE("a quoted include names a header of the tree, and a private header stays inside its layer") {
  for (const SourceFile& file : product())
    for (const Include& include : includes_of(file)) {
      INFO(file.path << " includes " << include.target);
      const bool is_public = include.target.starts_with("dropfront/");
      CHECK((!is_public || include.quoted));
      if (!include.quoted) continue;
      const fs::path home = is_public ? top() / "include" : (top() / file.path).parent_path();
      const fs::path target = fs::weakly_canonical(home / include.target);
      CHECK(fs::exists(target));
      if (!is_public) CHECK(read_file(target).layer == file.layer);
    }
}

TEST_CASE("slow third-party headers stay out of our headers") {
  for (const std::string& user :
       users_of({"Eigen/", "unsupported/Eigen", "nlohmann/", "tbb/", "oneapi/tbb"})) {
    INFO(user);
    CHECK(user.ends_with(".cpp"));
  }
}

TEST_CASE("the optimiser's header is included by one source file of the search") {
  const auto users = users_of({"nlopt"});
  REQUIRE(users.size() == 1);
  CHECK(users[0].starts_with("src/search/"));
  CHECK(users[0].ends_with(".cpp"));
}

TEST_CASE("the command line library is included by one source file of the app") {
  const auto users = users_of({"CLI/"});
  REQUIRE(users.size() == 1);
  CHECK(users[0].starts_with("src/app/"));
  CHECK(users[0].ends_with(".cpp"));
}

TEST_CASE("what only tests may use is not included by the product") {
  CHECK(users_of({"ngspice/", "pagmo/", "catch2/", "rapidcheck", "boost/", "support/"}).empty());
}

TEST_CASE("tests include Catch through the precompiled header only") {
  for (const SourceFile& file : code_in({"tests"}))
    for (const Include& include : includes_of(file))
      if (include.target.starts_with("catch2/"))
        CHECK((file.path == "tests/support/catch.hpp" || file.path == "tests/support/test_main.cpp"));
}

/// Depth-first walk over public headers; `open` is the path from the root of the walk.
void visit(const std::string& header, const std::map<std::string, std::vector<std::string>>& uses,
           std::vector<std::string>& open, std::set<std::string>& done) {
  if (done.count(header) == 1) return;
  if (std::find(open.begin(), open.end(), header) != open.end()) {
    FAIL_CHECK("header cycle through " << header);
    return;
  }
  const auto found = uses.find(header);
  if (found == uses.end()) return;
  open.push_back(header);
  for (const std::string& next : found->second) visit(next, uses, open, done);
  open.pop_back();
  done.insert(header);
}

TEST_CASE("no header includes itself by a detour") {
  std::map<std::string, std::vector<std::string>> uses;
  for (const SourceFile& file : product())
    if (file.path.starts_with("include/"))
      for (const Include& include : includes_of(file)) uses[file.path.substr(8)].push_back(include.target);
  std::vector<std::string> open;
  std::set<std::string> done;
  for (const auto& entry : uses) visit(entry.first, uses, open, done);
  CHECK(open.empty());
}

}  // namespace
}  // namespace dropfront::house
