#include "dropfront/app/command_line.hpp"

int main(int argc, char** argv) {
  auto console = dropfront::app::standard_console();
  return static_cast<int>(dropfront::app::run(argc, argv, console));
}
