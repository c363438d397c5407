#pragma once
// Rate of cure d(alpha)/dt [1/s] from the degree of cure alpha and temperature T [K], for the
// kinetic forms in use. Rate constants are k = A exp(-E/(R T)).
//
// Every rate takes any alpha (held to 0..1) and is >= 0; alpha never passes 1. NaN gives NaN.
//
// Sources
//   [KS73]  M. R. Kamal, S. Sourour, Polym. Eng. Sci. 13, 59-64, 1973 (form seen in two copies).
//   [LLS]   W. I. Lee, A. C. Loos, G. S. Springer, J. Compos. Mater. 16, 510-520, 1982 (seen once).
//   [KR80]  M. R. Kamal, M. E. Ryan, Polym. Eng. Sci. 20, 1980 (from memory).
//   [ID]    A. I. Isayev, J. S. Deng, Rubber Chem. Technol. 61, 1988: induction t0 exp(T0/T) (from
//           memory). Vitrification factor and DiBenedetto's relation: from memory.

#include <optional>
#include <variant>

namespace lossline::product {

/// A rate constant A exp(-E/(R T)).
struct RateConstant {
  double A = 0;  ///< [1/s]; negative where a fit subtracts
  double E = 0;  ///< [J/mol]
  [[nodiscard]] double at(double T) const;
};

/// d(alpha)/dt = k (1 - alpha)^n.
struct NthOrder {
  RateConstant k;
  double n = 1;  ///< >= 0
};

/// [KS73] d(alpha)/dt = (k1 + k2 alpha^m)(1 - alpha)^n, over 1 + exp[C (alpha - alpha_c)] where
/// vitrification slows the end (C = 0: not).
struct KamalSourour {
  RateConstant k1, k2;
  double m = 1, n = 1;       ///< >= 0
  double vitrification = 0;  ///< C, 1
  double vitrified_at = 1;   ///< alpha_c
};

/// [LLS] (k1 + k2 alpha)(1 - alpha)(B - alpha) up to the switch, k3 (1 - alpha) beyond. The rate
/// jumps at the switch, by a factor of three at 117 degC: steppers should stop there.
struct LeeLoosSpringer {
  RateConstant k1, k2, k3;
  double B = 0.47;
  double switch_alpha = 0.3;
};

/// [KR80] alpha = K (t-ti)^n/[1 + K (t-ti)^n] after an induction ti = t0 exp(T0/T) [ID]. Here the
/// first `seed` of alpha stands for the induction: it passes at the rate that takes as long as ti
/// plus the form's own time to the seed, so that isothermal cure beyond it is exact and a changing
/// temperature adds up shares of induction.
struct KamalRyan {
  RateConstant K;      ///< A in [1/s^n]
  double n = 1;        ///< > 0
  double t0 = 0;       ///< [s], >= 0; 0: no induction
  double T0 = 0;       ///< [K]
  double seed = 0.01;  ///< 0..0.1, exclusive
};

/// Any of the kinetic forms.
using CureModel = std::variant<NthOrder, KamalSourour, LeeLoosSpringer, KamalRyan>;

/// Rate of cure.
///
///   alpha    degree of cure; held to 0..1
///   T        [K], > 0
///   returns  [1/s], >= 0; 0 at alpha >= 1
[[nodiscard]] double rate(const CureModel& model, double alpha, double T);

/// Degree of cure at which the rate jumps, where there is one; an event for steppers.
[[nodiscard]] std::optional<double> rate_jump(const CureModel& model);

/// Checks the constants.
///
///   throws  Error out_of_range naming the constant
void check(const CureModel& model);

/// First-order cure from what a rheometer reports: the time to 90 % at a temperature.
///
///   time_to_90  [s], > 0;  T_ref [K], > 0;  E [J/mol], >= 0
///   returns     k = ln(10)/t90 at T_ref
[[nodiscard]] NthOrder first_order_from_t90(double time_to_90, double T_ref, double E);

/// Glass transition temperature at a degree of cure (DiBenedetto).
///
///   alpha              0..1
///   T_uncured, T_full  [K] at alpha 0 and 1
///   lambda             0 .. 1, exclusive of 0
///   returns            [K]
[[nodiscard]] double glass_transition(double alpha, double T_uncured, double T_full, double lambda);

}  // namespace lossline::product
