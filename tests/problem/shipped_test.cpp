// The problems and designs that ship are read whole, without a default that contradicts the lists.
#include <filesystem>

#include "problem/fixture.hpp"
#include "problem/schema_validator.hpp"
#include "support/catch.hpp"

using namespace dropfront;
using problem::testing::Json;
namespace fs = std::filesystem;

namespace {

std::vector<std::string> json_files(const std::string& folder) {
  std::vector<std::string> files;
  for (const auto& entry : fs::directory_iterator(std::string(DROPFRONT_SOURCE_DIR) + folder)) {
    if (entry.path().extension() == ".json") files.push_back(entry.path().string());
  }
  return files;
}

Json parsed(const std::string& path) {
  std::ifstream file(path);
  return Json::parse(file, nullptr, true, true);
}

}  // namespace

TEST_CASE("every shipped problem and design is accepted by reader and schema") {
  const problem::testing::Schemas schemas(std::string(DROPFRONT_SOURCE_DIR) + "/docs");
  const auto problems = json_files("/problems");
  REQUIRE(problems.size() >= 3);
  for (const std::string& path : problems) {
    INFO(path);
    CHECK(schemas.accepts("problem.schema.json", parsed(path)));
    auto file = problem::read_problem_file(path);
    CHECK(file.problems.size() == std::max<std::size_t>(1, file.variations.size()));
    for (const std::string& design : json_files("/problems/designs")) {
      INFO(design);
      CHECK(schemas.accepts("design.schema.json", parsed(design)));
      CHECK(problem::read_design_file(design, file.problems[0]).dropper != nullptr);
    }
  }
}
