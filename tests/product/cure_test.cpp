#include "planner/product/cure.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/error.h"

namespace lossline::product {
namespace {

const double nan = std::numeric_limits<double>::quiet_NaN();

double cured(const CureModel& model, double T, double from, double time, int steps) {
  double a = from;
  const double h = time / steps;
  for (int i = 0; i < steps; ++i) {
    const double k1 = rate(model, a, T), k2 = rate(model, a + 0.5 * h * k1, T);
    const double k3 = rate(model, a + 0.5 * h * k2, T), k4 = rate(model, a + h * k3, T);
    a += h / 6 * (k1 + 2 * k2 + 2 * k3 + k4);
  }
  return a;
}

const CureModel models[] = {
    NthOrder{{1e6, 6e4}, 1.5}, KamalSourour{{1e5, 6e4}, {1e6, 5.5e4}, 0.8, 1.4, 30, 0.9},
    LeeLoosSpringer{{3.5e7, 80700}, {-3.36e7, 77800}, {3267, 56600}, 0.47, 0.3},
    KamalRyan{{1e4, 5e4}, 2, 1e-3, 4000, 0.01}};

}  // namespace

TEST(FirstOrderFromT90, ReachesNinetyPerCentInThatTime) {
  const CureModel model = first_order_from_t90(240, 453.15, 8e4);
  EXPECT_NEAR(cured(model, 453.15, 0, 240, 2000), 0.9, 1e-10);
  // ten kelvin hotter: faster by exp[E/R (1/T1 - 1/T2)]
  const double faster = std::exp(8e4 / 8.314462618 * (1 / 453.15 - 1 / 463.15));
  EXPECT_NEAR(rate(model, 0, 463.15) / rate(model, 0, 453.15), faster, 1e-12);
}

TEST(KamalRyanCure, IsExactBeyondTheInduction) {
  const KamalRyan form{{1e-4, 0}, 2, 30, 0, 0.01};
  // isothermal: K 1e-4 1/s2, ti 30 s
  for (const double t : {60.0, 130.0, 330.0}) {
    const double x = 1e-4 * (t - 30) * (t - 30);
    const double seed_time = 30 + std::sqrt(0.01 / 0.99 / 1e-4);
    EXPECT_NEAR(cured(form, 400, 0.01, t - seed_time, 4000), x / (1 + x), 1e-8) << t;
    EXPECT_NEAR(0.01 / rate(form, 0.0, 400), seed_time, 1e-9);
  }
  EXPECT_EQ(rate_jump(form), 0.01);
}

TEST(KamalRyanCure, InductionShortensWithTemperature) {
  const CureModel rubber = KamalRyan{{1e4, 5e4}, 2, 1e-3, 4000, 0.01};
  // t0 exp(T0/T) alone falls by exp[4000 (1/420 - 1/450)] = 1.89, the own part by less: E/n is 25
  // kJ/mol, exp[3007 (1/420 - 1/450)] = 1.61
  const double ratio = rate(rubber, 0, 450) / rate(rubber, 0, 420);
  EXPECT_GT(ratio, 1.61);
  EXPECT_LT(ratio, 1.89);
}

TEST(KamalSourourCure, IsSlowedByVitrification) {
  const KamalSourour free{{1e5, 6e4}, {1e6, 5.5e4}, 0.8, 1.4};
  KamalSourour slowed = free;
  slowed.vitrification = 30;
  slowed.vitrified_at = 0.7;
  EXPECT_NEAR(rate(slowed, 0.1, 400) / rate(free, 0.1, 400), 1, 1e-7);
  EXPECT_NEAR(rate(slowed, 0.7, 400) / rate(free, 0.7, 400), 0.5, 1e-12);
}

TEST(LeeLoosSpringerCure, JumpsAtItsSwitch) {
  const CureModel resin = models[2];
  ASSERT_TRUE(rate_jump(resin).has_value());
  const double at = *rate_jump(resin);
  EXPECT_GT(rate(resin, std::nextafter(at, 1), 390.15), 2.5 * rate(resin, at, 390.15));
  EXPECT_FALSE(rate_jump(models[0]).has_value());
}

TEST(CureModels, StayBetweenZeroAndOne) {
  for (const CureModel& model : models) {
    EXPECT_NO_THROW(check(model));
    for (double T = 280; T < 600; T += 40)
      for (double a = -0.2; a <= 1.2; a += 0.01) {
        const double r = rate(model, a, T);
        EXPECT_TRUE(r >= 0 && std::isfinite(r)) << model.index() << " " << a << " " << T;
        if (a >= 1) {
          EXPECT_EQ(r, 0);
        }
      }
    EXPECT_EQ(rate(model, -0.1, 400), rate(model, 0, 400));
    EXPECT_TRUE(std::isnan(rate(model, nan, 400)));
    EXPECT_TRUE(std::isnan(rate(model, 0.2, nan)));
  }
}

TEST(GlassTransition, RunsFromUncuredToFullCure) {
  EXPECT_DOUBLE_EQ(glass_transition(0, 260, 440, 0.4), 260);
  EXPECT_DOUBLE_EQ(glass_transition(1, 260, 440, 0.4), 440);
  EXPECT_LT(glass_transition(0.5, 260, 440, 0.4), 350);
  EXPECT_NEAR(glass_transition(0.5, 260, 440, 1), 350, 1e-12);
}

TEST(CureModels, RefuseConstantsThatCannotBe) {
  EXPECT_THROW(check(NthOrder{{0, 6e4}, 1}), Error);
  EXPECT_THROW(check(NthOrder{{1e6, -1}, 1}), Error);
  EXPECT_THROW(check(KamalSourour{{1e5, 6e4}, {1e6, 5e4}, nan, 1}), Error);
  EXPECT_THROW(check(LeeLoosSpringer{{1, 1}, {1, 1}, {1, 1}, 0.2, 0.3}), Error);
  EXPECT_THROW(check(KamalRyan{{1, 1}, 2, -1, 0, 0.01}), Error);
  EXPECT_THROW((void)first_order_from_t90(nan, 450, 8e4), Error);
  EXPECT_THROW((void)first_order_from_t90(0, 450, 8e4), Error);
  EXPECT_THROW((void)glass_transition(1.1, 260, 440, 0.4), Error);
}

}  // namespace lossline::product
