#pragma once
#include <atomic>

namespace dropfront::app {

/// From the first call on, Ctrl-C (and a polite kill) sets the flag returned instead of ending the program; a
/// second one ends it at once.
const std::atomic<bool>* watch_interrupts();

}  // namespace dropfront::app
