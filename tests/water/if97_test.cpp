#include "planner/water/if97.h"

#include <gtest/gtest.h>

#include <limits>

#include "planner/base/error.h"
#include "tests/numerics/sweep.h"

namespace lossline::water {

constexpr double nan = std::numeric_limits<double>::quiet_NaN();

TEST(SaturationPressure, IsUndoneBySaturationTemperature) {
  for (const double T : test::sweep(274, 646, 1))
    EXPECT_NEAR(saturation_temperature(saturation_pressure(T)) / T, 1, 1e-12) << T;
}

TEST(SaturationPressure, AcceptsItsLimitsAndRefusesBeyondThem) {
  EXPECT_NO_THROW((void)saturation_pressure(saturation_T_min));
  EXPECT_NO_THROW((void)saturation_pressure(saturation_T_max));
  EXPECT_THROW((void)saturation_pressure(273.14), Error);
  EXPECT_THROW((void)saturation_pressure(647.097), Error);
  EXPECT_THROW((void)saturation_pressure(nan), Error);
  EXPECT_NO_THROW((void)saturation_temperature(saturation_p_min));
  EXPECT_NO_THROW((void)saturation_temperature(saturation_p_max));
  EXPECT_THROW((void)saturation_temperature(611.2), Error);
  EXPECT_THROW((void)saturation_temperature(22.07e6), Error);
  EXPECT_THROW((void)saturation_temperature(nan), Error);
}

// cp = dh/dT at constant pressure and, for both phases, v = dg/dp with dh/dp = v - T dv/dT.
// Central differences: truncation and rounding together below 1e-6.
TEST(PhaseState, ObeysItsThermodynamicIdentities) {
  struct Place {
    double T, p;
  };
  const auto check = [](auto state, Place at) {
    const double dT = 0.01, dp = 1e-3 * at.p;
    const PhaseState here = state(at.T, at.p);
    const PhaseState hot = state(at.T + dT, at.p), cold = state(at.T - dT, at.p);
    EXPECT_NEAR((hot.enthalpy - cold.enthalpy) / (2 * dT) / here.heat_capacity, 1, 1e-6) << at.T;
    const double dh_dp =
        (state(at.T, at.p + dp).enthalpy - state(at.T, at.p - dp).enthalpy) / (2 * dp);
    const double want = here.volume - at.T * (hot.volume - cold.volume) / (2 * dT);
    EXPECT_NEAR(dh_dp, want, 1e-5 * here.volume) << at.T;
  };
  for (const Place at : {Place{290, 1e5}, Place{350, 1e6}, Place{420, 5e6}, Place{600, 50e6}})
    check([](double T, double p) { return liquid_state(T, p); }, at);
  for (const Place at : {Place{290, 1e3}, Place{380, 1e5}, Place{500, 1e6}, Place{900, 20e6}})
    check([](double T, double p) { return vapour_state(T, p); }, at);
}

// Clausius-Clapeyron: dp/dT = latent heat / (T (v'' - v')). Regions 1, 2 and 4 of the formulation
// are separate fits that agree on the boiling line to about 0.01 %.
TEST(LatentHeat, AgreesWithTheSlopeOfTheBoilingLine) {
  for (const double T : test::sweep(280, 600, 20)) {
    const double p = saturation_pressure(T);
    const double slope = (saturation_pressure(T + 0.01) - saturation_pressure(T - 0.01)) / 0.02;
    const double volume = vapour_state(T, p).volume - liquid_state(T, p).volume;
    EXPECT_NEAR(latent_heat(T) / (T * volume * slope), 1, 2e-4) << T;
  }
}

TEST(PhaseState, RefusesTheOtherPhaseAndWhatIsOutside) {
  EXPECT_NO_THROW((void)liquid_state(373.15, saturation_pressure(373.15)));
  EXPECT_NO_THROW((void)vapour_state(373.15, saturation_pressure(373.15)));
  EXPECT_THROW((void)liquid_state(373.15, 1e5), Error);
  EXPECT_THROW((void)vapour_state(373.15, 1.02e5), Error);
  EXPECT_THROW((void)vapour_state(373.15, 0), Error);
  EXPECT_THROW((void)vapour_state(700, 31e6), Error);
  EXPECT_THROW((void)liquid_state(623.16, 50e6), Error);
  EXPECT_THROW((void)liquid_state(300, 100.1e6), Error);
  EXPECT_THROW((void)vapour_state(1073.2, 1e5), Error);
  EXPECT_THROW((void)liquid_state(nan, 1e5), Error);
  EXPECT_THROW((void)liquid_state(300, nan), Error);
  EXPECT_THROW((void)vapour_state(nan, 1e3), Error);
  EXPECT_THROW((void)vapour_state(400, nan), Error);
  EXPECT_THROW((void)latent_heat(nan), Error);
  EXPECT_THROW((void)latent_heat(623.2), Error);
}

}  // namespace lossline::water
