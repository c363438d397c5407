#pragma once
// Thin-layer drying: moisture ratio MR = (X - Xe)/(X0 - Xe) against time in a thin layer. Time in s
// unless a constant is published per minute, which its comment then says.
//
// Sources: W. K. Lewis 1921; G. E. Page 1949; form per ASABE S448 (from memory).
//   [LM84]  H. Li, R. V. Morey, Trans. ASAE 27(2), 1984 (from memory).
//   [OMB]   J. R. O'Callaghan, D. J. Menzies, P. H. Bailey, J. Agric. Eng. Res. 16, 1971 (from
//           memory).

#include <cmath>

namespace lossline::product {

/// Lewis: exp(-k t); k [1/s], t [s], both >= 0.
[[nodiscard]] inline double lewis_ratio(double k, double t) {
  return std::exp(-k * t);
}

/// Page: exp(-k t^n); k [1/time^n] and t in the same unit of time.
[[nodiscard]] inline double page_ratio(double k, double n, double t) {
  return std::exp(-k * std::pow(t, n));
}

/// Logarithmic: a exp(-k t) + c.
[[nodiscard]] inline double logarithmic_ratio(double a, double k, double c, double t) {
  return a * std::exp(-k * t) + c;
}

/// Constants of Page's equation with time in MINUTES.
struct PageConstants {
  double k = 0;  ///< [1/min^n]
  double n = 0;  ///< 1
};

/// Shelled corn [LM84].
///
///   T  air [K];  moisture  initial, dry basis [kg/kg]
[[nodiscard]] inline PageConstants corn_layer(double T, double moisture) {
  const double t = T - 273.15, M0 = 100 * moisture;
  return {1.091e-2 + 2.767e-6 * t * t + 7.286e-6 * t * M0,
          0.5375 + 1.141e-5 * M0 * M0 + 5.183e-5 * t * t};
}

/// Wheat [OMB]: Lewis's k [1/s] at air temperature T [K].
[[nodiscard]] inline double wheat_layer_rate(double T) {
  return 2000 * std::exp(-5094 / T);
}

}  // namespace lossline::product
