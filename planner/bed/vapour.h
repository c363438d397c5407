#pragma once
// Driving forces and resistances of vapour in the product: water activity, the diffusion
// potential with its cap, the overpressure that drives the outflow at boiling, gas relative
// permeability. Templated on the number type; SI units.
//
// Sources
//   [BSL]  R. B. Bird, W. E. Stewart, E. N. Lightfoot, Transport Phenomena, 2nd ed., Wiley 2002,
//          section 18.2: diffusion through a stagnant gas (the logarithmic potential).
//   [M]    from memory: diffusivity of vapour in air 2.5e-5 m2/s at 298.15 K with exponent 1.81,
//          viscosity of steam near 100 degC 1.25e-5 Pa s, Lewis number 0.87.

#include <cmath>

#include "planner/base/constants.h"
#include "planner/bed/bed_material.h"
#include "planner/numerics/dual.h"
#include "planner/water/bed_water.h"

namespace lossline::bed {

/// Diffusivity of vapour in air at 298.15 K and one atmosphere [m2/s]. From memory.
inline constexpr double vapour_diffusivity = 2.5e-5;
/// Dynamic viscosity of steam near the boiling point [Pa s]. From memory.
inline constexpr double steam_viscosity = 1.25e-5;
/// Lewis number of water vapour in air, 1. From memory.
inline constexpr double lewis_number = 0.87;
/// Heat capacity of humid air in the analogy of heat and mass transfer [J/(kg K)]. From memory.
inline constexpr double film_heat_capacity = 1010.0;
/// Share of the total pressure beyond which the diffusion potential goes on along its tangent.
inline constexpr double stefan_cap = 0.99;
/// Half-width of the smooth start of the overpressure, over the chamber pressure.
inline constexpr double overpressure_width = 0.003;

/// Water activity for a number or a dual.
inline double activity(const product::Sorption& sorption, double X, double T) {
  return sorption.activity(X, T).a;
}
template <int N>
numerics::Dual<N> activity(const product::Sorption& sorption, const numerics::Dual<N>& X,
                           const numerics::Dual<N>& T) {
  const auto value = sorption.activity(X.value, T.value);
  return numerics::chain(X, value.da_dX, T, value.da_dT, value.a);
}

/// Diffusion potential psi = -P ln(1 - p/P) of vapour pressure p [Pa], C1 beyond the cap [BSL].
template <class S>
S diffusion_potential(const S& p, double P) {
  using std::log1p;
  const S share = p / P;
  if (numerics::plain(share) <= stefan_cap) return -P * log1p(-1.0 * share);
  return P * (-std::log1p(-stefan_cap) + (share - stefan_cap) / (1 - stefan_cap));
}

/// Overpressure [Pa] of vapour at pressure p in pores that stand open to P; C1.
template <class S>
S overpressure(const S& p, double P) {
  const double d = overpressure_width * P;
  const S over = p - P;
  if (numerics::plain(over) <= -d) return S(0.0);
  if (numerics::plain(over) >= d) return over;
  const S q = over + d;
  return q * q / (4 * d);
}

/// Share of the gas paths that liquid leaves open, never quite zero, 1.
template <class S>
S gas_openness(const S& X, double saturation) {
  using std::sqrt;
  const S u = 1.0 - X / saturation;
  return 0.5 * (u + sqrt(u * u + 1e-3));
}

/// Conductance of pore diffusion per length, on the diffusion potential [kg/(m s Pa)].
template <class S>
S pore_diffusion(const BedMaterial& material, const S& X, const S& T, double P) {
  using std::exp;
  using std::log;
  const S D = vapour_diffusivity * (standard_pressure / P) * exp(1.81 * log(T / 298.15));
  return material.vapour_factor * gas_openness(X, material.saturation_moisture) * D *
         (water_molar_mass / gas_constant) / T;
}

/// Conductance of pressure-driven vapour flow per length, on the overpressure [kg/(m s Pa)].
template <class S>
S pressure_flow(const BedMaterial& material, const S& X, const S& T, const S& over, double P) {
  const S g = gas_openness(X, material.saturation_moisture);
  return (material.permeability / steam_viscosity) * g * g * (P + over) *
         (water_molar_mass / gas_constant) / T;
}

/// Liquid diffusivity [m2/s].
template <class S>
S liquid_diffusivity(const BedMaterial& material, const S& X, const S& T) {
  using std::exp;
  const S arrhenius =
      exp(-1.0 * (material.diffusivity_activation / gas_constant) * (1.0 / T - 1.0 / 298.15));
  const double half = material.diffusivity_half_moisture;
  const S wet = numerics::plain(X) > 0 ? X * X / (X * X + half * half) : 0.0 * X;
  return material.diffusivity * arrhenius *
         (dry_diffusivity_share + (1 - dry_diffusivity_share) * wet);
}

/// Mass transfer coefficient of a gas film on the diffusion potential [kg/(m2 s Pa)], by the
/// analogy with heat transfer (Chilton and Colburn 1934).
inline double film_conductance(double heat_transfer, double P) {
  return heat_transfer * water_molar_mass /
         (P * dry_air_molar_mass * film_heat_capacity * std::pow(lewis_number, 2.0 / 3.0));
}

/// Partial pressure of vapour in air of humidity ratio Y at pressure P [Pa].
template <class S>
S vapour_pressure(const S& Y, double P) {
  constexpr double ratio = water_molar_mass / dry_air_molar_mass;
  return P * Y / (ratio + Y);
}

}  // namespace lossline::bed
