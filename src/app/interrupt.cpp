#include "dropfront/app/interrupt.hpp"

#include <signal.h>

namespace dropfront::app {

namespace {

std::atomic<bool> interrupted{false};
static_assert(std::atomic<bool>::is_always_lock_free, "only a lock-free flag may be set by a handler");

}  // namespace

const std::atomic<bool>* watch_interrupts() {
  struct sigaction action {};
  action.sa_handler = [](int) { interrupted.store(true); };
  action.sa_flags = SA_RESETHAND | SA_RESTART;
  sigemptyset(&action.sa_mask);
  sigaction(SIGINT, &action, nullptr);
  sigaction(SIGTERM, &action, nullptr);
  return &interrupted;
}

}  // namespace dropfront::app
