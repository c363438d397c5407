#pragma once
// Relative permittivity and conductivity of water with dissolved salt. SI units: frequency in Hz,
// T in K. Convention: eps = eps' - j eps''.
//
// Sources (coefficients read in agreeing copies, not in the papers themselves)
//   [MW04] T. Meissner, F. J. Wentz, IEEE Trans. Geosci. Remote Sens. 42, 1836-1849, 2004: sea
//          salt; conductivity in the form of Stogryn.
//   [P07]  A. Peyman, C. Gabriel, E. H. Grant, "Complex permittivity of sodium chloride
//          solutions at microwave frequencies", Bioelectromagnetics 28, 264-274, 2007 (title and
//          pages from memory), on top of the pure water of Kaatze 1989 (see permittivity.h).
//   [M]    from memory: conductivity of salt solutions rises by 2 % of its value at 25 degC per K.
//
// Every function is pure, safe from any thread, and throws Error out_of_range outside its range and
// for NaN.

#include <complex>

namespace lossline::water {

/// Range of [MW04] with salt: -2 .. 34 degC, 0 .. 40 g salt per kg water, up to 400 GHz.
inline constexpr double sea_salt_T_min = 271.15;
inline constexpr double sea_salt_T_max = 307.15;
inline constexpr double sea_salinity_max = 40.0;

/// Conductivity [S/m] of water with sea salt, salinity in g/kg.
[[nodiscard]] double sea_salt_conductivity(double T, double salinity);

/// [MW04] with sea salt, conduction included; salinity in g/kg.
[[nodiscard]] std::complex<double> salt_water_meissner_wentz(double frequency, double T,
                                                             double salinity);

/// Range of [P07]: 5 .. 35 degC, 0 .. 1 mol/L, 0.13 .. 20 GHz.
inline constexpr double sodium_chloride_T_min = 278.15;
inline constexpr double sodium_chloride_T_max = 308.15;
inline constexpr double sodium_chloride_molarity_max = 1.0;
inline constexpr double sodium_chloride_frequency_min = 0.13e9;
inline constexpr double sodium_chloride_frequency_max = 20e9;

/// Conductivity [S/m] of a sodium chloride solution, molarity in mol/L, [P07].
[[nodiscard]] double sodium_chloride_conductivity(double T, double molarity);

/// [P07], conduction included; molarity in mol/L.
[[nodiscard]] std::complex<double> sodium_chloride_peyman(double frequency, double T,
                                                          double molarity);

/// The same beyond 35 degC, an extrapolation the caller marks: dipoles of pure water by Ellison
/// 2007, conductivity from [P07] at 25 degC raised by 2 % per K [M]; 35 .. 100 degC.
[[nodiscard]] std::complex<double> hot_sodium_chloride(double frequency, double T, double molarity);

}  // namespace lossline::water
