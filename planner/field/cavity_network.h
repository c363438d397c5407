#pragma once
// Where the microwave power of a line's cavities goes: a power balance per angle class with two
// volumes per cavity, above and below the belt, all cavities as one linear system.
//
//   (a_U + l + m_U) S_U - l S_L + sum of links = P g(mu) + m_U mean(S_U)        above the belt
//   (a_L + l + m_L) S_L - l S_U                = m_L mean(S_L)                  below
//
// S(mu) is the scalar power density per unit mu, <|E|^2>/eta_0 [W/m2] of that class; an isotropic
// field has the same S in all. A sink of cross section a takes a S. Openings, ports and links act
// on the volume above the belt; what the side faces of the bed take is split evenly.
//
// Sources
//   [Hill]  D. A. Hill et al., Aperture excitation of electrically large, lossy cavities, IEEE
//           Trans. EMC 36(3), 169-178, 1994: the balance of one mixed volume, walls, apertures,
//           and lambda^2/8 pi for a matched receiver.
//   The angle classes are our own extension: flat walls keep mu, so a bare box does not mix. It
//   was held against time-domain field solutions of eight loaded boxes: the bed's share came out
//   0 to 0.04 high, the ratio bed over other sinks 2 to 27 % high (planner/field/validity.h).

#include <cstddef>
#include <span>
#include <vector>

#include "planner/field/angle_classes.h"
#include "planner/field/bed_optics.h"

namespace lossline::field {

/// One cavity. The class sinks are integrated along the belt by add_station; each list is empty
/// (no such sink) or has one number per class.
struct CavityInput {
  double frequency = 0;                      ///< [Hz], > 0
  double length = 0, width = 0, height = 0;  ///< inside [m], > 0
  double belt_height_share = 0.5;            ///< share of the vertical wall below the belt, 0..1
  double bed_width = 0;                      ///< [m], 0 .. width
  double wall_resistivity = 0;               ///< [ohm m], > 0
  double wall_relative_permeability = 1;     ///< >= 1
  double wall_roughness_factor = 1;          ///< loss over that of a smooth wall, >= 1
  int launchers = 1;                         ///< matched single-mode ports, 0 or more
  /// What a radiating port gets back over what an equal idle port receives, 1..2; 2 for a chaotic
  /// field (theory of the orthogonal ensembles: mean |S_ii|^2 = 2 mean |S_ij|^2). Acts only while
  /// power is launched into this cavity.
  double backscatter = 2;
  /// Mixing of directions s, >= 0: 0 a bare box, 0.05 to 0.3 ribs or a stirrer, 1e6 fully mixed.
  double mixing = 0;
  double launched_W = 0;                        ///< enters through the launchers [W], >= 0
  double open_upper_m2 = 0, open_lower_m2 = 0;  ///< cross section of open ends [m2], >= 0
  std::vector<double> bed_top, bed_bottom;      ///< bed, seen from above and below [m2]
  std::vector<double> belt_top, belt_bottom;    ///< belt [m2]
  std::vector<double> bed_side;                 ///< both side faces together [m2]
  std::vector<double> transmitted;              ///< above to below, bed and gaps [m2]
  /// Distribution of the launched power over the classes, integral over mu 1; empty = even.
  std::vector<double> launch;
};

/// A passage between the upper volumes of two cavities; a wave stays in its class.
struct CavityLink {
  std::size_t a = 0, b = 0;
  double sigma_m2 = 0;  ///< [m2], >= 0
};

/// Fields and power of one cavity.
/// launched = bed + belt + walls + returned + ends + links.
struct CavityResult {
  std::vector<double> S_upper, S_lower;       ///< per class [W/m2 per unit mu]
  double S_upper_mean = 0, S_lower_mean = 0;  ///< integral over mu [W/m2]
  double bed_W = 0;                           ///< top + bottom + side
  double bed_top_W = 0, bed_bottom_W = 0, bed_side_W = 0;
  double belt_W = 0;
  double walls_W = 0;
  double returned_W = 0;  ///< into the launchers
  double ends_W = 0;      ///< out of open ends
  double links_W = 0;     ///< net outflow to neighbour cavities
};

struct NetworkResult {
  std::vector<CavityResult> cavities;
  /// Largest |launched - sum of parts| of a cavity over all launched power; rounding only.
  double residual = 0;
};

/// Solves all cavities.
///
///   cavities  any number; those of a link must share their frequency
///   throws    Error out_of_range for a value outside its range or a list that does not fit
///
/// Cost: 6 cavities in a row with 12 classes take about 5 us without and 12 us with mixing.
NetworkResult solve_network(const AngleClasses& classes, std::span<const CavityInput> cavities,
                            std::span<const CavityLink> links);

/// Adds one place of the bed to the sinks of its cavity: faces of the bed's width, two side faces,
/// and the free gap beside the bed. Belt beside the bed is not counted.
///
///   cavity  width and bed_width already set
///   dx      length of belt the place stands for [m], >= 0; a cavity's places sum to its length
///   throws  Error out_of_range
void add_station(CavityInput& cavity, const AngleClasses& classes, const BedOptics& optics,
                 double dx);

/// Heat of the bed at one place per length of belt, with the sums of add_station: the sum of dx
/// times this over the places of a cavity is its bed_W.
///
///   bed_width, depth  as at add_station [m]
///   returns           [W/m]
double bed_heat_per_length(const AngleClasses& classes, const BedOptics& optics,
                           const CavityResult& field, double bed_width, double depth);

/// rms value of the total electric field at scalar power density S.
///
///   S        [W/m2], >= 0
///   returns  sqrt(eta_0 S) [V/m]
double rms_field(double S);

}  // namespace lossline::field
