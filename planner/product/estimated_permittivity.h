#pragma once
// The permittivity of a wet product whose own was never measured, estimated from four phases by
// volume: solid, bound water, free water, air. An estimate of the order of magnitude (factor
// three), given as a band: low by the logarithmic rule, nominal by cube roots, high by square
// roots; sheets of fibres across the fibre take the geometric mean of the logarithmic and the
// cube-root rule as nominal. Never outside the Wiener bounds.
//
// Sources: rules in mixing.h; bound water 35 - j15, as used in four-component mixing of soils at
// 1.4 to 5 GHz, M. C. Dobson et al., IEEE Trans. Geosci. Remote Sens. GE-23, 1985 (from memory).
// The choice of rules is Lossline's own.

#include <complex>

namespace lossline::product {

/// Bound water at microwave frequencies (Dobson et al. 1985, from memory).
inline constexpr std::complex<double> bound_water_eps{35, -15};

/// What the estimate is made from.
struct Composition {
  double dry_bulk_density = 0;  ///< dry solid per volume of bed or piece [kg/m3]
  double solid_density = 0;     ///< of the pore-free solid [kg/m3], >= dry_bulk_density
  std::complex<double> solid;   ///< eps of the solid
  double bound_moisture = 0;    ///< X_b, capacity for bound water, dry basis [kg/kg]
  double conductivity = 0;      ///< of the free water [S/m]
  std::complex<double> bound_water = bound_water_eps;
  bool fibrous_sheet = false;  ///< field across the fibres of a sheet
};

/// The estimate with its band.
struct PermittivityBand {
  std::complex<double> low, nominal, high;
  bool pores_full = false;  ///< more water than pores: the value at full pores was returned
};

/// The band for a given free water.
///
///   moisture    dry basis [kg/kg], >= 0
///   free_water  eps at the temperature and frequency, conduction included; eps' >= 1
///   throws      Error out_of_range
[[nodiscard]] PermittivityBand estimated_permittivity(const Composition& composition,
                                                      double moisture,
                                                      std::complex<double> free_water);

/// The band at temperature T [K] and frequency [Hz], with pure water plus conduction as free water.
[[nodiscard]] PermittivityBand estimated_permittivity(const Composition& composition,
                                                      double moisture, double T, double frequency);

}  // namespace lossline::product
