#pragma once
#include "dropfront/app/console.hpp"
#include "dropfront/app/exit_status.hpp"

namespace dropfront::app {

/// The whole program: reads the arguments, runs the command, turns every error into one message and a status.
ExitStatus run(int argc, const char* const* argv, Console& console);

}  // namespace dropfront::app
