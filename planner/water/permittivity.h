#pragma once
// Relative permittivity of pure liquid water by four published equations. SI units: frequency in
// Hz, T in K. Convention: eps = eps' - j eps'' (time factor exp(+jwt)), so imaginary parts are
// negative.
//
// Sources (coefficients read in agreeing copies, not in the papers themselves)
//   [E07]  W. J. Ellison, "Permittivity of pure water, at standard atmospheric pressure, over the
//          frequency range 0-25 THz and the temperature range 0-100 degC", J. Phys. Chem. Ref. Data
//          36(1), 1-18, 2007, Table 2, the three relaxations. RECOMMENDED. Its two resonances in
//          the THz range are left out: below 0.001 at 0.9-5.8 GHz, not examined above 30 GHz.
//   [K89]  U. Kaatze, "Complex permittivity of water as a function of frequency and temperature",
//          J. Chem. Eng. Data 34(4), 371-374, 1989: one relaxation.
//   [MW04] T. Meissner, F. J. Wentz, IEEE Trans. Geosci. Remote Sens. 42, 1836-1849, 2004,
//          equations 6-8 and Table III: two relaxations. Never extrapolate it above 40 degC: eps''
//          at 2.45 GHz is 75 % high at 95 degC.
//   [P527] Recommendation ITU-R P.527-4 (06/2017): two relaxations.
// [K89] states 1.1 GHz and [MW04] 1 GHz as the lowest frequency; below that every form tends to its
// static value, and the lower limit here is model_frequency_min for all.
//
// Every function is pure, safe from any thread, takes a microsecond or less, and throws Error
// out_of_range outside its range and for NaN.

#include <complex>
#include <optional>

namespace lossline::water {

/// What to do outside the range a source states.
enum class Beyond {
  refuse,       ///< throw
  extrapolate,  ///< evaluate within the limits of liquid water below; the caller marks the result
};

/// Limits of extrapolation: 250 .. 450 K, 1 MHz .. 1 THz.
inline constexpr double extrapolation_T_min = 250.0;
inline constexpr double extrapolation_T_max = 450.0;
inline constexpr double model_frequency_min = 1e6;
inline constexpr double extrapolation_frequency_max = 1e12;

/// Range of a model as its source states it.
struct ModelRange {
  double T_min, T_max;   ///< [K]
  double frequency_max;  ///< [Hz]; the lower end is model_frequency_min
};
inline constexpr ModelRange ellison_range{273.15, 373.15, 30e9};
inline constexpr ModelRange kaatze_range{269.05, 333.15, 57e9};
inline constexpr ModelRange meissner_wentz_range{248.15, 313.15, 400e9};
inline constexpr ModelRange itu_range{269.15, 313.15, 1e12};

/// [E07], 0 .. 100 degC. Extrapolated it stays smooth to 150 degC and beyond.
[[nodiscard]] std::complex<double> pure_water_ellison(double frequency, double T,
                                                      Beyond beyond = Beyond::refuse);
/// [K89], -4.1 .. 60 degC.
[[nodiscard]] std::complex<double> pure_water_kaatze(double frequency, double T,
                                                     Beyond beyond = Beyond::refuse);
/// [MW04], -25 .. 40 degC.
[[nodiscard]] std::complex<double> pure_water_meissner_wentz(double frequency, double T,
                                                             Beyond beyond = Beyond::refuse);
/// [P527], -4 .. 40 degC.
[[nodiscard]] std::complex<double> pure_water_itu(double frequency, double T,
                                                  Beyond beyond = Beyond::refuse);

/// Loss factor eps'' that a conductivity [S/m], >= 0, adds at a frequency [Hz]: sigma/(2 pi f
/// eps0).
[[nodiscard]] double ionic_loss(double conductivity, double frequency);

/// A loss factor told apart by mechanism.
struct LossSplit {
  double conductivity = 0;  ///< [S/m]
  double dipole_slope = 0;  ///< eps'' of the dipoles over frequency [1/Hz]

  /// eps'' at a frequency [Hz] well below the relaxation.
  [[nodiscard]] double loss(double frequency) const;
};

/// Splits two loss factors at two frequencies into conduction, falling as 1/f, and dipoles, rising
/// as f (far below the relaxation of water, as at 915 and 2450 MHz).
///
///   frequency_1, frequency_2  different, >= model_frequency_min [Hz]
///   loss_1, loss_2            eps'' at each, >= 0
///   returns                   nothing when either part would be negative: then do not carry the
///                             values to other frequencies
[[nodiscard]] std::optional<LossSplit> split_loss(double frequency_1, double loss_1,
                                                  double frequency_2, double loss_2);

}  // namespace lossline::water
