#include "planner/product/cure.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numbers>

#include "planner/base/constants.h"
#include "planner/product/range_check.h"

namespace lossline::product {
namespace {

constexpr double tiny = std::numeric_limits<double>::min();
constexpr double huge = std::numeric_limits<double>::max();

/// x^p, quick for the exponents that occur most.
double power(double x, double p) {
  if (p == 1) return x;
  if (p == 0) return 1;
  if (p == 2) return x * x;
  return std::pow(x, p);
}

double form_rate(const NthOrder& f, double alpha, double T) {
  return f.k.at(T) * power(1 - alpha, f.n);
}

double form_rate(const KamalSourour& f, double alpha, double T) {
  const double free = (f.k1.at(T) + f.k2.at(T) * power(alpha, f.m)) * power(1 - alpha, f.n);
  if (f.vitrification == 0) return free;
  return free / (1 + std::exp(f.vitrification * (alpha - f.vitrified_at)));
}

double form_rate(const LeeLoosSpringer& f, double alpha, double T) {
  if (alpha > f.switch_alpha) return f.k3.at(T) * (1 - alpha);
  return (f.k1.at(T) + f.k2.at(T) * alpha) * (1 - alpha) * (f.B - alpha);
}

double form_rate(const KamalRyan& f, double alpha, double T) {
  const double K = f.K.at(T);
  if (alpha < f.seed) {
    const double own = std::pow(f.seed / ((1 - f.seed) * K), 1 / f.n);
    return f.seed / (f.t0 * std::exp(f.T0 / T) + own);
  }
  return f.n * std::pow(K, 1 / f.n) * std::pow(alpha, 1 - 1 / f.n) *
         std::pow(1 - alpha, 1 + 1 / f.n);
}

void check_constant(const char* name, const RateConstant& k, double least) {
  checked(name, k.A, "1/s", least, huge);
  checked("activation energy", k.E, "J/mol", 0, 1e6);
}

struct ModelCheck {
  void operator()(const NthOrder& f) const {
    check_constant("A of the cure", f.k, tiny);
    checked("order of the cure", f.n, "1", 0, 10);
  }
  void operator()(const KamalSourour& f) const {
    check_constant("A1 of the cure", f.k1, 0);
    check_constant("A2 of the cure", f.k2, 0);
    checked("m of the cure", f.m, "1", 0, 10);
    checked("n of the cure", f.n, "1", 0, 10);
    checked("vitrification constant", f.vitrification, "1", 0, 1e3);
  }
  void operator()(const LeeLoosSpringer& f) const {
    check_constant("A1 of the cure", f.k1, tiny);
    check_constant("A2 of the cure", f.k2, -huge);
    check_constant("A3 of the cure", f.k3, tiny);
    checked("switch of the cure", f.switch_alpha, "1", 0, 1);
    checked("B of the cure", f.B, "1", f.switch_alpha, 10);
  }
  void operator()(const KamalRyan& f) const {
    check_constant("A of the cure", f.K, tiny);
    checked("n of the cure", f.n, "1", 0.1, 20);
    checked("t0 of the induction", f.t0, "s", 0, huge);
    checked("T0 of the induction", f.T0, "K", -1e6, 1e6);
    checked("seed of the cure", f.seed, "1", 1e-6, 0.1);
  }
};

}  // namespace

double RateConstant::at(double T) const {
  return A == 0 ? 0 : A * std::exp(-E / (gas_constant * T));
}

double rate(const CureModel& model, double alpha, double T) {
  if (std::isnan(alpha)) return alpha;
  const double held = std::clamp(alpha, 0.0, 1.0);
  if (held == 1) return 0;
  const double r = std::visit([&](const auto& form) { return form_rate(form, held, T); }, model);
  return r < 0 ? 0 : r;
}

std::optional<double> rate_jump(const CureModel& model) {
  if (const auto* piecewise = std::get_if<LeeLoosSpringer>(&model)) return piecewise->switch_alpha;
  if (const auto* induced = std::get_if<KamalRyan>(&model)) return induced->seed;
  return std::nullopt;
}

void check(const CureModel& model) {
  std::visit(ModelCheck{}, model);
}

NthOrder first_order_from_t90(double time_to_90, double T_ref, double E) {
  checked("time to 90 % cure", time_to_90, "s", tiny, huge);
  checked("reference temperature", T_ref, "K", 150, 1000);
  checked("activation energy", E, "J/mol", 0, 1e6);
  const double k = std::numbers::ln10 / time_to_90;
  return {
      {checked("A of the cure", k * std::exp(E / (gas_constant * T_ref)), "1/s", tiny, huge), E},
      1};
}

double glass_transition(double alpha, double T_uncured, double T_full, double lambda) {
  checked("degree of cure", alpha, "1", 0, 1);
  checked("glass transition, uncured", T_uncured, "K", 1, 2000);
  checked("glass transition, full cure", T_full, "K", T_uncured, 2000);
  checked("lambda of the glass transition", lambda, "1", 1e-6, 1);
  return T_uncured + (T_full - T_uncured) * lambda * alpha / (1 - (1 - lambda) * alpha);
}

}  // namespace lossline::product
