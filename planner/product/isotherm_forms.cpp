#include "planner/product/isotherm_forms.h"

#include <algorithm>
#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/product/range_check.h"
#include "planner/water/if97.h"

namespace lossline::product {
namespace {

constexpr double tiny = std::numeric_limits<double>::min();
constexpr double huge = std::numeric_limits<double>::max();

/// A constant of a form that must be positive and finite at this temperature.
double positive(const char* name, double value) {
  return checked(name, value, "1", tiny, huge);
}

double quadratic(const std::array<double, 3>& c, double t) {
  return c[0] + t * (c[1] + t * c[2]);
}

/// Root of an increasing f in [0, 1] where f(0) <= 0: false position with halving (Illinois);
/// 1 when f is negative there too.
template <class F>
double activity_where(F f) {
  double a = 0, b = 1, fa = f(a), fb = f(b);
  if (fa >= 0) return 0;
  if (fb <= 0) return 1;
  for (int round = 0; round < 200 && b - a > 4e-16 * b; ++round) {
    double x = (a * fb - b * fa) / (fb - fa);
    if (round % 8 == 7 || !(x > a && x < b)) x = 0.5 * (a + b);
    if (!(x > a && x < b)) break;
    const double fx = f(x);
    if (fx == 0) return x;
    if (fx < 0) {
      a = x;
      fa = fx;
      fb *= 0.5;
    } else {
      b = x;
      fb = fx;
      fa *= 0.5;
    }
  }
  return 0.5 * (a + b);
}

double gab_moisture(double Xm, double C, double u) {
  return Xm * C * u / ((1 - u) * (1 - u + C * u));
}

/// u = K a from X: the root of (C-1) X u^2 - b u - X = 0 that rises from 0, without cancellation.
double gab_product(double Xm, double C, double X) {
  if (X == 0) return 0;
  const double b = (C - 2) * X - Xm * C;
  const double root = std::sqrt(std::max(b * b + 4 * (C - 1) * X * X, 0.0));
  return b < 0 ? 2 * X / (root - b) : (b + root) / (2 * (C - 1) * X);
}

double odds(double a) {
  return std::min(a, activity_top) / (1 - std::min(a, activity_top));
}

/// a from r = a/(1-a) = (X/scale)^(1/power), good for r of any size.
double activity_from_odds(double X, double scale, double power) {
  if (X == 0) return 0;
  return 1 / (1 + std::pow(X / scale, -1 / power));
}

}  // namespace

double ArrheniusConstant::at(double T) const {
  return p0 * std::exp(q / (gas_constant * T));
}

double Gab::moisture(double a, double T) const {
  const double u = positive("K of the isotherm", K.at(T)) * a;
  // where K >= 1 the form has its pole inside the range of activity
  return gab_moisture(positive("Xm of the isotherm", Xm.at(T)),
                      positive("C of the isotherm", C.at(T)), std::min(u, activity_top));
}
double Gab::activity(double X, double T) const {
  const double u = gab_product(positive("Xm of the isotherm", Xm.at(T)),
                               positive("C of the isotherm", C.at(T)), X);
  return std::min(u / positive("K of the isotherm", K.at(T)), 1.0);
}

double Bet::moisture(double a, double T) const {
  return Gab{Xm, C, {1, 0}}.moisture(a, T);
}
double Bet::activity(double X, double T) const {
  return Gab{Xm, C, {1, 0}}.activity(X, T);
}

double Oswin::moisture(double a, double T) const {
  const double t = T - celsius_zero;
  return positive("k0 + k1 t of the isotherm", k0 + k1 * t) *
         std::pow(odds(a), positive("n0 + n1 t of the isotherm", n0 + n1 * t));
}
double Oswin::activity(double X, double T) const {
  const double t = T - celsius_zero;
  return activity_from_odds(X, positive("k0 + k1 t of the isotherm", k0 + k1 * t),
                            positive("n0 + n1 t of the isotherm", n0 + n1 * t));
}

double ModifiedHenderson::moisture(double a, double T) const {
  const double k = positive("A (t + C) of the isotherm", A * (T - celsius_zero + C));
  return 0.01 * std::pow(-std::log1p(-std::min(a, activity_top)) / k, 1 / B);
}
double ModifiedHenderson::activity(double X, double T) const {
  const double k = positive("A (t + C) of the isotherm", A * (T - celsius_zero + C));
  return -std::expm1(-k * std::pow(100 * X, B));
}

double ModifiedChungPfost::moisture(double a, double T) const {
  const double k = positive("A/(t + C) of the isotherm", A / (T - celsius_zero + C));
  if (a <= std::exp(-k)) return 0;
  return -0.01 / B * std::log(-std::log(std::min(a, activity_top)) / k);
}
double ModifiedChungPfost::activity(double X, double T) const {
  const double k = positive("A/(t + C) of the isotherm", A / (T - celsius_zero + C));
  return std::exp(-k * std::exp(-B * 100 * X));
}

double ModifiedOswin::moisture(double a, double T) const {
  return 0.01 * positive("A + B t of the isotherm", A + B * (T - celsius_zero)) *
         std::pow(odds(a), 1 / C);
}
double ModifiedOswin::activity(double X, double T) const {
  return activity_from_odds(100 * X,
                            positive("A + B t of the isotherm", A + B * (T - celsius_zero)), 1 / C);
}

double ModifiedHalsey::moisture(double a, double T) const {
  if (a == 0) return 0;
  const double k = std::exp(A + B * (T - celsius_zero));
  return 0.01 * std::pow(k / -std::log(std::min(a, activity_top)), 1 / C);
}
double ModifiedHalsey::activity(double X, double T) const {
  if (X == 0) return 0;
  return std::exp(-std::exp(A + B * (T - celsius_zero)) * std::pow(100 * X, -C));
}

double Peleg::moisture(double a, double /*T*/) const {
  return k1 * std::pow(a, n1) + k2 * std::pow(a, n2);
}
double Peleg::activity(double X, double T) const {
  return activity_where([&](double a) { return moisture(a, T) - X; });
}

double HailwoodHorrobin::moisture(double a, double T) const {
  const double t = checked("temperature of the wood isotherm", T - celsius_zero, "degC", -50, 100);
  const double y = positive("K of the isotherm", quadratic(K, t)) * a;
  const double k1 = positive("K1 of the isotherm", quadratic(K1, t));
  const double k2 = positive("K2 of the isotherm", quadratic(K2, t));
  return 18 / positive("W of the isotherm", quadratic(W, t)) *
         (y / (1 - y) + (k1 * y + 2 * k1 * k2 * y * y) / (1 + k1 * y + k1 * k2 * y * y));
}
double HailwoodHorrobin::activity(double X, double T) const {
  return activity_where([&](double a) { return moisture(a, T) - X; });
}

double Toth::loading(double p, double T) const {
  const double n = positive("n of the isotherm", n0 + c / T);
  const double x = b0 * std::exp(Q / T) * p;
  if (x == 0) return 0;
  // x/(1+x^n)^(1/n) = (1+x^-n)^(-1/n)
  return ws * std::pow(1 + std::pow(x, -n), -1 / n);
}
double Toth::pressure(double X, double T) const {
  const double n = positive("n of the isotherm", n0 + c / T);
  if (X == 0) return 0;
  if (X >= ws) return std::numeric_limits<double>::infinity();
  return std::pow(std::expm1(-n * std::log(X / ws)), -1 / n) / (b0 * std::exp(Q / T));
}
double Toth::moisture(double a, double T) const {
  return loading(a * water::saturation_pressure(T), T);
}
double Toth::activity(double X, double T) const {
  return std::min(pressure(X, T) / water::saturation_pressure(T), 1.0);
}

double Freundlich::moisture(double a, double /*T*/) const {
  return scale * std::pow(a, exponent);
}
double Freundlich::activity(double X, double /*T*/) const {
  return std::min(std::pow(X / scale, 1 / exponent), 1.0);
}

double DubininAstakhov::moisture(double a, double T) const {
  if (a == 0) return 0;
  return W0 * std::exp(-std::pow(gas_constant * T * -std::log(a) / E, n));
}
double DubininAstakhov::activity(double X, double T) const {
  if (X == 0) return 0;
  if (X >= W0) return 1;
  return std::exp(-E / (gas_constant * T) * std::pow(std::log(W0 / X), 1 / n));
}

}  // namespace lossline::product
