#pragma once
#include <iosfwd>

namespace dropfront::app {

/// Where a command talks: results to `out`, everything else to `err`.
struct Console {
  std::ostream& out;
  std::ostream& err;
  bool colour = false;    ///< `out` is a terminal and NO_COLOR is not set
  bool progress = false;  ///< `err` is a terminal
};

/// Standard output and error as they are now.
Console standard_console();

}  // namespace dropfront::app
