#include <gtest/gtest.h>

#include <limits>

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/water/constant_rate.h"
#include "planner/water/moist_air.h"
#include "tests/numerics/sweep.h"

namespace lossline::water {

constexpr double nan = std::numeric_limits<double>::quiet_NaN();
constexpr double P = standard_pressure;

// The wet bulb that was found gives back the humidity ratio, also for air hotter than boiling.
TEST(WetBulb, GivesBackTheHumidityRatio) {
  for (const double p : {20e3, 84.5e3, P})
    for (const double T : test::sweep(250, 470, 6.1))
      for (const double rh : {0.01, 0.1, 0.4, 0.9}) {
        if (rh * moist_air_saturation_pressure(T) > 0.9 * p) continue;
        const double W = humidity_ratio_from_relative_humidity(T, rh, p);
        const double T_wet = wet_bulb(T, W, p);
        EXPECT_NEAR(humidity_ratio_from_wet_bulb(T, T_wet, p), W, 1e-8 * (1 + W)) << T << ' ' << rh;
      }
}

TEST(WetBulb, LiesBetweenDewPointAndDryBulb) {
  for (const double T : test::sweep(275, 470, 3.7))
    for (const double W : {1e-4, 1e-2, 0.3, 2.0}) {
      if (relative_humidity(T, W, P) > 1) continue;
      const double T_wet = wet_bulb(T, W, P);
      EXPECT_LE(T_wet, T + 1e-9);
      EXPECT_GE(T_wet, dew_point(W, P) - 1e-9);
    }
}

TEST(WetBulb, RisesWithHumidityAndIsTheDryBulbOfSaturatedAir) {
  double before = 0;
  for (const double rh : test::sweep(0, 1, 0.02)) {
    const double T_wet = wet_bulb(333.15, humidity_ratio_from_relative_humidity(333.15, rh, P), P);
    EXPECT_GT(T_wet, before);
    before = T_wet;
  }
  for (const double T : {263.15, 283.15, 353.15})
    EXPECT_NEAR(wet_bulb(T, humidity_ratio_from_relative_humidity(T, 1, P), P), T, 1e-6) << T;
}

TEST(WetBulb, RefusesFogAndWhatIsNotANumber) {
  EXPECT_THROW((void)wet_bulb(300, 0.05, P), Error);
  EXPECT_THROW((void)wet_bulb(nan, 0.01, P), Error);
  EXPECT_THROW((void)wet_bulb(300, nan, P), Error);
  EXPECT_THROW((void)wet_bulb(300, 0.01, nan), Error);
  EXPECT_THROW((void)humidity_ratio_from_wet_bulb(300, 301, P), Error);
  EXPECT_THROW((void)humidity_ratio_from_wet_bulb(300, nan, P), Error);
  EXPECT_EQ(humidity_ratio_from_wet_bulb(350, 275, P), 0);
}

TEST(ConstantRate, RefusesWhatIsOutsideItsRanges) {
  EXPECT_NO_THROW((void)parallel_flow_film(parallel_flow_min));
  EXPECT_THROW((void)parallel_flow_film(0.5), Error);
  EXPECT_THROW((void)parallel_flow_film(9), Error);
  EXPECT_THROW((void)parallel_flow_film(nan), Error);
  EXPECT_EQ(constant_rate_evaporation(50, 320, 320), 0);
  EXPECT_THROW((void)constant_rate_evaporation(50, 310, 320), Error);
  EXPECT_THROW((void)constant_rate_evaporation(nan, 330, 320), Error);
  EXPECT_THROW((void)constant_rate_evaporation(50, nan, 320), Error);
  EXPECT_THROW((void)constant_rate_evaporation(50, 330, nan), Error);
}

}  // namespace lossline::water
