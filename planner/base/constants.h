#pragma once
// Physical constants, SI. The first group is exact by definition of the SI (BIPM, The
// International System of Units, 9th edition, 2019, Table 1); the second is measured or agreed.

#include <numbers>

namespace lossline {

inline constexpr double pi = std::numbers::pi;

/// Speed of light in vacuum [m/s]. Exact, SI Brochure Table 1.
inline constexpr double speed_of_light = 299'792'458.0;
/// Molar gas constant [J/(mol K)]. Exact, SI Brochure Table 1 (N_A times k).
inline constexpr double gas_constant = 8.314462618;
/// Stefan-Boltzmann constant [W/(m2 K4)]. Exact consequence of the SI (CODATA 2018).
inline constexpr double stefan_boltzmann = 5.670374419e-8;

/// Electric constant [F/m]. CODATA 2018.
inline constexpr double electric_constant = 8.8541878128e-12;
/// Magnetic constant [H/m]. CODATA 2018.
inline constexpr double magnetic_constant = 1.25663706212e-6;
/// Wave impedance of vacuum [ohm]. CODATA 2018.
inline constexpr double vacuum_impedance = 376.730313668;
/// Molar mass of water [kg/mol]. IAPWS R6-95(2018), section 2.
inline constexpr double water_molar_mass = 0.018015268;
/// Molar mass of dry air [kg/mol]. ASHRAE Handbook Fundamentals 2017, chapter 1.
inline constexpr double dry_air_molar_mass = 0.028966;
/// Standard atmosphere [Pa]. ISO 2533:1975.
inline constexpr double standard_pressure = 101'325.0;
/// Zero of the Celsius scale [K]. SI Brochure.
inline constexpr double celsius_zero = 273.15;

}  // namespace lossline
