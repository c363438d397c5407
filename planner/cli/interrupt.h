#pragma once
// Ctrl-C: the first asks the solve to stop at its next round, the second ends the program.

#include <atomic>

namespace lossline::cli {

/// Starts listening for SIGINT.
///
///   returns  a flag that becomes true with the first one; valid until the program ends
[[nodiscard]] const std::atomic<bool>& watch_interrupt();

}  // namespace lossline::cli
