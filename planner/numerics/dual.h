#pragma once
// Forward-mode derivatives: a value with its exact partial derivatives in N directions, so that
// one templated formula serves both the evaluation and the Jacobian of a stepper.

#include <array>
#include <cmath>

namespace lossline::numerics {

/// A value and N partial derivatives.
template <int N>
struct Dual {
  double value = 0;
  std::array<double, N> slope{};

  constexpr Dual() = default;
  // A plain number is a constant; the implicit conversion is what lets formulas read naturally.
  constexpr Dual(double v) : value(v) {}  // NOLINT(google-explicit-constructor)

  /// The independent variable of direction `i`.
  static constexpr Dual variable(double v, int i) {
    Dual out(v);
    out.slope[static_cast<std::size_t>(i)] = 1;
    return out;
  }
  constexpr Dual& operator+=(const Dual& b) { return *this = *this + b; }
  constexpr Dual& operator-=(const Dual& b) { return *this = *this - b; }
};

/// f(a) given f and df/da at a.value: the chain rule.
template <int N>
constexpr Dual<N> chain(const Dual<N>& a, double f, double df) {
  Dual<N> out(f);
  for (std::size_t i = 0; i < N; ++i) out.slope[i] = df * a.slope[i];
  return out;
}
/// f(a, b) given f and its two partial derivatives.
template <int N>
constexpr Dual<N> chain(const Dual<N>& a, double df_da, const Dual<N>& b, double df_db, double f) {
  Dual<N> out(f);
  for (std::size_t i = 0; i < N; ++i) out.slope[i] = df_da * a.slope[i] + df_db * b.slope[i];
  return out;
}

template <int N>
constexpr Dual<N> operator+(const Dual<N>& a, const Dual<N>& b) {
  return chain(a, 1, b, 1, a.value + b.value);
}
template <int N>
constexpr Dual<N> operator-(const Dual<N>& a, const Dual<N>& b) {
  return chain(a, 1, b, -1, a.value - b.value);
}
template <int N>
constexpr Dual<N> operator*(const Dual<N>& a, const Dual<N>& b) {
  return chain(a, b.value, b, a.value, a.value * b.value);
}
template <int N>
constexpr Dual<N> operator/(const Dual<N>& a, const Dual<N>& b) {
  const double q = 1 / b.value;
  return chain(a, q, b, -a.value * q * q, a.value * q);
}
template <int N>
constexpr Dual<N> operator-(const Dual<N>& a) {
  return chain(a, -a.value, -1);
}
template <int N>
constexpr Dual<N> operator+(const Dual<N>& a, double b) {
  return chain(a, a.value + b, 1);
}
template <int N>
constexpr Dual<N> operator+(double a, const Dual<N>& b) {
  return b + a;
}
template <int N>
constexpr Dual<N> operator-(const Dual<N>& a, double b) {
  return chain(a, a.value - b, 1);
}
template <int N>
constexpr Dual<N> operator-(double a, const Dual<N>& b) {
  return chain(b, a - b.value, -1);
}
template <int N>
constexpr Dual<N> operator*(const Dual<N>& a, double b) {
  return chain(a, a.value * b, b);
}
template <int N>
constexpr Dual<N> operator*(double a, const Dual<N>& b) {
  return b * a;
}
template <int N>
constexpr Dual<N> operator/(const Dual<N>& a, double b) {
  return a * (1 / b);
}
template <int N>
constexpr Dual<N> operator/(double a, const Dual<N>& b) {
  const double f = a / b.value;
  return chain(b, f, -f / b.value);
}

template <int N>
Dual<N> exp(const Dual<N>& a) {
  const double e = std::exp(a.value);
  return chain(a, e, e);
}
template <int N>
Dual<N> log(const Dual<N>& a) {
  return chain(a, std::log(a.value), 1 / a.value);
}
template <int N>
Dual<N> log1p(const Dual<N>& a) {
  return chain(a, std::log1p(a.value), 1 / (1 + a.value));
}
template <int N>
Dual<N> expm1(const Dual<N>& a) {
  const double e = std::expm1(a.value);
  return chain(a, e, e + 1);
}
template <int N>
Dual<N> sqrt(const Dual<N>& a) {
  const double s = std::sqrt(a.value);
  return chain(a, s, 0.5 / s);
}

/// The plain value of a number or a dual, for comparisons and branches.
inline double plain(double a) {
  return a;
}
template <int N>
double plain(const Dual<N>& a) {
  return a.value;
}

}  // namespace lossline::numerics
