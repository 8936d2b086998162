#pragma once

namespace dropfront::app {

/// What the program tells the shell.
enum class ExitStatus {
  done = 0,
  no_design = 1,      ///< a full answer: none complies, or the assessed one does not
  bad_input = 2,      ///< or bad usage; nothing was written
  fault = 3,          ///< disk or internal
  interrupted = 130,  ///< what was found is written
};

}  // namespace dropfront::app
