#pragma once
// Maturity of hydrating binders: the equivalent age and the temperature-time factor.
//
// Sources: ASTM C1074 (Arrhenius form; from memory); A. G. A. Saul 1951 (from memory).

#include <cmath>

namespace lossline::product {

/// Speed of hydration at T over that at T_ref [1]: equivalent age is its time integral.
///
///   T, T_ref  [K], > 0
///   Q         activation energy over the gas constant [K], >= 0
[[nodiscard]] inline double equivalent_age_rate(double T, double T_ref, double Q) {
  return std::exp(-Q * (1 / T - 1 / T_ref));
}

/// Nurse-Saul temperature over the datum [K], not below 0: maturity is its time integral.
[[nodiscard]] inline double maturity_rate(double T, double T_datum) {
  return std::fmax(T - T_datum, 0);
}

}  // namespace lossline::product
