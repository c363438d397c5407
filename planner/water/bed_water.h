#pragma once
// Water as the bed solver needs it: enthalpies that are short polynomials and a boiling line that
// never leaves its domain, templated on the number type so that forward derivatives go through.
// SI units: T in K, p in Pa, enthalpy in J/kg with zero for liquid water at 273.15 K.
//
// Source [IF97]: IAPWS R7-97(2012), see if97.h. The constants here are fits to it:
//   liquid    cw (T - 273.15), cw = 4190 J/(kg K): within 0.29 kJ/kg of boiling liquid from 0 to
//             100 degC, 3.8 kJ/kg too low at 150 degC
//   vapour    a quadratic chosen so that vapour less liquid is the heat of evaporation of [IF97]
//             within 0.07 % from 0 to 150 degC; it is then within 2.8 kJ/kg (0.1 %) of dry
//             saturated vapour. Above 150 degC it goes on along its tangent.
// The vapour's enthalpy depends on temperature alone; superheated vapour of low pressure has up to
// 0.5 % more at 100 degC. Outside 0 .. 150 degC the fits are continuations, not data.

#include <cmath>

#include "planner/base/constants.h"
#include "planner/numerics/dual.h"
#include "planner/water/saturation_line.h"

namespace lossline::water {

/// Heat capacity of liquid water in the bed [J/(kg K)]; fit to [IF97].
inline constexpr double liquid_heat_capacity = 4190.0;

/// Enthalpy of vapour = h0 + h1 t + h2 t^2, t = T - 273.15 K, up to vapour_fit_end; fit to [IF97].
inline constexpr double vapour_h0 = 2.4993e6;    ///< [J/kg]
inline constexpr double vapour_h1 = 1.9958e3;    ///< [J/(kg K)]
inline constexpr double vapour_h2 = -2.448;      ///< [J/(kg K2)]
inline constexpr double vapour_fit_end = 150.0;  ///< [K above 273.15 K]
/// Slope of the continuation [J/(kg K)].
inline constexpr double vapour_h1_above = vapour_h1 + 2 * vapour_h2 * vapour_fit_end;

/// Enthalpy of liquid water [J/kg] at T [K].
template <class S>
S liquid_enthalpy(const S& T) {
  return liquid_heat_capacity * (T - celsius_zero);
}

/// Enthalpy of water vapour [J/kg] at T [K]; continuous in value and slope.
template <class S>
S vapour_enthalpy(const S& T) {
  const S t = T - celsius_zero;
  if (numerics::plain(t) <= vapour_fit_end) return vapour_h0 + t * (vapour_h1 + vapour_h2 * t);
  constexpr double at_end = vapour_h0 + vapour_fit_end * (vapour_h1 + vapour_h2 * vapour_fit_end);
  return at_end + vapour_h1_above * (t - vapour_fit_end);
}

namespace continuation {
/// Where the equation of [IF97] hands over, its pressure there, and T/p dp/dT or dp/dT. Computed
/// from the equation with 30 digits; the tests hold value and slope against it.
inline constexpr double cold_T = 273.15;                     ///< [K]
inline constexpr double cold_p = 611.21267744434674;         ///< [Pa]
inline constexpr double cold_exponent = 19.850312091662916;  ///< T/p dp/dT, 1
inline constexpr double frozen_T = 150.0;                    ///< [K], exponential in T below
inline constexpr double hot_T = 640.0;                       ///< [K]
inline constexpr double hot_p = 20265942.167297665;          ///< [Pa]
inline constexpr double hot_slope = 242357.85834564808;      ///< [Pa/K]
/// ln(p/cold_p) at frozen_T, and its slope there [1/K].
inline constexpr double frozen_log = cold_exponent * (1 - cold_T / frozen_T);
inline constexpr double frozen_slope = cold_exponent * cold_T / (frozen_T * frozen_T);
}  // namespace continuation

/// Saturation pressure of liquid water [Pa] for every T [K], positive and increasing throughout,
/// continuous in value and slope: [IF97] from 273.15 K to 640 K; below, Clausius-Clapeyron with a
/// constant heat (supercooled water, not ice); above, the tangent.
template <class S>
S fast_saturation_pressure(const S& T) {
  using std::exp;
  namespace c = continuation;
  const double plain = numerics::plain(T);
  if (plain >= c::cold_T && plain <= c::hot_T) return saturation_line::pressure(T);
  if (plain > c::hot_T) return c::hot_p + c::hot_slope * (T - c::hot_T);
  if (plain >= c::frozen_T) return c::cold_p * exp(c::cold_exponent * (1.0 - c::cold_T / T));
  return c::cold_p * exp(c::frozen_log + c::frozen_slope * (T - c::frozen_T));
}

/// The same for a dual: one derivative of the equation, carried to all directions by the chain
/// rule.
template <int N>
requires(N > 1) numerics::Dual<N> fast_saturation_pressure(const numerics::Dual<N>& T) {
  const auto p = fast_saturation_pressure(numerics::Dual<1>::variable(T.value, 0));
  return numerics::chain(T, p.value, p.slope[0]);
}

/// The inverse of fast_saturation_pressure [K] for every p > 0 [Pa].
template <class S>
S fast_boiling_temperature(const S& p) {
  using std::log;
  namespace c = continuation;
  const double plain = numerics::plain(p);
  if (plain >= c::cold_p && plain <= c::hot_p) return saturation_line::temperature(p);
  if (plain > c::hot_p) return c::hot_T + (p - c::hot_p) / c::hot_slope;
  const S log_ratio = log(p / c::cold_p);
  if (numerics::plain(log_ratio) >= c::frozen_log)
    return c::cold_T / (1.0 - log_ratio / c::cold_exponent);
  return c::frozen_T + (log_ratio - c::frozen_log) / c::frozen_slope;
}

}  // namespace lossline::water
