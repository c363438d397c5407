#pragma once
// The cavity most field tests share, and the side face as an exact slab.

#include <cmath>
#include <complex>

#include "planner/base/constants.h"
#include "planner/field/bed_optics.h"
#include "planner/field/cavity_network.h"
#include "planner/field/layered.h"

namespace lossline::field::test {

/// 1.2 x 1.0 x 0.8 m, austenitic steel 1.39e6 S/m, bed 0.8 m wide, two launchers, 1 W, closed ends.
inline CavityInput sample_cavity(double frequency = 2450e6) {
  CavityInput c;
  c.frequency = frequency;
  c.length = 1.2;
  c.width = 1.0;
  c.height = 0.8;
  c.bed_width = 0.8;
  c.wall_resistivity = 1 / 1.39e6;
  c.launchers = 2;
  c.launched_W = 1;
  return c;
}

/// 2.5 x 1.6 x 1.4 m for 915 MHz, bed 1.2 m wide, otherwise as sample_cavity.
inline CavityInput large_cavity() {
  CavityInput c = sample_cavity(915e6);
  c.length = 2.5;
  c.width = 1.6;
  c.height = 1.4;
  c.bed_width = 1.2;
  return c;
}

/// A bed on a 3 mm belt of eps 2.6-0.01j (assumed PTFE-glass), as wide as the cavity's bed.
inline BedSection sample_section(const CavityInput& c, std::complex<double> eps, double depth) {
  BedSection s;
  s.frequency = c.frequency;
  s.eps = eps;
  s.depth = depth;
  s.width = c.bed_width;
  s.belt_eps = {2.6, -0.01};
  s.belt_thickness = 0.003;
  return s;
}

/// The side mean of |x| a(|x|) with a the exact absorptance of a slab as thick as the bed is wide,
/// at 16 equally spaced azimuths: what the planner averages over the slab's fringes.
inline void use_exact_sides(const AngleClasses& classes, const BedSection& s, BedOptics& optics) {
  const Layer slab[] = {{s.eps, s.width}};
  for (std::size_t i = 0; i < classes.size(); ++i) {
    double sum = 0;
    for (int k = 0; k < 16; ++k) {
      const double x =
          std::sqrt(1 - classes.mu(i) * classes.mu(i)) * std::cos((k + 0.5) / 16 * pi / 2);
      for (const auto pol : {Polarisation::te, Polarisation::tm})
        sum += x * stack_response(s.frequency, slab, x, pol).absorptance[0] / 2;
    }
    optics.side[i] = sum / 16;
  }
}

/// The cavity filled evenly with one bed and solved.
inline CavityResult solve_even(CavityInput cavity, const AngleClasses& classes,
                               const BedOptics& optics) {
  add_station(cavity, classes, optics, cavity.length);
  return solve_network(classes, {&cavity, 1}, {}).cavities[0];
}

}  // namespace lossline::field::test
