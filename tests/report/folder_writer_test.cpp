#include "dropfront/report/folder_writer.hpp"

#include <sys/wait.h>
#include <unistd.h>

#include <fstream>
#include <iterator>

#include "support/catch.hpp"

namespace dropfront::report {
namespace {

namespace fs = std::filesystem;

/// A folder of its own, removed at the end.
struct Sandbox {
  fs::path path;
  Sandbox() {
    std::string name = (fs::temp_directory_path() / "folder_writer_XXXXXX").string();
    REQUIRE(::mkdtemp(name.data()) != nullptr);
    path = name;
  }
  ~Sandbox() { fs::remove_all(path); }
};

std::string content_of(const fs::path& path) {
  std::ifstream file(path, std::ios::binary);
  return {std::istreambuf_iterator<char>(file), {}};
}

std::size_t entries_in(const fs::path& folder) {
  return static_cast<std::size_t>(std::distance(fs::directory_iterator(folder), fs::directory_iterator()));
}

TEST_CASE("files and sub-folders arrive, and nothing is left beside them") {
  const Sandbox box;
  const fs::path folder = box.path / "deep" / "results" / "lamp";
  write_folder(folder,
               {{"study.json", "{}\n"}, {"01-a/candidates.json", "one"}, {"02-b/candidates.json", "two"}});
  CHECK(content_of(folder / "study.json") == "{}\n");
  CHECK(content_of(folder / "02-b" / "candidates.json") == "two");
  CHECK(entries_in(folder) == 3);
  CHECK(entries_in(folder.parent_path()) == 1);
}

TEST_CASE("a result folder is replaced as a whole: no file of the old one survives") {
  const Sandbox box;
  const fs::path folder = box.path / "lamp";
  write_folder(folder, {{"candidates.json", "old"}, {"old.csv", "old"}});
  write_folder(folder, {{"candidates.json", "new"}});
  CHECK(content_of(folder / "candidates.json") == "new");
  CHECK(entries_in(folder) == 1);
  CHECK(entries_in(box.path) == 1);
}

TEST_CASE("an empty folder is taken, one that holds something else is refused and left alone") {
  const Sandbox box;
  fs::create_directory(box.path / "empty");
  CHECK(place_at(box.path / "empty") == Place::free);
  write_folder(box.path / "empty", {{"candidates.json", "x"}});
  CHECK(place_at(box.path / "empty") == Place::result);

  fs::create_directory(box.path / "photos");
  std::ofstream(box.path / "photos" / "cat.txt") << "cat";
  CHECK(place_at(box.path / "photos") == Place::foreign);
  CHECK_THROWS_AS(write_folder(box.path / "photos", {{"candidates.json", "x"}}), DiskFault);
  CHECK(content_of(box.path / "photos" / "cat.txt") == "cat");
  std::ofstream(box.path / "file") << "f";
  CHECK(place_at(box.path / "file") == Place::foreign);
}

TEST_CASE("leftovers of a killed run go with the next; those of a running one stay") {
  const Sandbox box;
  const pid_t child = ::fork();
  if (child == 0) ::_exit(0);
  REQUIRE(::waitpid(child, nullptr, 0) == child);  // reaped: its number belongs to no process now
  const fs::path dead = box.path / (".lamp." + std::to_string(child) + ".partial");
  const fs::path alive = box.path / (".lamp." + std::to_string(::getppid()) + ".partial");
  const fs::path other = box.path / (".heater." + std::to_string(child) + ".partial");
  for (const auto& path : {dead, alive, other}) fs::create_directory(path);
  write_folder(box.path / "lamp", {{"candidates.json", "x"}});
  CHECK_FALSE(fs::exists(dead));
  CHECK(fs::exists(alive));
  CHECK(fs::exists(other));
}

TEST_CASE("a disk that refuses is a fault that names the place, and leaves the old result") {
  const Sandbox box;
  write_folder(box.path / "lamp", {{"candidates.json", "old"}});
  // A file whose folder would have to be the file written just before.
  CHECK_THROWS_AS(write_folder(box.path / "lamp", {{"candidates.json", "new"}, {"candidates.json/x", "y"}}),
                  DiskFault);
  CHECK(content_of(box.path / "lamp" / "candidates.json") == "old");
  CHECK(entries_in(box.path) == 1);
}

}  // namespace
}  // namespace dropfront::report
