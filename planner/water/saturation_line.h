#pragma once
// The boiling line of water as the closed equation of IAPWS-IF97 region 4 and its exact inverse,
// without range checks, for any number type. T in K, p in Pa.
//
// Source [IF97]: IAPWS R7-97(2012), Revised Release on the IAPWS Industrial Formulation 1997 for
//   the Thermodynamic Properties of Water and Steam, section 8, equations 29-31 and Table 34.
//   Valid from 273.15 K to 647.096 K.

#include <cmath>

namespace lossline::water::saturation_line {

// [IF97] Table 34, n1 .. n10.
inline constexpr double n1 = 1.1670521452767e3, n2 = -7.2421316703206e5, n3 = -1.7073846940092e1,
                        n4 = 1.2020824702470e4, n5 = -3.2325550322333e6, n6 = 1.4915108613530e1,
                        n7 = -4.8232657361591e3, n8 = 4.0511340542057e5, n9 = -2.3855557567849e-1,
                        n10 = 6.5017534844798e2;
/// Pressure unit of the equation [Pa].
inline constexpr double unit = 1e6;

/// Saturation pressure [Pa]: [IF97] equation 30.
template <class S>
S pressure(const S& T) {
  using std::sqrt;
  const S theta = T + n9 / (T - n10);
  const S a = theta * theta + n1 * theta + n2;
  const S b = n3 * (theta * theta) + n4 * theta + n5;
  const S c = n6 * (theta * theta) + n7 * theta + n8;
  const S root = 2.0 * c / (sqrt(b * b - 4.0 * a * c) - b);
  const S square = root * root;
  return unit * (square * square);
}

/// Saturation temperature [K]: [IF97] equation 31.
template <class S>
S temperature(const S& p) {
  using std::sqrt;
  const S beta = sqrt(sqrt(p / unit));
  const S e = beta * beta + n3 * beta + n6;
  const S f = n1 * (beta * beta) + n4 * beta + n7;
  const S g = n2 * (beta * beta) + n5 * beta + n8;
  const S d = 2.0 * g / (0.0 - f - sqrt(f * f - 4.0 * e * g));
  const S sum = n10 + d;
  return 0.5 * (sum - sqrt(sum * sum - 4.0 * (n9 + n10 * d)));
}

}  // namespace lossline::water::saturation_line
