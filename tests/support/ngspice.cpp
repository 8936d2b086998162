#include "support/ngspice.hpp"

#include <sys/wait.h>
#include <unistd.h>

#include <array>
#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <sstream>
#include <stdexcept>

namespace dropfront::support {
namespace {

/// A fresh folder, gone with the object.
class TemporaryFolder {
 public:
  TemporaryFolder() {
    std::string pattern = (std::filesystem::temp_directory_path() / "dropfront-deck-XXXXXX").string();
    if (mkdtemp(pattern.data()) == nullptr) throw std::runtime_error("no temporary folder for ngspice");
    path_ = pattern;
  }
  ~TemporaryFolder() {
    std::error_code ignored;
    std::filesystem::remove_all(path_, ignored);
  }
  TemporaryFolder(const TemporaryFolder&) = delete;
  TemporaryFolder& operator=(const TemporaryFolder&) = delete;
  const std::filesystem::path& path() const { return path_; }

 private:
  std::filesystem::path path_;
};

std::string read_all(const std::filesystem::path& file) {
  std::ifstream in(file);
  std::ostringstream text;
  text << in.rdbuf();
  return text.str();
}

std::string tail(const std::string& text) {
  constexpr std::size_t kShown = 1500;
  return text.size() <= kShown ? text : text.substr(text.size() - kShown);
}

/// Lines of the form `name = value ...`, after the heading of the measurements.
Measures parse_measures(const std::string& output) {
  Measures found;
  const std::size_t heading = output.find("Measurements for Transient Analysis");
  if (heading == std::string::npos) return found;
  std::istringstream lines(output.substr(heading));
  for (std::string line; std::getline(lines, line);) {
    std::istringstream words(line);
    std::string name, equals;
    double value = 0;
    if (words >> name >> equals >> value && equals == "=") found[name] = value;
  }
  return found;
}

}  // namespace

Measures run_ngspice(const std::string& deck) {
  const TemporaryFolder folder;
  std::ofstream(folder.path() / "deck.cir") << deck;
  // HOME inside the folder: nobody's start-up file changes the run.
  const std::string command =
      "cd '" + folder.path().string() + "' && HOME=. ngspice -b deck.cir > output.txt 2>&1 < /dev/null";
  const int status = std::system(command.c_str());
  const std::string output = read_all(folder.path() / "output.txt");
  const int exit_code = WIFEXITED(status) ? WEXITSTATUS(status) : -1;
  if (exit_code == 127)
    throw std::runtime_error("ngspice is not installed; .ci/setup installs it (Debian package ngspice)");
  if (exit_code != 0) throw std::runtime_error("ngspice failed:\n" + tail(output));
  Measures measures = parse_measures(output);
  if (measures.empty()) throw std::runtime_error("ngspice printed no measurement:\n" + tail(output));
  return measures;
}

}  // namespace dropfront::support
