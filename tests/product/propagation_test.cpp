#include "planner/product/propagation.h"

#include <gtest/gtest.h>

#include <cmath>
#include <complex>
#include <limits>

#include "planner/base/constants.h"
#include "planner/base/error.h"

namespace lossline::product {

using Complex = std::complex<double>;

TEST(AttenuationConstant, IsTheImaginaryPartOfTheWaveNumber) {
  for (const Complex eps : {Complex{2, -1e-6}, Complex{10, -2}, Complex{3, -40}}) {
    const double k0 = 2 * pi * 2.45e9 / speed_of_light;
    EXPECT_NEAR(attenuation_constant(eps, 2.45e9) / (-k0 * std::sqrt(eps).imag()), 1, 1e-9) << eps;
  }
}

TEST(PenetrationDepth, OfPowerIsHalfThatOfTheFieldAndEndlessWithoutLoss) {
  EXPECT_DOUBLE_EQ(penetration_depth({10, -2}, 1e9) * 2 * attenuation_constant({10, -2}, 1e9), 1);
  EXPECT_NEAR(std::exp(-half_power_depth({10, -2}, 1e9) / penetration_depth({10, -2}, 1e9)), 0.5,
              1e-15);
  EXPECT_TRUE(std::isinf(penetration_depth({10, 0.0}, 1e9)));
}

TEST(PenetrationDepth, LowLossFormIsWithinOnePerCentBelowItsLimit) {
  const double ratio =
      penetration_depth_low_loss({5, -1.4}, 1e9) / penetration_depth({5, -1.4}, 1e9);
  EXPECT_LT(ratio, 1);
  EXPECT_GT(ratio, 0.99);
}

TEST(SurfaceTransmission, AgreesWithTheReflectionCoefficient) {
  for (const Complex eps : {Complex{1, 0}, Complex{4, -0.5}, Complex{80, -10}}) {
    const Complex n = std::sqrt(eps);
    EXPECT_NEAR(surface_transmission(eps), 1 - std::norm((1.0 - n) / (1.0 + n)), 1e-14);
  }
}

TEST(Propagation, RefusesGainAndNan) {
  const double nan = std::numeric_limits<double>::quiet_NaN();
  EXPECT_THROW((void)attenuation_constant({3, 0.1}, 1e9), Error);
  EXPECT_THROW((void)attenuation_constant({-3, -0.1}, 1e9), Error);
  EXPECT_THROW((void)attenuation_constant({3, nan}, 1e9), Error);
  EXPECT_THROW((void)attenuation_constant({3, -0.1}, 0), Error);
  EXPECT_THROW((void)volumetric_power(1e9, -1, 1), Error);
  EXPECT_THROW((void)volumetric_power(1e9, 1, nan), Error);
  EXPECT_DOUBLE_EQ(volumetric_power(1e9, 0, 1e5), 0);
}

}  // namespace lossline::product
