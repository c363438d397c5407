#include "planner/field/cavity_modes.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/error.h"

namespace lossline::field {
namespace {

// Own count for a cube of side a: the lowest mode is 110 (three of them) at c/(a sqrt 2), then 111
// (two) at c sqrt(3)/(2a), then 210 (six) at c sqrt(5)/(2a).
TEST(CavityModes, CountTheFirstModesOfACube) {
  const Box cube{1, 1, 1};
  const double unit = 299792458.0 / 2;
  EXPECT_EQ(mode_count(unit * 1.41, cube), 0);
  EXPECT_EQ(mode_count(unit * 1.42, cube), 3);
  EXPECT_EQ(mode_count(unit * 1.74, cube), 5);
  EXPECT_EQ(mode_count(unit * 2.24, cube), 11);
}

// 1317.6 and 4.355 per MHz, 4365.6 and 5.365: printed digits of an independent implementation.
TEST(CavityModes, MatchSmoothCountAndDensity) {
  EXPECT_NEAR(smooth_mode_count(2450e6, {1.2, 1.0, 0.8}), 4365.6, 0.05);
  EXPECT_NEAR(mode_density(2450e6, {1.2, 1.0, 0.8}) * 1e6, 5.365, 5e-4);
  EXPECT_NEAR(smooth_mode_count(915e6, {2.5, 1.6, 1.4}), 1317.6, 0.05);
  EXPECT_NEAR(mode_density(915e6, {2.5, 1.6, 1.4}) * 1e6, 4.355, 5e-4);
}

TEST(CavityModes, OverlapIsDensityTimesTheResonanceWidth) {
  EXPECT_NEAR(modal_overlap(2450e6, 1.2, 1.0, 0.8, 1000), 5.365 * 2.45, 0.01);
  EXPECT_EQ(modal_overlap(2450e6, 1.2, 1.0, 0.8, 0), std::numeric_limits<double>::infinity());
}

TEST(CavityModes, HotSpotsLieHalfAWavelengthApart) {
  EXPECT_NEAR(hot_spot_pitch(2450e6), 0.0612, 5e-5);
  EXPECT_NEAR(hot_spot_pitch(915e6), 0.1638, 5e-5);
  EXPECT_NEAR(frequency_of_pitch(hot_spot_pitch(2450e6)), 2450e6, 1e-3);
}

TEST(CavityModes, RefuseWhatTheyCannotUse) {
  EXPECT_THROW(mode_count(0, {1, 1, 1}), Error);
  EXPECT_THROW(mode_count(1e9, {1, 0, 1}), Error);
  EXPECT_THROW(mode_count(1e12, {3, 3, 3}), Error);
  EXPECT_THROW(modes_in_band(2e9, 1e9, {1, 1, 1}), Error);
  EXPECT_THROW(modal_overlap(1e9, 1, 1, 1, std::numeric_limits<double>::quiet_NaN()), Error);
  EXPECT_THROW(hole_cross_section(1e9, 0), Error);
}

}  // namespace
}  // namespace lossline::field
