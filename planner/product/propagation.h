#pragma once
// How a plane wave enters a product, fades in it and heats it. All fields are rms; every depth is
// a depth of power, 1/e unless it says otherwise (the depth of the field is twice as long).
//
// Sources: textbook plane-wave relations, as in A. C. Metaxas, R. J. Meredith, Industrial
// Microwave Heating, Peter Peregrinus 1983 (from memory; the forms were seen in two reviews).

#include <complex>

namespace lossline::product {

/// Attenuation constant of the field.
///
///   eps        eps' - j eps'', eps' > 0, eps'' >= 0
///   frequency  [Hz], > 0
///   returns    alpha [Np/m], 0 when eps'' = 0
///   throws     Error out_of_range
[[nodiscard]] double attenuation_constant(std::complex<double> eps, double frequency);

/// Depth at which the power has fallen to 1/e, 1/(2 alpha) [m]; infinite when eps'' = 0.
/// Arguments as attenuation_constant.
[[nodiscard]] double penetration_depth(std::complex<double> eps, double frequency);

/// The same for small loss, c sqrt(eps')/(2 pi f eps'') [m]; short by less than 1 % for
/// tan delta < 0.28. For comparison with papers that use it; Lossline itself uses the exact form.
[[nodiscard]] double penetration_depth_low_loss(std::complex<double> eps, double frequency);

/// Depth at which half the power is left, ln 2 times the 1/e depth [m].
[[nodiscard]] double half_power_depth(std::complex<double> eps, double frequency);

/// Heat per volume, 2 pi f eps0 eps'' E^2.
///
///   frequency  [Hz], > 0
///   loss       eps'', >= 0
///   field_rms  in the product [V/m], >= 0
///   returns    [W/m3]
[[nodiscard]] double volumetric_power(double frequency, double loss, double field_rms);

/// Share of the power of a wave from air that enters a half-space at normal incidence, 0..1.
[[nodiscard]] double surface_transmission(std::complex<double> eps);

}  // namespace lossline::product
