#pragma once
// How evenly a belt through a many-mode box is heated across its width.
//
// Method: the power at a spot in a chaotic field is exponentially distributed per polarisation;
// averaging over independent places, frequencies, launchers and cavities divides its variance.
// Sources: D. A. Hill, Electromagnetic Fields in Cavities, Wiley 2009, chapters 7 and 8 (from
//   memory) for the statistics; the sums are own derivations, and the factor 2 to 4 between ideal
//   and real was measured on three-dimensional time-domain solutions of three loaded boxes.

#include <complex>
#include <span>

namespace lossline::field {

/// Real relative spread over the ideal one: 2 for weakly, 4 for strongly absorbing beds, whose
/// direct illumination no mixing evens out.
inline constexpr double real_factor_low = 2;
inline constexpr double real_factor_high = 4;

/// What the average is taken over.
struct UniformityInput {
  double frequency = 0;         ///< [Hz], > 0
  double travel = 0;            ///< heated length of belt in one cavity [m], >= 0
  double quality = 0;           ///< loaded quality factor, >= 0
  double launchers = 1;         ///< effective number of incoherent launchers, >= 1
  double source_bandwidth = 0;  ///< (int P)^2 / int P^2 of the source's spectrum [Hz], >= 0
  double cavities = 1;          ///< effective number of cavities, >= 1
  double polarisations = 2;     ///< independent field components at a spot, 2 (eps' > 4) to 3
};

/// Relative standard deviation across the belt of the heat averaged along it, for a field without
/// any systematic pattern: a lower bound. Multiply by real_factor_low .. real_factor_high.
///
///   returns  1/sqrt(polarisations N_travel N_frequency launchers cavities), 0..1
///   throws   Error out_of_range
double ideal_variation(const UniformityInput& input);

/// Independent places along a travel, 2 L/lambda but at least one.
double independent_places(double frequency, double travel);

/// Independent frequencies within a source's spectrum, 1 + B Q/(pi f).
double independent_frequencies(double frequency, double quality, double bandwidth);

/// Effective number of unequal incoherent sources, (sum P)^2 / sum P^2; 0 for none.
double effective_number(std::span<const double> powers);

/// Width of the strip along each edge of the bed that the side faces heat.
///
///   eps      of the bed
///   returns  1/alpha, at most half the bed's width [m]
///   throws   Error out_of_range
double edge_strip(double frequency, std::complex<double> eps, double bed_width);

}  // namespace lossline::field
