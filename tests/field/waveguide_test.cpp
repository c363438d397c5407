#include "planner/field/waveguide.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/base/error.h"

namespace lossline::field {
namespace {

TEST(Waveguide, WavelengthAndImpedanceMultiplyToTheFreeOnes) {
  // lambda_g / Z = lambda / eta for the TE wave.
  const double f = 2450e6, a = 0.08636;
  EXPECT_NEAR(
      guide_wavelength(f, a) / te10_impedance(f, a) / (speed_of_light / f / vacuum_impedance), 1,
      1e-12);
}

TEST(Waveguide, LossGrowsWithTheRootOfResistivity) {
  const double once = te10_wall_loss(915e6, 0.24765, 0.123825, 2.62e-8);
  EXPECT_NEAR(te10_wall_loss(915e6, 0.24765, 0.123825, 4 * 2.62e-8) / once, 2, 1e-12);
  EXPECT_NEAR(run_loss(20, once, 1.3), 26 * once, 1e-12);
}

// Decibels to share: 10 log10 2 = 3.0103 dB is half. 20 m of ideal aluminium guide (3.816e7 S/m),
// from the loss per metre of checked tables: 0.3618 dB = 8.0 % at 2450 MHz, 0.0694 dB = 1.6 % at
// 915 MHz (a linearised 0.3618 ln(10)/10 would say 8.3 %).
TEST(Waveguide, ARunLosesItsShareExponentially) {
  EXPECT_NEAR(lost_share(3.010299957), 0.5, 1e-9);
  EXPECT_EQ(lost_share(0), 0);
  auto lost = [](double f, double a, double b) {
    return lost_share(run_loss(20, te10_wall_loss(f, a, b, 1 / 3.816e7)));
  };
  EXPECT_NEAR(lost(2450e6, 0.08636, 0.04318), 0.0799, 1e-4);
  EXPECT_NEAR(lost(915e6, 0.24765, 0.123825), 0.0159, 1e-4);
}

TEST(Waveguide, StandardSectionsShrinkDownTheList) {
  double before = 1;
  for (const StandardSection& s : standard_sections()) {
    EXPECT_LT(s.width, before);
    EXPECT_LT(s.height, s.width);
    before = s.width;
  }
}

TEST(Waveguide, SaysWhenAWaveDoesNotPropagate) {
  try {
    guide_wavelength(915e6, 0.08636);
    FAIL() << "915 MHz does not propagate in this guide";
  } catch (const Error& e) {
    EXPECT_NE(std::string(e.what()).find("must be above 1736 MHz"), std::string::npos) << e.what();
  }
  EXPECT_THROW(te10_wall_loss(915e6, 0.08636, 0.04318, 2.62e-8), Error);
  EXPECT_THROW(te10_cutoff(0), Error);
  EXPECT_THROW(te10_wall_loss(2450e6, 0.08636, 0.04318, std::numeric_limits<double>::quiet_NaN()),
               Error);
  EXPECT_THROW(run_loss(10, 0.01, 0.5), Error);
}

}  // namespace
}  // namespace lossline::field
