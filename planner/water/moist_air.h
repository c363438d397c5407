#pragma once
// Moist air: the perfect-gas relations of the ASHRAE handbook, and the enthalpy the solver uses.
// SI units: T in K, pressures in Pa, humidity ratio W in kg water per kg dry air, enthalpies in J
// per kg dry air, relative humidity as a fraction 0..1.
//
// Source [ASHRAE]: ASHRAE Handbook - Fundamentals (SI edition), 2017, chapter 1: equations 3
//   (standard atmosphere), 5 and 6 (saturation pressure over ice and water), 20 (humidity ratio),
//   26 (specific volume), 30 (enthalpy), 33 and 35 (wet bulb). From memory, checked
//   against an independent library on a grid of 145 states (tests/published).
// The perfect-gas form leaves out the enhancement factor: saturated humidity ratios are 0.6 % (50
// degC) to 1.2 % (85 degC) below real-gas tables.
//
// Every function is pure, safe from any thread, and throws Error out_of_range outside the ranges
// below and for NaN.

namespace lossline::water {

/// Range of the saturation equations [K]: -100 .. 200 degC, [ASHRAE].
inline constexpr double moist_air_T_min = 173.15;
inline constexpr double moist_air_T_max = 473.15;
/// Total pressure for which the perfect-gas relations are offered [Pa]; common practice.
inline constexpr double moist_air_p_min = 1e3;
inline constexpr double moist_air_p_max = 500e3;
/// Highest humidity ratio [kg/kg]: all but pure steam.
inline constexpr double humidity_ratio_max = 1e3;
/// Ratio of molar masses water over dry air, [ASHRAE] equation 20.
inline constexpr double molar_mass_ratio = 0.621945;
/// Altitude of the standard atmosphere [m], [ASHRAE] table 1.
inline constexpr double altitude_min = -5000;
inline constexpr double altitude_max = 11000;

/// Saturation pressure over ice below 0.01 degC, over liquid water above [Pa].
[[nodiscard]] double moist_air_saturation_pressure(double T);

/// Partial pressure of vapour [Pa] in air of humidity ratio W >= 0 at total pressure p.
[[nodiscard]] double vapour_pressure(double W, double p);

/// Humidity ratio from relative humidity rh in 0..1; refused where rh times the saturation pressure
/// reaches the total pressure p.
[[nodiscard]] double humidity_ratio_from_relative_humidity(double T, double rh, double p);
/// Humidity ratio from the dew point; refused at and above boiling.
[[nodiscard]] double humidity_ratio_from_dew_point(double T_dew, double p);
/// Humidity ratio from the wet bulb T_wet <= T; 0 when the wet bulb is lower than dry air allows.
[[nodiscard]] double humidity_ratio_from_wet_bulb(double T, double T_wet, double p);

/// Relative humidity, 0 .. above 1 for air that carries fog.
[[nodiscard]] double relative_humidity(double T, double W, double p);

/// Dew point (below 0.01 degC: frost point) [K] of air of humidity ratio W at pressure p. Air drier
/// than a frost point of -100 degC, W = 0 included, gives moist_air_T_min.
[[nodiscard]] double dew_point(double W, double p);

/// Thermodynamic wet bulb [K] to 1e-9 K; refused for supersaturated air. Where both water and ice
/// on the wick would be in equilibrium, liquid water is taken. For air hotter than the boiling
/// point the root below boiling is returned.
[[nodiscard]] double wet_bulb(double T, double W, double p);

/// Enthalpy by [ASHRAE] equation 30, zero for dry air at 0 degC and liquid water at 0 degC.
[[nodiscard]] double ashrae_enthalpy(double T, double W);

/// Volume per kg dry air [m3/kg], [ASHRAE] equation 26.
[[nodiscard]] double specific_volume(double T, double W, double p);

/// Pressure of the standard atmosphere [Pa] at an altitude [m], [ASHRAE] equation 3.
[[nodiscard]] double standard_pressure_at(double altitude);

/// Heat capacity of dry air [J/(kg K)], [ASHRAE] equation 30.
inline constexpr double dry_air_heat_capacity = 1006.0;

/// Enthalpy of moist air per kg dry air in the solver: 1006 (T - 273.15) + Y vapour_enthalpy(T),
/// consistent with bed_water.h, so that what leaves the product arrives in the air. No range check.
///
/// Against [ASHRAE] equation 30, whose vapour is 2501 + 1.86 t kJ/kg, the vapour part is 0.07 %
/// lower at 0 degC, equal at 20 to 40 degC, 0.5 % lower at 100 degC and 1.3 % lower at 150 degC.
[[nodiscard]] double air_enthalpy(double T, double Y);
/// Temperature [K] of moist air of enthalpy h per kg dry air: the inverse, in closed form.
[[nodiscard]] double air_temperature(double h, double Y);

}  // namespace lossline::water
