#pragma once
#include <chrono>
#include <ostream>
#include <string>

#include "dropfront/search/search.hpp"

namespace dropfront::app {

/// One line that overwrites itself on a terminal, for anything that takes over a second. Called from one
/// thread. The clock decides what is shown, never what is found.
class ProgressLine {
 public:
  ProgressLine(std::ostream& err, bool enabled, std::string name);
  ~ProgressLine();
  ProgressLine(const ProgressLine&) = delete;
  ProgressLine& operator=(const ProgressLine&) = delete;
  void show(const search::Progress& progress);

 private:
  std::ostream& err_;
  bool enabled_;
  bool shown_ = false;
  std::string name_;
  std::chrono::steady_clock::time_point start_, last_;
};

}  // namespace dropfront::app
