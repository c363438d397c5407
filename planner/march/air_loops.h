#pragma once
// The air side of a round: exhaust, recycle, heater and the next supply state of every loop, and
// the air along counter-flow stretches.

#include <vector>

#include "planner/march/pass.h"

namespace lossline::march {

/// Supply states, counter-flow profiles and the balances of all loops for one pass.
struct AirRound {
  std::vector<Air> supply;         ///< next guess, per loop
  std::vector<Air> counter;        ///< next guess, as Iterate::counter
  std::vector<AirReport> reports;  ///< per loop, with the states of this pass
};

/// The first guess: every loop at its supply temperature and fresh humidity.
[[nodiscard]] Iterate first_air(const Setup& setup);

/// Evaluates all loops after a pass that ran with `z`.
[[nodiscard]] AirRound solve_air(const Setup& setup, const Iterate& z, const Pass& pass);

}  // namespace lossline::march
