#pragma once
// Liquid water and steam by the IAPWS Industrial Formulation 1997: boiling line, volume, enthalpy
// and heat capacity of liquid (region 1) and vapour (region 2), heat of evaporation.
// SI units: T in K, p in Pa, enthalpy in J/kg (zero at the triple point, liquid).
//
// Source [IF97]: IAPWS R7-97(2012), Revised Release on the IAPWS Industrial Formulation 1997 for
//   the Thermodynamic Properties of Water and Steam: equations 7 and 15-17 with Tables 2, 10, 11;
//   section 8 with Table 34. The coefficients were taken from a copy of the tables (the
//   data of the python package iapws 1.5), not from the release itself, and are proved by the
//   release's own check values (Tables 5, 15, 35, 36), which tests/published reproduces to the
//   printed digits.
//
// Every function is pure, safe from any thread, and throws Error out_of_range outside the range it
// states and for NaN.

namespace lossline::water {

/// Ends of the boiling line [K]; the upper one is the critical point.
inline constexpr double saturation_T_min = 273.15;
inline constexpr double saturation_T_max = 647.096;
/// Ends of the boiling line [Pa].
inline constexpr double saturation_p_min = 611.213;
inline constexpr double saturation_p_max = 22.064e6;
/// Highest temperature of region 1 and of the saturated enthalpies [K].
inline constexpr double liquid_T_max = 623.15;
/// Highest temperature of region 2 [K].
inline constexpr double vapour_T_max = 1073.15;
/// Highest pressure [Pa].
inline constexpr double water_p_max = 100e6;

/// Pressure at which water boils [Pa]; T in saturation_T_min .. saturation_T_max.
[[nodiscard]] double saturation_pressure(double T);

/// Temperature at which water boils [K]: the inverse of saturation_pressure; p in
/// saturation_p_min .. saturation_p_max.
[[nodiscard]] double saturation_temperature(double p);

/// One phase at one temperature and pressure.
struct PhaseState {
  double volume = 0;         ///< [m3/kg]
  double enthalpy = 0;       ///< [J/kg]
  double heat_capacity = 0;  ///< at constant pressure [J/(kg K)]
};

/// Liquid water, region 1: T in 273.15 K .. liquid_T_max, p from saturation_pressure(T) (less 1e-9
/// relative, so that the boiling line itself is inside) to water_p_max.
[[nodiscard]] PhaseState liquid_state(double T, double p);

/// Steam, region 2: T in 273.15 K .. vapour_T_max, 0 < p up to the boiling line (plus 1e-9), the
/// boundary to region 3 ([IF97] equation 5), or water_p_max.
[[nodiscard]] PhaseState vapour_state(double T, double p);

/// Boiling liquid, dry saturated vapour, and the heat of evaporation between them [J/kg]; T in
/// saturation_T_min .. liquid_T_max.
[[nodiscard]] double saturated_liquid_enthalpy(double T);
[[nodiscard]] double saturated_vapour_enthalpy(double T);
[[nodiscard]] double latent_heat(double T);

}  // namespace lossline::water
