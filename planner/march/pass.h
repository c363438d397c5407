#pragma once
// One pass of the product along the belt with heat and air given.

#include <optional>
#include <string>
#include <vector>

#include "planner/march/belt_system.h"
#include "planner/march/setup.h"

namespace lossline::march {

/// The iterated quantities of a solve.
struct Iterate {
  std::vector<double>
      heat;  ///< field heat at the nodes of all cavities, cavity by cavity [W/m2 covered]
  std::vector<Air> supply;   ///< per air loop
  std::vector<Air> counter;  ///< air at the nodes of counter-flow loops, loop by loop
};

/// What one segment exchanged, whole covered width.
struct SegmentFlows {
  double water = 0;     ///< to the air [kg/s]
  double enthalpy = 0;  ///< to the air [W]
  double air_heat = 0;  ///< from the air to the product [W]
};

/// What a pass found.
struct Pass {
  std::vector<State> nodes;         ///< product and co-flow air at every node
  std::vector<SegmentFlows> flows;  ///< per segment
  numerics::StepCount count;
  std::string failure;  ///< empty, or why the stepper gave up and where
};

/// The system of one segment under the given iterate.
[[nodiscard]] BeltSystem segment_system(const Setup& setup, const Iterate& z, std::size_t segment);

/// Marches the product through the whole line.
[[nodiscard]] Pass march_belt(const Setup& setup, const Iterate& z);

}  // namespace lossline::march
