#include "planner/cli/interrupt.h"

#include <csignal>

namespace lossline::cli {
namespace {

// A signal handler can reach nothing but a global; lock-free atomics are allowed in one.
std::atomic<bool> interrupted{false};
static_assert(std::atomic<bool>::is_always_lock_free);

extern "C" void on_interrupt(int signal) {
  interrupted.store(true);
  std::signal(signal, SIG_DFL);
}

}  // namespace

const std::atomic<bool>& watch_interrupt() {
  std::signal(SIGINT, on_interrupt);
  return interrupted;
}

}  // namespace lossline::cli
