#include "planner/numerics/monotone_cubic.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <limits>

#include "planner/base/error.h"
#include "tests/numerics/sweep.h"

namespace lossline::numerics {

constexpr double nan = std::numeric_limits<double>::quiet_NaN();

// Fritsch & Carlson 1980, the radiochemical data "RPN 14" (from memory) (their Figure 1): steep
// rise, long plateau, on which an ordinary spline overshoots.
const std::vector<double> rpn_x{7.99, 8.09, 8.19, 8.7, 9.2, 10, 12, 15, 20};
const std::vector<double> rpn_y{0,        2.76429e-5, 4.37498e-2, 0.169183, 0.469428,
                                0.943740, 0.998636,   0.999919,   0.999994};

TEST(MonotoneCubic, GoesThroughItsPoints) {
  const MonotoneCubic curve(rpn_x, rpn_y, Outside::hold);
  for (std::size_t i = 0; i < rpn_x.size(); ++i)
    EXPECT_NEAR(curve(rpn_x[i]), rpn_y[i], 1e-15) << rpn_x[i];
}

TEST(MonotoneCubic, RisesWithRisingPointsAndNeverOvershoots) {
  const MonotoneCubic curve(rpn_x, rpn_y, Outside::hold);
  double before = -1;
  for (const double x : test::sweep(7.99, 20, 1e-3)) {
    const ValueSlope here = curve.at(x);
    EXPECT_GE(here.value, before - 1e-15) << x;
    EXPECT_GE(here.slope, -1e-13) << x;
    EXPECT_LE(here.value, rpn_y.back() + 1e-15) << x;
    before = here.value;
  }
}

TEST(MonotoneCubic, StaysBetweenNeighboursForPointsThatTurn) {
  const std::vector<double> x{0, 1, 1.5, 4, 4.2, 6}, y{1, 3, -2, -2, 5, 0};
  const MonotoneCubic curve(x, y, Outside::tangent);
  for (std::size_t i = 0; i + 1 < x.size(); ++i)
    for (const double s : test::sweep(0, 1, 0.01)) {
      const double v = curve(x[i] + s * (x[i + 1] - x[i]));
      EXPECT_GE(v, std::min(y[i], y[i + 1]) - 1e-14);
      EXPECT_LE(v, std::max(y[i], y[i + 1]) + 1e-14);
    }
}

TEST(MonotoneCubic, ReproducesAStraightLineAndHasTheSlopeOfItsValues) {
  const MonotoneCubic line({0, 0.3, 2, 5}, {1, 1.6, 5, 11}, Outside::tangent);
  for (const double x : test::sweep(-2, 8, 0.37)) {
    EXPECT_NEAR(line(x), 1 + 2 * x, 1e-13);
    EXPECT_NEAR(line.at(x).slope, 2, 1e-13);
  }
  const MonotoneCubic curve(rpn_x, rpn_y, Outside::hold);
  for (const double x : test::sweep(8, 20, 0.0137)) {
    const double h = 1e-6;
    if (std::any_of(rpn_x.begin(), rpn_x.end(), [&](double p) { return std::abs(p - x) < h; }))
      continue;
    EXPECT_NEAR((curve(x + h) - curve(x - h)) / (2 * h), curve.at(x).slope, 1e-8) << x;
  }
}

TEST(MonotoneCubic, GoesOnAsTheCallerChose) {
  const std::vector<double> x{0, 1, 2}, y{0, 1, 4};
  const MonotoneCubic held(x, y, Outside::hold), straight(x, y, Outside::tangent);
  EXPECT_EQ(held(-1), 0);
  EXPECT_EQ(held(9), 4);
  EXPECT_EQ(held.at(9).slope, 0);
  const double slope = straight.at(2).slope;
  EXPECT_GT(slope, 3);
  EXPECT_NEAR(straight(4), 4 + 2 * slope, 1e-14);
  EXPECT_TRUE(std::isnan(held(nan)));
}

TEST(MonotoneCubic, RefusesPointsItCannotUse) {
  EXPECT_THROW(MonotoneCubic({1}, {1}, Outside::hold), Error);
  EXPECT_THROW(MonotoneCubic({1, 2}, {1}, Outside::hold), Error);
  EXPECT_THROW(MonotoneCubic({1, 1}, {1, 2}, Outside::hold), Error);
  EXPECT_THROW(MonotoneCubic({2, 1}, {1, 2}, Outside::hold), Error);
  EXPECT_THROW(MonotoneCubic({1, nan}, {1, 2}, Outside::hold), Error);
  EXPECT_THROW(MonotoneCubic({1, 2}, {nan, 2}, Outside::hold), Error);
}

}  // namespace lossline::numerics
