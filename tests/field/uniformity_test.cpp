#include "planner/field/uniformity.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/error.h"

namespace lossline::field {
namespace {

// Printed example: 2450 MHz, 1.2 m of belt, two launchers: N_L = 19.6, .71/sqrt(19.6 * 2) = .113
// per cavity and .05 after five; two and three digits.
TEST(Uniformity, MatchesAWorkedExample) {
  EXPECT_NEAR(independent_places(2450e6, 1.2), 19.6, 0.05);
  UniformityInput in;
  in.frequency = 2450e6;
  in.travel = 1.2;
  in.launchers = 2;
  EXPECT_NEAR(ideal_variation(in), 0.113, 5e-4);
  in.cavities = 5;
  EXPECT_NEAR(ideal_variation(in), 0.05, 1e-3);
}

TEST(Uniformity, AWideSpectrumHelpsAHighQuality) {
  EXPECT_EQ(independent_frequencies(2450e6, 1000, 0), 1);
  // B Q/(pi f) = 1 for B = pi f/Q.
  EXPECT_NEAR(independent_frequencies(2450e6, 1000, 3.14159265358979 * 2.45e6), 2, 1e-12);
}

TEST(Uniformity, UnequalSourcesCountForLess) {
  const double equal[] = {2, 2, 2}, unequal[] = {3, 1, 0}, none[] = {0, 0};
  EXPECT_NEAR(effective_number(equal), 3, 1e-15);
  EXPECT_NEAR(effective_number(unequal), 1.6, 1e-15);
  EXPECT_EQ(effective_number(none), 0);
}

TEST(Uniformity, EdgeStripEndsAtTheMiddleOfTheBed) {
  EXPECT_NEAR(edge_strip(2450e6, {10, -2}, 0.8), 0.0309, 5e-5);  // 1/e power depth, 30.945 mm
  EXPECT_EQ(edge_strip(2450e6, {2.2, -0.001}, 0.8), 0.4);
  EXPECT_EQ(edge_strip(2450e6, {2.2, 0}, 0.8), 0.4);
}

TEST(Uniformity, RefusesWhatItCannotUse) {
  UniformityInput in;
  in.frequency = 2450e6;
  in.launchers = 0.5;
  EXPECT_THROW(ideal_variation(in), Error);
  in.launchers = 1;
  in.travel = std::numeric_limits<double>::quiet_NaN();
  EXPECT_THROW(ideal_variation(in), Error);
}

}  // namespace
}  // namespace lossline::field
