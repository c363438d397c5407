#include "planner/field/conductor.h"

#include <cmath>

#include "planner/base/constants.h"
#include "planner/field/range.h"

namespace lossline::field {
namespace {

void check(double frequency, const Conductor& metal) {
  frequency_in_range(frequency);
  in_range("wall resistivity", metal.resistivity, "ohm m", 1e-12, 1.0);
  in_range("relative permeability", metal.relative_permeability, "(1)", 1.0, 1e5);
  in_range("roughness factor", metal.roughness_factor, "(1)", 1.0, 100.0);
}

}  // namespace

double skin_depth(double frequency, const Conductor& metal) {
  check(frequency, metal);
  return std::sqrt(metal.resistivity /
                   (pi * frequency * magnetic_constant * metal.relative_permeability));
}

double surface_resistance(double frequency, const Conductor& metal) {
  check(frequency, metal);
  return metal.roughness_factor * std::sqrt(pi * frequency * magnetic_constant *
                                            metal.relative_permeability * metal.resistivity);
}

double wall_cross_section(double frequency, double area, const Conductor& metal) {
  in_range("wall area", area, "m2", 0, largest_length * largest_length);
  return 4.0 / 3 * surface_resistance(frequency, metal) / vacuum_impedance * area;
}

}  // namespace lossline::field
