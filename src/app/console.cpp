#include "dropfront/app/console.hpp"

#include <unistd.h>

#include <cstdlib>
#include <iostream>

namespace dropfront::app {

Console standard_console() {
  const char* no_color = std::getenv("NO_COLOR");
  const bool wanted = no_color == nullptr || *no_color == '\0';  // the convention: set and not empty
  return {std::cout, std::cerr, wanted && ::isatty(STDOUT_FILENO) == 1, ::isatty(STDERR_FILENO) == 1};
}

}  // namespace dropfront::app
