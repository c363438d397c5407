#include "planner/product/isotherm.h"

#include <algorithm>
#include <limits>

#include "planner/product/range_check.h"

namespace lossline::product {
namespace {

constexpr double tiny = std::numeric_limits<double>::min();
constexpr double huge = std::numeric_limits<double>::max();

void positive(const char* name, double value) {
  checked(name, value, "1", tiny, huge);
}
void finite(const char* name, double value) {
  checked(name, value, "1", -huge, huge);
}

void check_temperature(double T) {
  checked("temperature", T, "K", 200, 700);
}

/// One check per form.
struct ConstantsCheck {
  void arrhenius(const char* name, const ArrheniusConstant& c) const {
    positive(name, c.p0);
    checked("energy of an isotherm constant", c.q, "J/mol", -1e6, 1e6);
  }
  void operator()(const Gab& f) const {
    arrhenius("Xm of the isotherm", f.Xm);
    arrhenius("C of the isotherm", f.C);
    arrhenius("K of the isotherm", f.K);
  }
  void operator()(const Bet& f) const {
    arrhenius("Xm of the isotherm", f.Xm);
    arrhenius("C of the isotherm", f.C);
  }
  void operator()(const Oswin& f) const {
    finite("k0 of the isotherm", f.k0);
    finite("k1 of the isotherm", f.k1);
    finite("n0 of the isotherm", f.n0);
    finite("n1 of the isotherm", f.n1);
  }
  void operator()(const ModifiedHenderson& f) const { positive_three(f.A, f.B, f.C); }
  void operator()(const ModifiedChungPfost& f) const { positive_three(f.A, f.B, f.C); }
  void operator()(const ModifiedOswin& f) const {
    finite("A of the isotherm", f.A);
    finite("B of the isotherm", f.B);
    positive("C of the isotherm", f.C);
  }
  void operator()(const ModifiedHalsey& f) const {
    finite("A of the isotherm", f.A);
    finite("B of the isotherm", f.B);
    positive("C of the isotherm", f.C);
  }
  void operator()(const Peleg& f) const {
    positive("k1 of the isotherm", f.k1);
    positive("n1 of the isotherm", f.n1);
    checked("k2 of the isotherm", f.k2, "1", 0, huge);
    positive("n2 of the isotherm", f.n2);
  }
  void operator()(const HailwoodHorrobin& f) const {
    for (const auto& constants : {f.W, f.K, f.K1, f.K2})
      for (const double c : constants) finite("coefficient of the isotherm", c);
  }
  void operator()(const Toth& f) const {
    positive("ws of the isotherm", f.ws);
    positive("b0 of the isotherm", f.b0);
    finite("Q of the isotherm", f.Q);
    finite("n0 of the isotherm", f.n0);
    finite("c of the isotherm", f.c);
  }
  void operator()(const Freundlich& f) const {
    positive("scale of the isotherm", f.scale);
    positive("exponent of the isotherm", f.exponent);
  }
  void operator()(const DubininAstakhov& f) const {
    positive("W0 of the isotherm", f.W0);
    positive("E of the isotherm", f.E);
    positive("n of the isotherm", f.n);
  }

 private:
  static void positive_three(double A, double B, double C) {
    positive("A of the isotherm", A);
    positive("B of the isotherm", B);
    finite("C of the isotherm", C);
  }
};

}  // namespace

double moisture(const Isotherm& isotherm, double a, double T) {
  checked("water activity", a, "1", 0, huge);
  check_temperature(T);
  return std::visit([&](const auto& form) { return form.moisture(std::min(a, 1.0), T); },
                    isotherm.form);
}

double activity(const Isotherm& isotherm, double X, double T) {
  checked("moisture", X, "kg/kg", 0, huge);
  check_temperature(T);
  return std::visit([&](const auto& form) { return form.activity(X, T); }, isotherm.form);
}

bool in_range(const Isotherm& isotherm, double a, double T) {
  return a >= isotherm.activity_min && a <= isotherm.activity_max && T >= isotherm.T_min &&
         T <= isotherm.T_max;
}

void check(const Isotherm& isotherm) {
  checked("lowest temperature of the isotherm", isotherm.T_min, "K", 200, 700);
  checked("highest temperature of the isotherm", isotherm.T_max, "K", isotherm.T_min, 700);
  checked("lowest activity of the isotherm", isotherm.activity_min, "1", 0, 1);
  checked("highest activity of the isotherm", isotherm.activity_max, "1", isotherm.activity_min, 1);
  std::visit(ConstantsCheck{}, isotherm.form);
}

}  // namespace lossline::product
