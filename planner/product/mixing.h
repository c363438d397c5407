#pragma once
// Mixing rules: the permittivity of a mixture from its constituents and their shares of volume.
// Convention eps = eps' - j eps'' (time factor exp(+jwt)); principal branches throughout.
//
// A rule without a calibration point is an estimate of the order of magnitude only: at a tenth of
// water by volume the rules below differ by a factor of eight in eps''.
//
// Sources (from memory, except where the formula was seen)
//   [Li26]  K. Lichtenecker, Physikalische Zeitschrift 27, 1926 (logarithmic rule).
//   [Bi74]  J. R. Birchak et al., Proc. IEEE 62, 93-98, 1974 (CRIM, square roots).
//   [Lo65]  H. Looyenga, Physica 31, 401-406, 1965 (cube roots; also Landau and Lifshitz).
//   [MG04]  J. C. Maxwell Garnett 1904; formula seen in two tutorials.
//   [Br35]  D. A. G. Bruggeman 1935, symmetric form; formula seen in two tutorials.
//   [D293]  ASAE/ASABE D293, density correction of grain; exact form from memory.

#include <complex>
#include <span>

namespace lossline::product {

/// One constituent of a mixture.
struct Constituent {
  double share = 0;          ///< of the volume, 0..1
  std::complex<double> eps;  ///< eps' > 0, eps'' >= 0
};

/// Logarithmic rule [Li26]: ln eps = sum v_i ln eps_i.
///
///   parts    shares sum to 1 within 1e-9
///   returns  eps of the mixture
///   throws   Error out_of_range for a share outside 0..1, a wrong sum, eps' <= 0, eps'' < 0, NaN
[[nodiscard]] std::complex<double> lichtenecker(std::span<const Constituent> parts);

/// Power-law family: eps^a = sum v_i eps_i^a. Arguments and refusals as lichtenecker; a in [-1, 1],
/// a = 0 being the logarithmic rule.
[[nodiscard]] std::complex<double> power_law(std::span<const Constituent> parts, double a);

/// Complex refractive index method [Bi74]: a = 1/2.
[[nodiscard]] std::complex<double> crim(std::span<const Constituent> parts);
/// Landau-Lifshitz-Looyenga [Lo65]: a = 1/3.
[[nodiscard]] std::complex<double> looyenga(std::span<const Constituent> parts);
/// Wiener's upper bound, layers along the field: a = 1.
[[nodiscard]] std::complex<double> wiener_upper(std::span<const Constituent> parts);
/// Wiener's lower bound, layers across the field: a = -1.
[[nodiscard]] std::complex<double> wiener_lower(std::span<const Constituent> parts);

/// Maxwell-Garnett [MG04]: spheres of one material scattered in a continuous host.
///
///   host, inclusion  eps of the two
///   share            of the inclusions in the volume, 0..1
[[nodiscard]] std::complex<double> maxwell_garnett(std::complex<double> host,
                                                   std::complex<double> inclusion, double share);

/// Symmetric Bruggeman (Bottcher, Polder-van Santen) [Br35]: sum v_i (eps_i-eps)/(eps_i+2eps) = 0.
/// Fixed point from the logarithmic value, to 1e-13 relative; throws Error internal when 2000
/// rounds do not reach it. Arguments as lichtenecker.
[[nodiscard]] std::complex<double> bruggeman(std::span<const Constituent> parts);

/// Permittivity of a granular bed at another bulk density [D293]: the cube root of eps, less one,
/// goes with density. For a real eps this is the printed form; a complex eps follows [Lo65].
///
///   eps       at density `from`
///   from, to  bulk densities [kg/m3], > 0, same moisture
[[nodiscard]] std::complex<double> at_density(std::complex<double> eps, double from, double to);

}  // namespace lossline::product
