#pragma once
// Rectangular waveguide runs in the TE10 mode: cut-off, wavelength, impedance, loss.
//
// Sources
//   [Pozar]  D. M. Pozar, Microwave Engineering, 4th ed., Wiley 2012, section 3.3: TE10 mode,
//            eq. 3.96 (wall loss), eq. 3.29 (dielectric loss). From memory, textbook forms.
//   [EIA]    EIA RS-261-B and IEC 60153-2 for the standard sections.

#include <complex>
#include <span>

namespace lossline::field {

/// Decibels per neper, 20/ln 10.
inline constexpr double decibels_per_neper = 8.685889638065037;

/// Inside of a guide and what fills it.
struct Guide {
  double width = 0;                    ///< broad side [m], > 0
  double height = 0;                   ///< [m], > 0, not above width
  std::complex<double> filling{1, 0};  ///< eps' - j eps'', eps' >= 1, eps'' >= 0
};

/// A standard section, inside dimensions [m].
struct StandardSection {
  double width, height;
  const char* iec;  ///< IEC 60153-2
  const char* eia;  ///< EIA RS-261-B
};

/// The sections used for 0.9, 2.4 and 5.8 GHz, largest first.
std::span<const StandardSection> standard_sections();

/// Cut-off frequency of the TE10 mode, c/(2 a sqrt(eps')) [Hz].
///
///   width    broad inside dimension [m], > 0
///   filling  eps' >= 1
///   throws   Error out_of_range
double te10_cutoff(double width, double filling = 1);

/// Cut-off frequency of the mode after TE10 (TE20 or TE01) [Hz]. Arguments as te10_cutoff.
double next_cutoff(double width, double height, double filling = 1);

/// Whether TE10 and no other mode propagates.
bool single_mode(double frequency, double width, double height, double filling = 1);

/// Guide wavelength of TE10.
///
///   frequency  [Hz], above the cut-off
///   returns    lambda / sqrt(1 - (fc/f)^2) [m], lambda in the filling
///   throws     Error out_of_range below cut-off, with the cut-off in the message
double guide_wavelength(double frequency, double width, double filling = 1);

/// Wave impedance of TE10 [ohm]. Arguments as guide_wavelength.
double te10_impedance(double frequency, double width, double filling = 1);

/// Wall loss of TE10 in a smooth guide ([Pozar] eq. 3.96). Real guides lose 20 to 50 % more.
///
///   frequency    [Hz], above the cut-off
///   resistivity  of the wall [ohm m]
///   filling      eps' >= 1
///   returns      [dB/m]; 0.0035 for 248 mm aluminium at 915 MHz
///   throws       Error out_of_range
double te10_wall_loss(double frequency, double width, double height, double resistivity,
                      double filling = 1);

/// Loss of TE10 in a lossy filling, k^2 tan(delta) / (2 beta) ([Pozar] eq. 3.29).
///
///   returns  [dB/m]
///   throws   Error out_of_range
double te10_filling_loss(double frequency, const Guide& guide);

/// Loss of a whole run.
///
///   length         [m], >= 0
///   loss_dB_per_m  of the smooth guide, >= 0
///   excess_factor  for joints, bends and roughness, >= 1; 1.2 to 1.5 is common practice
///   returns        [dB]
///   throws         Error out_of_range
double run_loss(double length, double loss_dB_per_m, double excess_factor = 1);

/// Share of the power lost in a run of so many decibels, 1 - 10^(-dB/10).
double lost_share(double decibels);

}  // namespace lossline::field
