#pragma once
// How many resonances a rectangular box has, how close they lie, and what their quality factor is.
//
// Sources
//   [Liu]    B.-H. Liu, D. C. Chang, M. T. Ma, Eigenmodes and the composite quality factor of a
//            reverberating chamber, NBS Technical Note 1066, 1983: smooth mode count with the
//            edge term (from memory).
//   [Hill]   D. A. Hill et al., Aperture excitation of electrically large, lossy cavities, IEEE
//            Trans. EMC 36(3), 169-178, 1994: Q1 to Q4 (from memory).
//   [Pozar]  D. M. Pozar, Microwave Engineering, 4th ed., Wiley 2012, section 6.3: TE10l
//            resonator (from memory).

#include <complex>

#include "planner/field/conductor.h"

namespace lossline::field {

/// Inside dimensions of a box [m], each > 0.
struct Box {
  double length = 0, width = 0, height = 0;

  [[nodiscard]] double volume() const { return length * width * height; }
  [[nodiscard]] double surface() const {
    return 2 * (length * width + width * height + height * length);
  }
};

/// Resonances up to a frequency, counted one by one: two polarisations for three non-zero indices,
/// one for exactly one zero.
///
///   frequency  [Hz], > 0
///   throws     Error out_of_range, also for more than about 1e9 modes
///
/// Cost: proportional to the modes of one face, 0.1 ms for two million modes.
long long mode_count(double frequency, const Box& box);

/// Resonances above `from` and not above `to` [Hz].
long long modes_in_band(double from, double to, const Box& box);

/// Smooth mode count 8 pi V f^3/(3 c^3) - (a+b+d) f/c + 1/2 [Liu].
double smooth_mode_count(double frequency, const Box& box);

/// Its derivative, modes per hertz [1/Hz].
double mode_density(double frequency, const Box& box);

/// Resonances within one resonance width, mode density times f/Q. Above about 3 to 5 a field is
/// a mixture of many modes; below 1 it is a single-mode problem.
///
///   Q  loaded quality factor, >= 0; 0 gives infinity
double modal_overlap(double frequency, double length, double width, double height, double Q);

/// Pitch of hot spots in a standing wave, half a free-space wavelength [m]; 61 mm at 2450 MHz.
double hot_spot_pitch(double frequency);

/// Frequency whose hot spots lie `pitch` apart [Hz], the inverse of hot_spot_pitch.
double frequency_of_pitch(double pitch);

/// Quality factor of the walls of a large box, 3 V/(2 mu_r S delta) over the roughness factor
/// ([Hill] Q1).
double wall_quality(double frequency, const Box& box, const Conductor& metal);

/// Of absorbers of cross section sigma [m2], 2 pi V/(lambda sigma) ([Hill] Q2). `sigma` is the
/// mean over all directions of incidence, absorptance times area over 4 for a flat face.
double absorber_quality(double frequency, double volume, double sigma);

/// Of leaks whose cross section sigma [m2] is the mean over the half-space in front of them,
/// 4 pi V/(lambda sigma) ([Hill] Q3).
double leak_quality(double frequency, double volume, double sigma);

/// Of one matched single-mode receiver, 16 pi^2 V/lambda^3 ([Hill] Q4).
double port_quality(double frequency, double volume);

/// Transmission cross section of a round hole, mean over the half-space [Hill]: pi a^2/2 from
/// k a = 1.3 on, (16/(9 pi)) k^4 a^6 below. The two do not meet at the switch.
///
///   radius  [m], > 0
///   returns [m2]
double hole_cross_section(double frequency, double radius);

/// Quality factor of all losses together, 1/sum(1/Q). Infinite ones are allowed.
double joint_quality(double Q1, double Q2, double Q3, double Q4);

/// Mean square of the total field in a volume [V2/m2]: Q P/(2 pi f eps_0 V) [Hill].
double mean_square_field(double frequency, double volume, double Q, double power);

/// A rectangular resonator of broad side `width`, small side `height`, in the TE10l mode.
struct ResonantGuide {
  double width = 0, height = 0, length = 0;  ///< [m]
  int half_waves = 1;                        ///< l
  std::complex<double> filling{1, 0};        ///< eps' - j eps''
};

/// Length that puts the TE10l resonance at a frequency [m].
///
///   frequency   [Hz], above the cut-off of the guide
///   width       broad side [m]
///   half_waves  l, 1 or more
///   filling     eps', >= 1
///   throws      Error out_of_range
double te10l_length(double frequency, double width, int half_waves, double filling = 1);

/// Resonance [Hz].
double te10l_frequency(const ResonantGuide& guide);
/// Quality factor of the walls ([Pozar] eq. 6.46).
double te10l_wall_quality(const ResonantGuide& guide, const Conductor& metal);
/// Unloaded quality factor of walls and filling together.
double te10l_quality(const ResonantGuide& guide, const Conductor& metal);

}  // namespace lossline::field
