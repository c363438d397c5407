#include "planner/field/angle_classes.h"

#include <gtest/gtest.h>

#include <cmath>

#include "planner/base/constants.h"
#include "planner/base/error.h"

namespace lossline::field {
namespace {

TEST(AngleClasses, IntegratePowersOfTheCosineExactly) {
  // mu^p = t^(2p) with the measure 2 t dt: degree 2p + 1 <= 2n - 1.
  const AngleClasses classes(12);
  for (int p = 0; p <= 11; ++p) {
    double sum = 0;
    for (std::size_t i = 0; i < classes.size(); ++i)
      sum += classes.weight(i) * std::pow(classes.mu(i), p);
    EXPECT_NEAR(sum, 1.0 / (p + 1), 1e-14) << p;
  }
}

TEST(AngleClasses, AscendWithinTheOpenInterval) {
  const AngleClasses classes;
  ASSERT_EQ(classes.size(), 12U);
  for (std::size_t i = 0; i < classes.size(); ++i) {
    EXPECT_GT(classes.mu(i), i > 0 ? classes.mu(i - 1) : 0);
    EXPECT_LT(classes.mu(i), 1);
    EXPECT_GT(classes.weight(i), 0);
  }
}

// Means over azimuth of |cos phi| (2/pi) and its square (1/2); six graded nodes resolve them to
// better than the 1e-4 asked of them.
TEST(AngleClasses, AverageOverTheAzimuthOfASideFace) {
  const AngleClasses classes(12);
  for (std::size_t i = 0; i < classes.size(); ++i) {
    const double across = std::sqrt(1 - classes.mu(i) * classes.mu(i));
    const auto x = classes.lateral_cosines(i);
    const auto w = classes.lateral_weights();
    double all = 0, mean = 0, square = 0;
    for (std::size_t k = 0; k < x.size(); ++k) {
      all += w[k];
      mean += w[k] * x[k];
      square += w[k] * x[k] * x[k];
    }
    EXPECT_NEAR(all, 1, 1e-14);
    EXPECT_NEAR(mean, across * 2 / pi, 1e-5);
    EXPECT_NEAR(square, across * across / 2, 1e-5);
  }
}

TEST(AngleClasses, RefuseNoneAtAll) {
  EXPECT_THROW(AngleClasses(0), Error);
}

}  // namespace
}  // namespace lossline::field
