#include "planner/water/bed_water.h"

#include <gtest/gtest.h>

#include <cmath>

#include "planner/water/if97.h"
#include "tests/numerics/sweep.h"

namespace lossline::water {

using Dual = numerics::Dual<1>;

// The fits state 0.07 % for the heat of evaporation from 0 to 150 degC.
TEST(BedWater, HasTheHeatOfEvaporationOfIf97WithinItsStatedFit) {
  for (const double T : test::sweep(273.15, 423.15, 0.5))
    EXPECT_NEAR((vapour_enthalpy(T) - liquid_enthalpy(T)) / latent_heat(T), 1, 7e-4) << T;
}

TEST(BedWater, StaysWithinTheStatedDeviationsOfEitherPhase) {
  for (const double T : test::sweep(273.15, 373.15, 0.5))
    EXPECT_NEAR(liquid_enthalpy(T), saturated_liquid_enthalpy(T), 290) << T;
  for (const double T : test::sweep(273.15, 423.15, 0.5)) {
    EXPECT_NEAR(liquid_enthalpy(T), saturated_liquid_enthalpy(T), 3800) << T;
    EXPECT_NEAR(vapour_enthalpy(T), saturated_vapour_enthalpy(T), 2800) << T;
  }
}

TEST(BedWater, VapourEnthalpyIsSmoothWhereTheFitEnds) {
  const double end = celsius_zero + vapour_fit_end;
  const Dual below = vapour_enthalpy(Dual::variable(end - 1e-9, 0));
  const Dual above = vapour_enthalpy(Dual::variable(end + 1e-9, 0));
  EXPECT_NEAR(below.value, above.value, 1e-3);
  EXPECT_NEAR(below.slope[0], above.slope[0], 1e-6);
}

TEST(FastSaturationPressure, IsIf97InsideItsRange) {
  for (const double T : test::sweep(273.15, 640, 1))
    EXPECT_EQ(fast_saturation_pressure(T), saturation_pressure(T)) << T;
}

TEST(FastSaturationPressure, IsSmoothWhereTheEquationHandsOver) {
  for (const double T : {150.0, 273.15, 640.0}) {
    const Dual below = fast_saturation_pressure(Dual::variable(T - 1e-9, 0));
    const Dual above = fast_saturation_pressure(Dual::variable(T + 1e-9, 0));
    EXPECT_NEAR(below.value / above.value, 1, 1e-9) << T;
    EXPECT_NEAR(below.slope[0] / above.slope[0], 1, 1e-8) << T;
  }
}

TEST(FastSaturationPressure, IsPositiveAndIncreasingForEveryTemperature) {
  double before = 0;
  for (const double T : test::sweep(-200, 5000, 0.5)) {
    const double p = fast_saturation_pressure(T);
    EXPECT_GT(p, before) << T;
    before = p;
  }
}

TEST(FastSaturationPressure, HasItsOwnDerivativeInDuals) {
  for (const double T : {100.0, 260.0, 300.0, 373.15, 500.0, 700.0}) {
    const double h = 1e-4 * T;
    const double slope =
        (fast_saturation_pressure(T + h) - fast_saturation_pressure(T - h)) / (2 * h);
    EXPECT_NEAR(fast_saturation_pressure(Dual::variable(T, 0)).slope[0] / slope, 1, 1e-4) << T;
  }
}

TEST(FastSaturationPressure, CarriesEveryDirectionOfADual) {
  numerics::Dual<3> T(350.0);
  T.slope = {1, -2, 0.5};
  const numerics::Dual<3> p = fast_saturation_pressure(T);
  const Dual one = fast_saturation_pressure(Dual::variable(350, 0));
  EXPECT_EQ(p.value, one.value);
  for (std::size_t i = 0; i < 3; ++i) EXPECT_NEAR(p.slope[i] / one.slope[0], T.slope[i], 1e-14);
}

TEST(FastBoilingTemperature, UndoesFastSaturationPressure) {
  for (const double T : test::sweep(20, 1000, 1.3))
    EXPECT_NEAR(fast_boiling_temperature(fast_saturation_pressure(T)) / T, 1, 1e-11) << T;
  const Dual p = fast_saturation_pressure(Dual::variable(350, 0));
  EXPECT_NEAR(fast_boiling_temperature(p).slope[0], 1, 1e-10);
}

}  // namespace lossline::water
