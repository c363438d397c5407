#pragma once
// What the program's exit code means; the same numbers stand in its help.

namespace lossline::cli {

inline constexpr int exit_ok = 0;
inline constexpr int exit_beyond = 1;         ///< a limit is beyond, or the solve did not converge
inline constexpr int exit_bad_input = 2;      ///< bad input, bad usage, or the line was refused
inline constexpr int exit_interrupted = 130;  ///< 128 + SIGINT, as shells count it

}  // namespace lossline::cli
