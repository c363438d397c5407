#pragma once
// State of the product per kg of dry solid: enthalpy E [J/kg], moisture X [kg/kg] and degree of
// cure alpha. With E as the unknown, water and energy are linear invariants that the space scheme
// and the stepper keep to rounding, and temperature follows explicitly:
//   E = (cs0 t + cs1 t^2/2) + cw X t - Qb(X) + dHr (1 - alpha),   t = T - 273.15 K,
// where Qb(X) is the heat that the bound water gave off when it was bound (planner/product/
// sorption.h). Templated on the number type so that exact derivatives come from the same text.

#include <cmath>

#include "planner/base/constants.h"
#include "planner/bed/bed_material.h"
#include "planner/numerics/dual.h"
#include "planner/water/bed_water.h"

namespace lossline::bed {

/// Qb(X) [J/kg dry solid] for a number or a dual.
inline double bound_heat(const product::Sorption& sorption, double X) {
  return sorption.bound_heat(X).value;
}
template <int N>
numerics::Dual<N> bound_heat(const product::Sorption& sorption, const numerics::Dual<N>& X) {
  const auto q = sorption.bound_heat(X.value);
  return numerics::chain(X, q.value, q.slope);
}

/// Enthalpy per kg of dry solid [J/kg] at temperature T [K].
inline double enthalpy(const BedMaterial& material, double T, double X, double alpha) {
  const double t = T - celsius_zero;
  return material.heat_capacity * t + 0.5 * material.heat_capacity_slope * t * t +
         water::liquid_heat_capacity * X * t - bound_heat(*material.sorption, X) +
         material.heat_of_reaction * (1 - alpha);
}

/// Temperature [K] from the state; closed form (a quadratic when cp depends on T).
template <class S>
S temperature(const BedMaterial& material, const S& E, const S& X, const S& alpha) {
  using std::sqrt;
  const S heat = E + bound_heat(*material.sorption, X) - material.heat_of_reaction * (1.0 - alpha);
  const S capacity = material.heat_capacity + water::liquid_heat_capacity * X;
  if (material.heat_capacity_slope == 0) return celsius_zero + heat / capacity;
  // slope/2 t^2 + capacity t = heat, the root that is continuous through slope = 0
  const S inside = capacity * capacity + 2 * material.heat_capacity_slope * heat;
  if (numerics::plain(inside) <= 0) return celsius_zero + heat / capacity;
  return celsius_zero + 2.0 * heat / (capacity + sqrt(inside));
}

}  // namespace lossline::bed
