#include "app/program.hpp"

#include <fcntl.h>
#include <signal.h>
#include <sys/wait.h>
#include <unistd.h>

#include <algorithm>
#include <array>
#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <iterator>
#include <nlohmann/json.hpp>
#include <sstream>

#include "support/catch.hpp"

namespace dropfront::app {

namespace fs = std::filesystem;

Workshop::Workshop() {
  folder_ = (fs::temp_directory_path() / "dropfront_workshop_XXXXXX").string();
  REQUIRE(::mkdtemp(folder_.data()) != nullptr);
  fs::create_directory_symlink(fs::path(DROPFRONT_SOURCE_DIR) / "problems", fs::path(folder_) / "problems");
  auto problem = nlohmann::ordered_json::parse(read("problems/towel-rail-timer.json"), nullptr, true, true);
  problem["parts"] = {"problems/parts/demo"};
  problem["slots"]["dropper"]["where"]["capacitance"] = {{"min", "390 nF"}, {"max", "560 nF"}};
  problem["slots"]["clamp"]["where"]["voltage"] = {{"min", "8 V"}, {"max", "9.5 V"}};
  problem["effort"] = "quick";  // looks at every design all the same, and takes no sample of builds
  write("small.json", problem.dump());
}

Workshop::~Workshop() { fs::remove_all(folder_); }

std::string Workshop::read(const std::string& relative) const {
  std::ifstream file(path(relative), std::ios::binary);
  return {std::istreambuf_iterator<char>(file), {}};
}

void Workshop::write(const std::string& relative, const std::string& content) const {
  std::ofstream(path(relative), std::ios::binary) << content;
}

bool Workshop::exists(const std::string& relative) const { return fs::exists(path(relative)); }

std::vector<std::string> Workshop::files_below(const std::string& relative) const {
  std::vector<std::string> files;
  for (const auto& entry : fs::recursive_directory_iterator(path(relative)))
    if (entry.is_regular_file()) files.push_back(fs::relative(entry.path(), path(relative)).string());
  std::sort(files.begin(), files.end());
  return files;
}

Finished Workshop::run(const std::string& arguments) const {
  const std::string command =
      "cd '" + folder_ + "' && '" DROPFRONT_PROGRAM "' " + arguments + " >.out 2>.err";
  const int state = std::system(command.c_str());
  return {WIFEXITED(state) ? WEXITSTATUS(state) : -1, read(".out"), read(".err")};
}

Finished Workshop::run_interrupted(const std::vector<std::string>& arguments, const std::string& sign) const {
  std::vector<char*> argv;
  std::string program = DROPFRONT_PROGRAM;
  argv.push_back(program.data());
  std::vector<std::string> copies = arguments;
  for (auto& argument : copies) argv.push_back(argument.data());
  argv.push_back(nullptr);
  std::array<int, 2> ends{};
  REQUIRE(::pipe(ends.data()) == 0);
  const pid_t child = ::fork();
  if (child == 0) {
    const bool ready = ::chdir(folder_.c_str()) == 0 && ::dup2(ends[1], STDOUT_FILENO) >= 0;
    ::close(ends[0]);
    ::close(ends[1]);
    if (ready) ::execv(argv[0], argv.data());
    ::_exit(127);
  }
  ::close(ends[1]);
  Finished finished;
  bool interrupted = false;
  std::array<char, 4096> buffer{};
  for (ssize_t got = 0; (got = ::read(ends[0], buffer.data(), buffer.size())) > 0;) {
    finished.out.append(buffer.data(), static_cast<std::size_t>(got));
    if (!interrupted && finished.out.find(sign) != std::string::npos) {
      ::kill(child, SIGINT);
      interrupted = true;
    }
  }
  ::close(ends[0]);
  int state = 0;
  REQUIRE(::waitpid(child, &state, 0) == child);
  finished.status = WIFEXITED(state) ? WEXITSTATUS(state) : -1;
  return finished;
}

namespace {

TEST_CASE("the program says its name, its commands and its warning") {
  const Workshop shop;
  const auto help = shop.run("--help");
  CHECK(help.status == 0);
  CHECK(help.err.empty());
  for (const char* word :
       {"search", "assess", "check", "parts", "deck", "series", "start", "mains potential"})
    CHECK(help.out.find(word) != std::string::npos);
  CHECK(shop.run("--version").out.starts_with("dropfront "));
}

TEST_CASE("the example in the help of every command works") {
  const Workshop shop;
  for (const std::string command : {"assess", "check", "parts", "series", "start", "search", "deck"}) {
    if (command == "start") {  // into a folder that may be written to
      fs::remove(shop.path("problems"));
      fs::copy(fs::path(DROPFRONT_SOURCE_DIR) / "problems", shop.path("problems"),
               fs::copy_options::recursive);
    }
    const auto help = shop.run(command + " --help");
    REQUIRE(help.status == 0);
    const std::string mark = "Example:\n  dropfront ";
    const auto at = help.out.find(mark);
    REQUIRE(at != std::string::npos);
    const auto first = at + mark.size();
    const std::string example = help.out.substr(first, help.out.find('\n', first) - first);
    INFO(example);
    const auto finished = shop.run(example);
    INFO(finished.err);
    // The bench supply of the example breaks the alarm's limits: a full answer with status 1.
    CHECK(finished.status == (command == "assess" ? 1 : 0));
    CHECK_FALSE(finished.out.empty());
  }
}

TEST_CASE("wrong usage is status 2, with the reason on standard error") {
  const Workshop shop;
  for (const char* arguments :
       {"", "seek problems/leak-alarm.json", "search", "search --effort harder x.json",
        "assess problems/leak-alarm.json", "search --threads 0 problems/leak-alarm.json", "series",
        "series abc", "series 4k7 --in E25", "parts problems/leak-alarm.json --slot clmap",
        "search problems/leak-alarm.json --time soon"}) {
    INFO(arguments);
    const auto finished = shop.run(arguments);
    CHECK(finished.status == 2);
    CHECK(finished.out.empty());
    CHECK_FALSE(finished.err.empty());
  }
  CHECK(shop.run("serch problems/leak-alarm.json").err.find("did you mean 'search'") != std::string::npos);
  CHECK(shop.run("parts problems/leak-alarm.json --slot clmap").err.find("did you mean 'clamp'") !=
        std::string::npos);
}

// Values by the series tables of IEC 60063.
TEST_CASE("series prints the neighbours of a value") {
  const Workshop shop;
  const auto finished = shop.run("series 430n --in E12");
  CHECK(finished.status == 0);
  CHECK(finished.out.find("next lower   390 nF") != std::string::npos);
  CHECK(finished.out.find("nearest      390 nF") != std::string::npos);
  CHECK(finished.out.find("next higher  470 nF") != std::string::npos);
  CHECK(shop.run("series 4k7").out.find("nearest      4.7 kohm") != std::string::npos);
}

TEST_CASE("the start file is accepted as it is, and never written over") {
  const Workshop shop;
  const auto printed = shop.run("start");
  CHECK(printed.status == 0);
  fs::create_directory_symlink(fs::path(DROPFRONT_SOURCE_DIR) / "problems" / "parts", shop.path("parts"));
  CHECK(shop.run("start mine.json").status == 0);
  CHECK(shop.read("mine.json") == printed.out);
  const auto checked = shop.run("check mine.json");
  INFO(checked.err);
  CHECK(checked.status == 0);
  shop.write("mine.json", "mine");
  CHECK(shop.run("start mine.json").status == 2);
  CHECK(shop.read("mine.json") == "mine");
}

TEST_CASE("check of a study says each default once, and its lines fit 100 columns") {
  const Workshop shop;
  const auto finished = shop.run("check problems/sensor-family.json");
  REQUIRE(finished.status == 0);
  const auto first = finished.out.find("limits.start_time");
  REQUIRE(first != std::string::npos);
  CHECK(finished.out.find("limits.start_time", first + 1) == std::string::npos);
  std::istringstream lines(finished.out);
  for (std::string line; std::getline(lines, line);) {
    INFO(line);
    // Bytes of UTF-8 that continue a letter take no column.
    CHECK(std::count_if(line.begin(), line.end(), [](char c) { return (c & 0xC0) != 0x80; }) <= 100);
  }
}

}  // namespace
}  // namespace dropfront::app
