#include "planner/water/moist_air.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/base/error.h"
#include "planner/water/bed_water.h"
#include "planner/water/if97.h"
#include "tests/numerics/sweep.h"

namespace lossline::water {

constexpr double nan = std::numeric_limits<double>::quiet_NaN();
constexpr double P = standard_pressure;

// Hyland-Wexler (used by ASHRAE) and IAPWS differ by up to 0.04 % from 0 to 200 degC.
TEST(MoistAirSaturationPressure, AgreesWithTheSteamTables) {
  for (const double T : test::sweep(273.16, 473.15, 1))
    EXPECT_NEAR(moist_air_saturation_pressure(T) / saturation_pressure(T), 1, 5e-4) << T;
}

TEST(MoistAirSaturationPressure, RisesThroughTheTriplePointWithoutAJump) {
  double before = 0;
  for (const double T : test::sweep(moist_air_T_min, moist_air_T_max, 0.05)) {
    EXPECT_GT(moist_air_saturation_pressure(T), before) << T;
    before = moist_air_saturation_pressure(T);
  }
  EXPECT_NEAR(moist_air_saturation_pressure(273.16) / moist_air_saturation_pressure(273.1600001), 1,
              1e-4);
}

TEST(MoistAir, HumidityMeasuresUndoOneAnother) {
  for (const double p : {20e3, 84.5e3, P})
    for (const double T : test::sweep(243.15, 423, 9.7))
      for (const double rh : {0.03, 0.2, 0.5, 0.8}) {
        if (rh * moist_air_saturation_pressure(T) > 0.9 * p) continue;
        const double W = humidity_ratio_from_relative_humidity(T, rh, p);
        EXPECT_NEAR(relative_humidity(T, W, p), rh, 1e-13);
        EXPECT_NEAR(humidity_ratio_from_dew_point(dew_point(W, p), p) / W, 1, 1e-9);
        EXPECT_NEAR(moist_air_saturation_pressure(dew_point(W, p)) / vapour_pressure(W, p), 1,
                    1e-9);
      }
}

TEST(DewPoint, IsTheLowestTemperatureForDryAir) {
  EXPECT_EQ(dew_point(0, P), moist_air_T_min);
  EXPECT_EQ(dew_point(1e-9, P), moist_air_T_min);
  EXPECT_GT(dew_point(1e-6, P), moist_air_T_min);
  // Nearly pure steam at one atmosphere condenses just below boiling.
  EXPECT_NEAR(dew_point(humidity_ratio_max, P), 373.1, 0.1);
}

TEST(AirEnthalpy, IsUndoneByAirTemperature) {
  for (const double Y : {0.0, 1e-3, 0.02, 0.4, 5.0})
    for (const double T : test::sweep(230, 700, 7.3))
      EXPECT_NEAR(air_temperature(air_enthalpy(T, Y), Y), T, 1e-9) << Y;
}

// The difference the header states, relative to the vapour part.
TEST(AirEnthalpy, DiffersFromTheHandbookAsStated) {
  const auto difference = [](double celsius) {
    const double T = celsius + celsius_zero, vapour = ashrae_enthalpy(T, 1) - ashrae_enthalpy(T, 0);
    return (vapour_enthalpy(T) - vapour) / vapour;
  };
  EXPECT_NEAR(difference(0), -0.0007, 5e-5);
  EXPECT_NEAR(difference(20), 0, 5e-4);
  EXPECT_NEAR(difference(40), 0, 5e-4);
  EXPECT_NEAR(difference(100), -0.005, 5e-4);
  EXPECT_NEAR(difference(150), -0.013, 5e-4);
  EXPECT_NEAR(air_enthalpy(323.15, 0), ashrae_enthalpy(323.15, 0), 1e-9);
}

TEST(MoistAir, RefusesWhatIsOutsideItsRanges) {
  EXPECT_NO_THROW((void)moist_air_saturation_pressure(moist_air_T_min));
  EXPECT_NO_THROW((void)moist_air_saturation_pressure(moist_air_T_max));
  EXPECT_THROW((void)moist_air_saturation_pressure(173.1), Error);
  EXPECT_THROW((void)moist_air_saturation_pressure(473.2), Error);
  EXPECT_THROW((void)moist_air_saturation_pressure(nan), Error);
  EXPECT_THROW((void)humidity_ratio_from_relative_humidity(300, 1.01, P), Error);
  EXPECT_THROW((void)humidity_ratio_from_relative_humidity(300, -0.01, P), Error);
  EXPECT_THROW((void)humidity_ratio_from_relative_humidity(300, nan, P), Error);
  EXPECT_THROW((void)humidity_ratio_from_relative_humidity(400, 0.9, P), Error);  // above boiling
  EXPECT_THROW((void)humidity_ratio_from_relative_humidity(300, 0.5, 900), Error);
  EXPECT_THROW((void)humidity_ratio_from_relative_humidity(300, 0.5, nan), Error);
  EXPECT_THROW((void)humidity_ratio_from_dew_point(374, P), Error);
  EXPECT_THROW((void)relative_humidity(nan, 0.01, P), Error);
  EXPECT_THROW((void)relative_humidity(300, -1e-6, P), Error);
  EXPECT_THROW((void)dew_point(nan, P), Error);
  EXPECT_THROW((void)dew_point(0.01, 600e3), Error);
  EXPECT_THROW((void)ashrae_enthalpy(nan, 0.01), Error);
  EXPECT_THROW((void)ashrae_enthalpy(300, nan), Error);
  EXPECT_THROW((void)specific_volume(300, 0.01, nan), Error);
  EXPECT_THROW((void)standard_pressure_at(11001), Error);
  EXPECT_THROW((void)standard_pressure_at(nan), Error);
}

TEST(StandardPressure, IsOneAtmosphereAtTheSea) {
  EXPECT_EQ(standard_pressure_at(0), standard_pressure);
  EXPECT_GT(standard_pressure_at(altitude_min), standard_pressure_at(altitude_max));
}

}  // namespace lossline::water
