#pragma once
// Moisture diffusivity of products [m2/s]; T [K], energies [J/mol].
//
// Sources: Arrhenius form, any text. Pasta: Xiong, Narsimhan, Okos, J. Food Eng. 1991 (one copy of
// the constants seen): D0 6.391e-8 m2/s, E 21.76 kJ/mol, K 1032.6.

#include <cmath>

#include "planner/base/constants.h"

namespace lossline::product {

/// D0 exp(-E/(R T)); D0 [m2/s] at infinite temperature.
[[nodiscard]] inline double arrhenius_diffusivity(double D0, double E, double T) {
  return D0 * std::exp(-E / (gas_constant * T));
}

/// The same from the value at a temperature: D_ref exp[-E/R (1/T - 1/T_ref)].
[[nodiscard]] inline double diffusivity_from(double D_ref, double T_ref, double E, double T) {
  return D_ref * std::exp(-E / gas_constant * (1 / T - 1 / T_ref));
}

/// Share of the wet-end diffusivity at moisture X [kg/kg]: X^2/(X^2 + Xd^2), half at Xd; `dry` is
/// what is left at X = 0. Own choice of form, to keep the drying equation regular.
[[nodiscard]] inline double wetness_factor(double X, double half_moisture, double dry) {
  const double wet = X > 0 ? X * X / (X * X + half_moisture * half_moisture) : 0;
  return dry + (1 - dry) * wet;
}

/// Binding-energy form of pasta: D0 exp(-E/RT) K exp(-Eb/RT)/(1 + K exp(-Eb/RT)).
///
///   Eb  binding energy of the water at its moisture [J/mol]
[[nodiscard]] inline double bound_water_diffusivity(double D0, double E, double K, double Eb,
                                                    double T) {
  const double free = K * std::exp(-Eb / (gas_constant * T));
  return arrhenius_diffusivity(D0, E, T) * free / (1 + free);
}

}  // namespace lossline::product
