#include "planner/march/pass.h"

#include <fmt/format.h>

#include <limits>

namespace lossline::march {
namespace {

/// Where the nodes of a cavity begin in Iterate::heat, or nothing for other stretches.
std::optional<std::size_t> heat_offset(const Setup& setup, std::size_t stretch) {
  std::size_t offset = 0;
  for (const Cavity& cavity : setup.cavities) {
    if (cavity.stretch == stretch) return offset;
    offset += setup.grid.count[cavity.stretch] + 1;
  }
  return {};
}

/// Where the nodes of a stretch begin in Iterate::counter; each stretch of a counter-flow loop has
/// count + 1 nodes of its own.
std::size_t counter_offset(const Setup& setup, std::size_t stretch) {
  std::size_t offset = 0;
  for (std::size_t loop = 0; loop < setup.line.air.size(); ++loop) {
    if (setup.line.air[loop].pattern != AirPattern::counter) continue;
    for (const std::size_t s : setup.topology.loop_stretches[loop]) {
      if (s == stretch) return offset;
      offset += setup.grid.count[s] + 1;
    }
  }
  return offset;
}

}  // namespace

BeltSystem segment_system(const Setup& setup, const Iterate& z, std::size_t segment) {
  const Segment& cut = setup.grid.segments[segment];
  const std::size_t within = segment - setup.grid.first[cut.stretch];
  BeltSystem system;
  system.material = &setup.material;
  system.around = setup.around[cut.stretch];
  system.speed = setup.flow.speed;
  system.covered_width = setup.covered_width();
  system.x0 = cut.x0;
  system.x1 = cut.x1;
  if (const auto offset = heat_offset(setup, cut.stretch)) {
    system.q0 = z.heat[*offset + within];
    system.q1 = z.heat[*offset + within + 1];
  }
  const std::size_t loop = setup.loop_of[cut.stretch];
  if (loop == Setup::no_loop) {
    system.air0 = {setup.line.room_temperature, setup.line.room_humidity};
    return system;
  }
  system.air0 = z.supply[loop];
  system.air_flow = setup.line.air[loop].dry_air_flow;
  if (setup.line.air[loop].pattern == AirPattern::co) {
    system.mode = AirMode::with_belt;
  } else if (setup.line.air[loop].pattern == AirPattern::counter) {
    system.mode = AirMode::lagged;
    const std::size_t offset = counter_offset(setup, cut.stretch) + within;
    system.air0 = z.counter[offset];
    system.air1 = z.counter[offset + 1];
  }
  return system;
}

Pass march_belt(const Setup& setup, const Iterate& z) {
  const double tolerance = setup.options.step_tolerance;
  constexpr double free = std::numeric_limits<double>::infinity();
  // Absolute floors: 100 J/kg is 0.05 K or so, 1e-4 kg/kg is the last digit anyone weighs.
  const State floor{1e5 * tolerance,  tolerance, tolerance, 1e4 * tolerance,
                    1e-2 * tolerance, free,      free,      free};
  const numerics::StepControl control{tolerance, 100'000};
  Pass pass;
  State y{};
  const Duty& duty = setup.line.duty;
  y[X] = duty.feed_moisture;
  y[alpha] = duty.feed_cure;
  y[E] = bed::enthalpy(setup.material, duty.feed_temperature, y[X], y[alpha]);
  pass.nodes.reserve(setup.grid.nodes());
  pass.nodes.push_back(y);
  // Co-flow air waits here while the belt runs through stretches of other loops.
  std::vector<std::optional<std::array<double, 2>>> carried(setup.line.air.size());
  std::size_t air_loop = Setup::no_loop;
  double h = 0, surface_guess = -1;
  for (std::size_t i = 0; i < setup.grid.segments.size(); ++i) {
    const BeltSystem system = segment_system(setup, z, i);
    system.around.surface_guess = surface_guess;
    const double span = system.x1 - system.x0;
    const std::size_t loop = setup.loop_of[setup.grid.segments[i].stretch];
    if (system.mode == AirMode::with_belt && loop != air_loop) {
      if (air_loop != Setup::no_loop) carried[air_loop] = {y[air_H], y[air_Y]};
      const Air& supply = z.supply[loop];
      const auto start =
          carried[loop].value_or(std::array{water::air_enthalpy(supply.T, supply.Y), supply.Y});
      y[air_H] = start[0];
      y[air_Y] = start[1];
      air_loop = loop;
      pass.nodes.back() = y;
    }
    y[water_out] = y[enthalpy_out] = y[air_heat] = 0;
    if (i == setup.grid.first[setup.grid.segments[i].stretch] || !(h > 0)) h = 0.1 * span;
    const auto outcome =
        numerics::integrate(system, system.x0, system.x1, y, floor, control, h, pass.count);
    if (outcome != numerics::StepOutcome::reached) {
      pass.failure =
          fmt::format("the product could not be carried through {:.3f} to {:.3f} m ({})", system.x0,
                      system.x1, setup.line.stretches[setup.grid.segments[i].stretch].name);
      return pass;
    }
    surface_guess = system.around.surface_guess;
    const double width = setup.covered_width();
    pass.flows.push_back({y[water_out] * width, y[enthalpy_out] * width, y[air_heat] * width});
    pass.nodes.push_back(y);
  }
  return pass;
}

}  // namespace lossline::march
