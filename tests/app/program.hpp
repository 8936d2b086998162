#pragma once
#include <string>
#include <vector>

namespace dropfront::app {

/// What one run of the real program left behind.
struct Finished {
  int status = -1;  ///< exit status; -1: ended by a signal
  std::string out, err;
};

/// A folder of its own with the shipped problems in it and `small.json`, the shipped timer with few enough
/// parts to look at every design. Removed at the end. Commands run inside it.
class Workshop {
 public:
  Workshop();
  ~Workshop();
  Workshop(const Workshop&) = delete;
  Workshop& operator=(const Workshop&) = delete;

  /// Runs the program with a line of arguments as a shell would take them.
  Finished run(const std::string& arguments) const;
  /// Starts it, interrupts it (Ctrl-C) once `sign` stands in its standard output, waits for its end.
  Finished run_interrupted(const std::vector<std::string>& arguments, const std::string& sign) const;

  std::string path(const std::string& relative) const { return folder_ + "/" + relative; }
  std::string read(const std::string& relative) const;
  void write(const std::string& relative, const std::string& content) const;
  bool exists(const std::string& relative) const;
  /// All regular files below a folder, relative to it, sorted.
  std::vector<std::string> files_below(const std::string& relative) const;

 private:
  std::string folder_;
};

}  // namespace dropfront::app
