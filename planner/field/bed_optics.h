#pragma once
// What one place of the bed does to every angle class: heat taken from above and below, what
// passes, and what the two side faces take. Bed on belt, air above and below.
//
// Sources: exact layered response of planner/field/layered.h. The side faces follow the exact slab
//   of the bed's width averaged over its fringes, (1-R)(1-q)/(1-R q) with the power q left after
//   one passage (M. Born, E. Wolf, Principles of Optics, sec. 7.6, from memory): nobody knows the
//   width of a bed to a quarter wavelength.

#include <complex>
#include <cstddef>
#include <vector>

#include "planner/field/angle_classes.h"

namespace lossline::field {

/// One place along the belt.
struct BedSection {
  double frequency = 0;                 ///< [Hz]
  std::complex<double> eps{1, 0};       ///< of the bed, eps' - j eps'', eps' >= 1, eps'' >= 0
  double depth = 0;                     ///< [m], >= 0; 0 = empty belt
  double width = 0;                     ///< of the bed [m], > 0
  std::complex<double> belt_eps{1, 0};  ///< as eps
  double belt_thickness = 0;            ///< [m], >= 0
  double coverage = 1.0;  ///< share of the bed's plan area really covered, 0..1; the rest is belt
};

/// Shares per angle class, mean of both polarisations and of the covered and the bare plan area.
struct BedOptics {
  std::vector<double> bed_top, bed_bottom;    ///< bed, absorptance from above and below, 0..1
  std::vector<double> belt_top, belt_bottom;  ///< belt, from above and below, 0..1
  std::vector<double> transmitted;            ///< through both, the same from above and below
  std::vector<double> side;  ///< mean of |x| a(|x|) over azimuth for a side face, 0..1; |x| is the
                             ///< cosine to the face's normal, a its absorptance
  double depth = 0;          ///< of the bed [m], height of the side faces
};

/// The shares of every class.
///
///   throws  Error out_of_range
///
/// Cost: 12 classes take about 5 us. The layered stack is solved once per class, direction and
/// polarisation; nothing is allocated inside the loop.
BedOptics bed_optics(const AngleClasses& classes, const BedSection& section);

/// Distance from a side face over which its heat is spread.
///
///   eps      of the bed
///   returns  1/alpha with alpha = 2 k0 |Im sqrt(eps)| [m]; infinite without loss
///   throws   Error out_of_range
double side_penetration_depth(double frequency, std::complex<double> eps);

/// Cosine-weighted mean of the bed's absorptance over all directions and both faces, the number
/// that says whether a bed is a strong sink.
///
///   returns  0..1
double mean_bed_absorptance(const AngleClasses& classes, const BedOptics& optics);

/// Refuses a section that bed_optics cannot use. Throws Error out_of_range.
void check_section(const BedSection& section);

}  // namespace lossline::field
