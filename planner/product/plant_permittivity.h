#pragma once
// Permittivity of plant tissue and grain by published equations: leaves, fresh fruit and
// vegetables, hard red winter wheat. Moisture is WET basis here, as the sources have it.
//
// Sources
//   [UE87]  F. T. Ulaby, M. A. El-Rayes, IEEE Trans. Geosci. Remote Sens. GE-25, 1987,
//           doi 10.1109/TGRS.1987.289833, eqs. 8, 14-17; seen in one copy.
//   [SB03]  O. Sipahioglu, S. A. Barringer, J. Food Sci. 68, 2003, as reprinted in T. Gulati,
//           A. K. Datta, J. Food Eng. 116, 483-504, 2013; one copy, whose line for eps' is damaged:
//           0.1255 T and 0.4546 M are from memory.
//   [D293]  ASAE/ASABE D293, grain model of S. O. Nelson (Trans. ASAE, 1987); from memory.

#include <complex>

namespace lossline::product {

/// Shares of volume of a leaf as [UE87] fits them, and the residual permittivity.
struct LeafFractions {
  double residual = 0;  ///< eps_r, 1
  double free = 0;      ///< free water, NEGATIVE below m = 0.138: users clamp it at 0
  double bound = 0;     ///< bulk mixture of solid and bound water
};

/// Wet-basis moisture range of the fit [UE87].
inline constexpr double leaf_moisture_min = 0.05, leaf_moisture_max = 0.7;
/// Conductivity of the free water [UE87] eq. 17, maize leaf at 22 degC [S/m].
inline constexpr double leaf_conductivity = 1.27;

/// The fractions at a moisture, as printed (no clamp).
///
///   moisture  wet basis, leaf_moisture_min .. leaf_moisture_max
///   throws    Error out_of_range
[[nodiscard]] LeafFractions leaf_fractions(double moisture);
/// Free water of a leaf at 22 degC, conduction included. frequency [Hz], > 0.
[[nodiscard]] std::complex<double> leaf_free_water(double frequency);
/// Bound water of a leaf. frequency [Hz], > 0.
[[nodiscard]] std::complex<double> leaf_bound_water(double frequency);

/// Leaf tissue at 22 degC [UE87]; free-water share clamped at 0. Tissue, not a packed bed: combine
/// with air by a mixing rule.
///
///   moisture   as leaf_fractions
///   frequency  [Hz], 0.2e9 .. 20e9
[[nodiscard]] std::complex<double> leaf_permittivity(double moisture, double frequency);

/// The same with a given permittivity of the free water, conduction included; that carries the
/// model to other temperatures while the bound part stays as fitted. Own extension.
[[nodiscard]] std::complex<double> leaf_permittivity(double moisture, double frequency,
                                                     std::complex<double> free_water);

/// The same with pure water at temperature T [K] plus conduction as the free water.
///
///   conductivity  of the free water at T [S/m], >= 0
[[nodiscard]] std::complex<double> leaf_permittivity_at(double moisture, double frequency, double T,
                                                        double conductivity = leaf_conductivity);

/// The one frequency of [SB03] [Hz].
inline constexpr double produce_frequency = 2.45e9;

/// Fresh fruit and vegetables at 2450 MHz [SB03]. The range of moisture of the fit is not known;
/// below 0.7 the value is an extrapolation, and for dried produce it must not be used.
///
///   moisture  wet basis, 0.5 .. 1
///   ash       mass share, wet basis, 0 .. 0.025
///   T         [K], 278.15 .. 403.15
///   returns   eps with eps' >= 1, eps'' >= 0
[[nodiscard]] std::complex<double> produce_permittivity(double moisture, double ash, double T);

/// Hard red winter wheat in bulk, 24 degC [D293]. No temperature term.
///
///   moisture      wet basis, 0.05 .. 0.30 (fit 0.10 .. 0.25)
///   bulk_density  [kg/m3], 500 .. 1000
///   frequency     [Hz], 20e6 .. 2.5e9
[[nodiscard]] std::complex<double> wheat_permittivity(double moisture, double bulk_density,
                                                      double frequency);

}  // namespace lossline::product
