#pragma once
// The one solver of Lossline: carries the product through a line and returns where the power
// goes, what the product and the air become, and how well the balances close.
//
// Method (level mean): the unknowns are the heat from the field at the stations of every cavity,
// the supply state of every air loop, and the air along counter-flow stretches. One round marches
// the product with these given, evaluates what every station would absorb, solves all cavities as
// one linear system, updates the air loops, and accelerates (Anderson). The heat of a station is
// given inside a round, not the field: a cavity hands its power to the product almost whatever
// the state, so this map contracts strongly even where the loss factor runs away.

#include <atomic>
#include <string>
#include <vector>

#include "planner/line/line.h"
#include "planner/march/solution.h"
#include "planner/product/card.h"

namespace lossline {

/// Choices of one solve.
struct SolveOptions {
  Level level = Level::mean;
  double tolerance = 1e-7;  ///< on the iterated quantities, relative
  /// Of the product's stepper, relative. Looser than 1e-6 its noise keeps the rounds from settling.
  double step_tolerance = 1e-6;
  std::size_t cavity_segments = 8;  ///< stations per cavity, less one
  std::size_t other_segments = 6;   ///< the same for other stretches
  int most_rounds = 120;
  bool estimate_band = true;                ///< solve the ends of an estimated permittivity too
  const std::atomic<bool>* stop = nullptr;  ///< set from outside: return what there is
};

/// Solves a line.
///
///   line     as read; problems the reader refuses must not be present
///   card     the product, overrides already applied
///   options  see SolveOptions
///   returns  a Solution whose status says how it ended; refused carries the reason (an
///            impossible topology, no permittivity, a contradiction in the flow)
///   throws   Error when an input lies outside what a model allows at all
/// Pure function: no globals, any number of threads.
[[nodiscard]] Solution solve(const Line& line, const ProductCard& card,
                             const SolveOptions& options = {});

}  // namespace lossline
