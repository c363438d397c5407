#pragma once
// The published forms of sorption isotherms, one struct each: dry-basis moisture X [kg/kg] from
// water activity a and temperature T [K], and the way back. Constants keep the units of their
// sources: where a source counts moisture in per cent, M = 100 X, and t = T - 273.15 K.
//
// The members take 0 <= a <= 1 (activity_top at most where the form has a pole at 1), X >= 0 and
// return X >= 0, a in 0..1. They throw Error out_of_range where the form has no answer at that
// temperature. isotherm.h adds the checks of the arguments; use that.
//
// Sources
//   [GAB]   C. van den Berg, S. Bruin 1981 (from memory); temperature terms as in K. M. Waananen,
//           PhD thesis, Purdue 1989, one copy seen.
//   [Os46]  C. R. Oswin 1946; temperature terms as in Xiong et al. 1991, one copy seen.
//   [D245]  ASAE/ASABE D245.5: modified Henderson, Chung-Pfost, Halsey, Oswin (from memory).
//   [Pe93]  M. Peleg 1993 (form seen). [BET] Brunauer, Emmett, Teller 1938 (form seen).
//   [Si98]  W. T. Simpson, USDA FPL-RN-0268, 1998 = Wood Handbook, chapter 4 (seen).
//   [WL09]  Y. Wang, M. D. LeVan, J. Chem. Eng. Data 54, 2839-2844, 2009 (Toth; one copy seen).
//   [SS84]  A. Sakoda, M. Suzuki 1984 (power of p/psat; one copy seen).
//   [DA]    M. M. Dubinin, V. A. Astakhov 1971 (from memory).

#include <array>

namespace lossline::product {

/// Highest activity at which forms with a pole at 1 are evaluated.
inline constexpr double activity_top = 1 - 1e-6;

/// A constant with an Arrhenius factor: value(T) = p0 exp(q/(R T)), q in J/mol.
struct ArrheniusConstant {
  double p0 = 0, q = 0;
  [[nodiscard]] double at(double T) const;
};

/// [GAB] X = Xm C K a / [(1 - K a)(1 - K a + C K a)].
struct Gab {
  ArrheniusConstant Xm, C, K;  ///< Xm in kg/kg
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// [BET] GAB with K = 1; sources state it up to a = 0.5.
struct Bet {
  ArrheniusConstant Xm, C;  ///< Xm in kg/kg
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// [Os46] X = (k0 + k1 t) [a/(1-a)]^(n0 + n1 t).
struct Oswin {
  double k0 = 0, k1 = 0, n0 = 0, n1 = 0;
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// [D245] 1 - a = exp[-A (t + C) M^B].
struct ModifiedHenderson {
  double A = 0, B = 0, C = 0;
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// [D245] a = exp[-(A/(t + C)) exp(-B M)].
struct ModifiedChungPfost {
  double A = 0, B = 0, C = 0;
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// [D245] M = (A + B t) [a/(1-a)]^(1/C).
struct ModifiedOswin {
  double A = 0, B = 0, C = 0;
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// [D245] a = exp[-exp(A + B t) M^-C].
struct ModifiedHalsey {
  double A = 0, B = 0, C = 0;
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// [Pe93] X = k1 a^n1 + k2 a^n2, no temperature; way back numeric.
struct Peleg {
  double k1 = 0, n1 = 1, k2 = 0, n2 = 1;
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// Wood [Si98]: X = (18/W) [K a/(1-K a) + (K1 K a + 2 K1 K2 K^2 a^2)/(1 + K1 K a + K1 K2 K^2 a^2)],
/// each of W, K, K1, K2 a polynomial c0 + c1 t + c2 t^2. Not valid above 100 degC; numeric back.
struct HailwoodHorrobin {
  std::array<double, 3> W{349, 1.29, 0.0135};
  std::array<double, 3> K{0.805, 0.000736, -0.00000273};
  std::array<double, 3> K1{6.27, -0.00938, -0.000303};
  std::array<double, 3> K2{1.91, 0.0407, -0.000293};
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// [WL09] X = ws b p/[1 + (b p)^n]^(1/n), b = b0 exp(Q/T), n = n0 + c/T, p = a psat(T).
struct Toth {
  double ws = 0;  ///< [kg/kg]
  double b0 = 0;  ///< [1/Pa]
  double Q = 0;   ///< [K]
  double n0 = 0;  ///< 1
  double c = 0;   ///< [K]
  /// X [kg/kg] at vapour pressure p [Pa].
  [[nodiscard]] double loading(double p, double T) const;
  /// Vapour pressure [Pa] over loading X, infinite for X >= ws.
  [[nodiscard]] double pressure(double X, double T) const;
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// [SS84] X = scale a^exponent.
struct Freundlich {
  double scale = 0, exponent = 1;
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

/// [DA] X = W0 exp{-[R T ln(1/a)/E]^n}.
struct DubininAstakhov {
  double W0 = 0;  ///< [kg/kg]
  double E = 0;   ///< [J/mol]
  double n = 1;
  [[nodiscard]] double moisture(double a, double T) const;
  [[nodiscard]] double activity(double X, double T) const;
};

}  // namespace lossline::product
