#include "planner/product/isotherm.h"

#include <gtest/gtest.h>

#include <limits>

#include "planner/base/error.h"
#include "tests/product/isotherms_for_tests.h"

namespace lossline::product {

const double nan = std::numeric_limits<double>::quiet_NaN();

TEST(Isotherms, AreUndoneByTheirInverse) {
  for (const auto& [name, isotherm] : test::isotherms())
    for (const double T : {isotherm.T_min, 0.5 * (isotherm.T_min + isotherm.T_max), isotherm.T_max})
      for (double a = 0.05; a < 0.99; a += 0.01) {
        const double X = moisture(isotherm, a, T);
        if (X == 0) continue;  // below what Chung and Pfost's form has at zero moisture
        EXPECT_NEAR(activity(isotherm, X, T), a, 1e-9) << name << " " << T;
      }
}

TEST(Isotherms, RiseWithActivityAndStartAtZero) {
  for (const auto& [name, isotherm] : test::isotherms()) {
    const double T = 0.5 * (isotherm.T_min + isotherm.T_max);
    EXPECT_EQ(moisture(isotherm, 0, T), 0) << name;
    double before = 0;
    for (double a = 0.02; a <= 1; a += 0.02) {
      const double X = moisture(isotherm, a, T);
      EXPECT_TRUE(X > before || (X == 0 && a < 0.1)) << name << " " << a;
      before = X;
    }
    EXPECT_GE(moisture(isotherm, 1, T), before) << name;
    EXPECT_EQ(moisture(isotherm, 1.5, T), moisture(isotherm, 1, T)) << name;
  }
}

TEST(Isotherms, GiveAnActivityUpToOneForAnyMoisture) {
  for (const auto& [name, isotherm] : test::isotherms()) {
    const double T = 0.5 * (isotherm.T_min + isotherm.T_max);
    for (double X = 0; X < 50; X = 2 * X + 1e-4) {
      const double a = activity(isotherm, X, T);
      EXPECT_TRUE(a >= 0 && a <= 1) << name << " " << X << " " << a;
    }
    EXPECT_GT(activity(isotherm, 50, T), 0.9) << name;
  }
}

TEST(Isotherms, KnowTheirRanges) {
  const Isotherm corn{ModifiedHenderson{8.6541e-5, 1.8634, 49.810}, 273.15, 343.15, 0.1, 0.9};
  EXPECT_TRUE(in_range(corn, 0.5, 300));
  EXPECT_FALSE(in_range(corn, 0.95, 300));
  EXPECT_FALSE(in_range(corn, 0.5, 350));
  EXPECT_FALSE(in_range(corn, nan, 300));
  EXPECT_FALSE(in_range(corn, 0.5, nan));
}

TEST(Isotherms, RefuseNanAndTemperaturesWithoutAnAnswer) {
  for (const auto& [name, isotherm] : test::isotherms()) {
    EXPECT_THROW((void)moisture(isotherm, nan, 300), Error) << name;
    EXPECT_THROW((void)moisture(isotherm, -0.1, 300), Error) << name;
    EXPECT_THROW((void)moisture(isotherm, 0.5, nan), Error) << name;
    EXPECT_THROW((void)activity(isotherm, nan, 300), Error) << name;
    EXPECT_THROW((void)activity(isotherm, -0.1, 300), Error) << name;
    EXPECT_THROW((void)activity(isotherm, 0.1, 100), Error) << name;
  }
  // k0 + k1 t of this pasta is negative from 101 degC on
  const Isotherm pasta{Oswin{0.176, -1.748e-3, 0.182, 6.946e-3}, 313.15, 353.15};
  EXPECT_THROW((void)moisture(pasta, 0.5, 380), Error);
  EXPECT_THROW((void)moisture(Isotherm{HailwoodHorrobin{}}, 0.5, 380), Error);
}

TEST(Isotherms, RefuseConstantsThatCannotBe) {
  EXPECT_THROW(check(Isotherm{Gab{{-0.1, 0}, {10, 0}, {0.9, 0}}}), Error);
  EXPECT_THROW(check(Isotherm{ModifiedHenderson{8e-5, nan, 50}}), Error);
  EXPECT_THROW(check(Isotherm{Freundlich{0.3, 0}}), Error);
  EXPECT_THROW(check(Isotherm{Freundlich{0.3, 0.6}, 350, 300}), Error);
  for (const auto& [name, isotherm] : test::isotherms()) EXPECT_NO_THROW(check(isotherm)) << name;
}

}  // namespace lossline::product
