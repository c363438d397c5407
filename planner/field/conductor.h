#pragma once
// How a good conductor carries a high-frequency current: depth, sheet resistance, and what a wall
// of it takes from a field that comes from all sides.
//
// Sources
//   [Pozar]  D. M. Pozar, Microwave Engineering, 4th ed., Wiley 2012, sections 1.6 and 1.7 (from
//            memory; textbook forms).
//   [Hill]   D. A. Hill et al., Aperture excitation of electrically large, lossy cavities, IEEE
//            Trans. EMC 36(3), 169-178, 1994: Q of the walls, 3V/(2 mu_r S delta).

namespace lossline::field {

/// A smooth or rough metal surface.
struct Conductor {
  double resistivity = 0;            ///< [ohm m], > 0
  double relative_permeability = 1;  ///< 1, >= 1
  double roughness_factor = 1;       ///< loss over the loss of a smooth surface, >= 1
};

/// Depth at which the current density has fallen to 1/e.
///
///   frequency  [Hz], > 0
///   metal      roughness is not used
///   returns    sqrt(rho / (pi f mu_0 mu_r)) [m], micrometres at microwave frequencies
///   throws     Error out_of_range
double skin_depth(double frequency, const Conductor& metal);

/// Surface resistance, roughness included.
///
///   returns    sqrt(pi f mu_0 mu_r rho) times the roughness factor [ohm], about 0.01 to 0.1
///   throws     Error out_of_range
double surface_resistance(double frequency, const Conductor& metal);

/// What a wall takes from an isotropic field of scalar power density S: power = S times this.
///
///   frequency  [Hz], > 0
///   area       of the wall [m2], >= 0
///   returns    (4/3) (Rs/eta_0) area [m2], the same statement as Q = 3V/(2 mu_r S delta) [Hill]
///   throws     Error out_of_range
double wall_cross_section(double frequency, double area, const Conductor& metal);

}  // namespace lossline::field
