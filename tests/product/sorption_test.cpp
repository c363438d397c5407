#include "planner/product/sorption.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/water/if97.h"
#include "tests/product/isotherms_for_tests.h"

namespace lossline::product {
namespace {

const double nan = std::numeric_limits<double>::quiet_NaN();
const Isotherm wood{HailwoodHorrobin{}, 273.15, 373.15, 0.1, 0.9};

}  // namespace

TEST(Sorption, IsTheIsothermAtItsReferenceTemperature) {
  for (const auto& [name, isotherm] : test::isotherms()) {
    const Sorption sorption(isotherm);
    const double T = sorption.reference_temperature();
    for (double a = 0.03; a <= 0.975; a += 0.005) {
      const double X = moisture(isotherm, a, T);
      if (X < 0.02 * sorption.moisture_end()) continue;  // Chung and Pfost start above zero
      // a cubic over a thousandth of the moisture range; Dubinin's form ends with a vertical
      // tangent
      EXPECT_NEAR(sorption.activity(X, T).a, a, name == "Dubinin" && a > 0.9 ? 5e-3 : 2e-5)
          << name << " " << X;
      EXPECT_NEAR(sorption.equilibrium_moisture(a, T) / X, 1, 2e-4) << name << " " << a;
    }
  }
}

TEST(Sorption, ObeysClausiusAndClapeyron) {
  for (const auto& [name, isotherm] : test::isotherms()) {
    const Sorption sorption(isotherm);
    for (double share = 0.01; share < 1; share += 0.0517) {
      const double X = share * sorption.moisture_end();
      for (const double T : {290.0, 340.0, 420.0}) {
        const double a = sorption.activity(X, T).a;
        if (!(a > 1e-200 && a < 0.97)) continue;  // beyond 0.98 it is led to 1
        const double d = 1e-5;
        const double by_difference = (std::log(sorption.activity(X, 1 / (1 / T + d)).a) -
                                      std::log(sorption.activity(X, 1 / (1 / T - d)).a)) /
                                     (2 * d);
        const double q = sorption.net_heat(X).value;
        // d ln a / d(1/T) = -q Mw/R; the difference is exact but for rounding, 1e-16/1e-5
        EXPECT_NEAR(by_difference, -q * water_molar_mass / gas_constant,
                    1e-9 * (1000 + std::abs(by_difference)))
            << name << " " << X << " " << T;
      }
    }
  }
}

TEST(Sorption, HeatIsTheSlopeOfTheBoundHeat) {
  for (const auto& [name, isotherm] : test::isotherms()) {
    const Sorption sorption(isotherm);
    const double end = sorption.moisture_end(), d = 1e-7 * end;
    double largest = 1;
    for (double X = 0; X < end; X += 0.01 * end)
      largest = std::max(largest, sorption.net_heat(X).value);
    for (double X = -0.05 * end; X < 1.2 * end; X += 0.00731 * end) {
      const double slope =
          (sorption.bound_heat(X + d).value - sorption.bound_heat(X - d).value) / (2 * d);
      EXPECT_NEAR(slope, sorption.net_heat(X).value, 1e-5 * largest) << name << " " << X;
      EXPECT_EQ(sorption.bound_heat(X).slope, sorption.net_heat(X).value);
      EXPECT_GE(sorption.net_heat(X).value, 0);
    }
    EXPECT_EQ(sorption.bound_heat(0).value, 0);
    EXPECT_EQ(sorption.net_heat(1.01 * end).value, 0);
    EXPECT_EQ(sorption.bound_heat(2 * end).value, sorption.bound_heat(3 * end).value);
  }
}

TEST(Sorption, DerivativesAgreeWithDifferences) {
  for (const auto& [name, isotherm] : test::isotherms()) {
    const Sorption sorption(isotherm);
    const double end = sorption.moisture_end(), d = 1e-6 * end;
    for (double X = -0.02 * end; X < 1.1 * end; X += 0.00537 * end) {
      for (const double T : {285.0, 330.0, 400.0}) {
        const ActivityValue value = sorption.activity(X, T);
        const double by_X =
            (sorption.activity(X + d, T).a - sorption.activity(X - d, T).a) / (2 * d);
        const double by_T =
            (sorption.activity(X, T + 1e-3).a - sorption.activity(X, T - 1e-3).a) / 2e-3;
        // a C1 cubic: the second derivative times d at most, plus rounding
        EXPECT_NEAR(value.da_dX * end, by_X * end, 2e-3) << name << " " << X << " " << T;
        EXPECT_NEAR(value.da_dT, by_T, 1e-8) << name << " " << X << " " << T;
      }
    }
  }
}

TEST(Sorption, ActivityRisesWithMoistureUpToTheBoilingPointAndNeverPassesOne) {
  for (const auto& [name, isotherm] : test::isotherms()) {
    const Sorption sorption(isotherm);
    const double end = sorption.moisture_end();
    for (double T = Sorption::cold_end; T <= Sorption::hot_end; T += 10) {
      const double pressure = water::saturation_pressure(T);
      double before = -1e9;
      for (double X = -0.01 * end; X < 1.1 * end; X += 0.00037 * end) {
        const double a = sorption.activity(X, T).a;
        if (a * pressure <= standard_pressure) {
          EXPECT_GE(a, before - 1e-12) << name << " " << X << " " << T;
        }
        EXPECT_LE(a, 1) << name << " " << X << " " << T;
        before = a;
      }
      EXPECT_EQ(before, 1) << name;
    }
  }
}

TEST(Sorption, KeepsTheHeatOfTheIsothermWhereItCan) {
  // Wood at 8 % and 50 degC: the isotherm itself between 0 and 100 degC.
  const Sorption sorption(wood);
  const double X = 0.08;
  const double expected = gas_constant / water_molar_mass *
                          std::log(activity(wood, X, 373.15) / activity(wood, X, 273.15)) /
                          (1 / 273.15 - 1 / 373.15);
  EXPECT_GT(expected, 1e5);
  EXPECT_LT(expected, 5e5);
  EXPECT_NEAR(sorption.net_heat(X).value / expected, 1, 1e-4);
}

TEST(Sorption, TakesAGivenHeat) {
  const Isotherm oswin{Oswin{0.1, 0, 0.5, 0}, 298.15, 298.15};
  const Sorption sorption(oswin, 313.15, {4e5, 0.05});
  EXPECT_EQ(sorption.reference_temperature(), 313.15);
  // the table rounds corners over a few of its cells of 0.0014: (0.0014/0.05)^2 times 1.5
  EXPECT_NEAR(sorption.net_heat(0.02).value, 4e5 * std::exp(-0.4), 1.3e-3 * 2.68e5);
  // Qb = q0 Xq (1 - exp(-X/Xq)) where nothing had to be lowered
  EXPECT_NEAR(sorption.bound_heat(0.1).value, 4e5 * 0.05 * (1 - std::exp(-2.0)), 1.3e-3 * 17293);
  EXPECT_LT(sorption.heat_reduction(), 0.01);
  const Sorption without(oswin, 298.15, {0, 1});
  EXPECT_EQ(without.net_heat(0.05).value, 0);
  EXPECT_EQ(without.activity(0.05, 280).a, without.activity(0.05, 400).a);
}

TEST(Sorption, SaysHowMuchHeatItHadToLeaveOut) {
  // 2 MJ/kg that decays over 1 kg/kg cannot be had by an isotherm that ends at 0.7: at 200 degC the
  // activity would pass 1.
  const Isotherm oswin{Oswin{0.1, 0, 0.5, 0}, 298.15, 298.15};
  EXPECT_GT(Sorption(oswin, 298.15, {2e6, 1}).heat_reduction(), 0.5);
}

TEST(Sorption, EquilibriumMoistureIsTheInverse) {
  for (const auto& [name, isotherm] : test::isotherms()) {
    const Sorption sorption(isotherm);
    for (const double T : {Sorption::cold_end, 320.0, 400.0, Sorption::hot_end})
      for (double a = 0.01; a < 1; a += 0.0317) {
        const double X = sorption.equilibrium_moisture(a, T);
        EXPECT_NEAR(sorption.activity(X, T).a, a, 1e-9) << name << " " << T << " " << a;
      }
    EXPECT_EQ(sorption.equilibrium_moisture(0, 300), 0) << name;
    EXPECT_EQ(sorption.equilibrium_moisture(1, 300), sorption.moisture_end()) << name;
  }
}

TEST(FreeWater, HasActivityOneButForAShortRamp) {
  const Sorption water = Sorption::free_water();
  EXPECT_NEAR(water.activity(0.5e-3, 350).a, 0.5, 1e-12);
  EXPECT_NEAR(water.activity(0.5e-3, 350).da_dX, 1e3, 1e-6);
  EXPECT_NEAR(water.activity(1e-3, 350).a, 0.995, 1e-12);
  EXPECT_EQ(water.activity(1.02e-3, 350).a, 1);
  EXPECT_EQ(water.activity(5, 350).a, 1);
  EXPECT_EQ(water.activity(5, 350).da_dT, 0);
  EXPECT_NEAR(water.activity(-1e-4, 350).a, -0.1, 1e-12);
  EXPECT_EQ(water.bound_heat(1).value, 0);
  EXPECT_NEAR(water.equilibrium_moisture(0.3, 350), 0.3e-3, 1e-12);
}

TEST(Sorption, PassesNanOnAndRefusesItWhereItIsAsked) {
  const Sorption sorption(wood);
  EXPECT_TRUE(std::isnan(sorption.activity(nan, 300).a));
  EXPECT_TRUE(std::isnan(sorption.activity(0.1, nan).a));
  EXPECT_TRUE(std::isnan(sorption.bound_heat(nan).value));
  EXPECT_THROW((void)sorption.equilibrium_moisture(nan, 300), Error);
  EXPECT_THROW((void)sorption.equilibrium_moisture(-0.1, 300), Error);
  EXPECT_THROW((void)sorption.equilibrium_moisture(0.5, 600), Error);
  EXPECT_THROW(Sorption(wood, nan, {0, 1}), Error);
  EXPECT_THROW(Sorption(wood, 300, {-1, 1}), Error);
  EXPECT_THROW(Sorption(wood, 300, {1e5, nan}), Error);
  EXPECT_THROW(Sorption(Isotherm{Gab{{nan, 0}, {10, 0}, {0.9, 0}}}), Error);
}

}  // namespace lossline::product
