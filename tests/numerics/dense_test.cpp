#include "planner/numerics/dense.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/error.h"

namespace lossline::numerics {

TEST(DenseFactor, SolvesASystemThatNeedsPivoting) {
  DenseFactor lu;
  ASSERT_TRUE(lu.factor({0, 2, 1, 1, 1, 1, 2, 0, -1}, 3));
  std::vector<double> b{7, 6, -1};  // of x = (1, 2, 3)
  lu.solve(b);
  EXPECT_NEAR(b[0], 1, 1e-14);
  EXPECT_NEAR(b[1], 2, 1e-14);
  EXPECT_NEAR(b[2], 3, 1e-14);
}

// The inverse of the Hilbert matrix has integer entries; for n = 6 its first row is 36, -630, 3360,
// -7560, 7560, -2772 (closed form by binomials). Condition number 1.5e7, hence 1e-8 relative.
TEST(DenseFactor, InvertsTheHilbertMatrixOfSix) {
  std::vector<double> hilbert(36);
  for (std::size_t i = 0; i < 6; ++i)
    for (std::size_t j = 0; j < 6; ++j) hilbert[i * 6 + j] = 1.0 / static_cast<double>(i + j + 1);
  DenseFactor lu;
  ASSERT_TRUE(lu.factor(hilbert, 6));
  std::vector<double> b{1, 0, 0, 0, 0, 0};
  lu.solve(b);
  const double want[] = {36, -630, 3360, -7560, 7560, -2772};
  for (std::size_t i = 0; i < 6; ++i) EXPECT_NEAR(b[i] / want[i], 1, 1e-8);
}

TEST(DenseFactor, KeepsTheResidualSmallForLargerSystems) {
  const std::size_t n = 60;
  std::vector<double> a(n * n), want(n), b(n, 0.0);
  for (std::size_t i = 0; i < n; ++i) {
    want[i] = std::cos(static_cast<double>(i));
    for (std::size_t j = 0; j < n; ++j)
      a[i * n + j] = std::sin(static_cast<double>(1 + i * i + 3 * j * i + 7 * j));
  }
  for (std::size_t i = 0; i < n; ++i)
    for (std::size_t j = 0; j < n; ++j) b[i] += a[i * n + j] * want[j];
  const std::vector<double> right = b;
  DenseFactor lu;
  ASSERT_TRUE(lu.factor(a, n));
  lu.solve(b);
  for (std::size_t i = 0; i < n; ++i) {
    double sum = -right[i];
    for (std::size_t j = 0; j < n; ++j) sum += a[i * n + j] * b[j];
    EXPECT_NEAR(sum, 0, 1e-11);
  }
}

TEST(DenseFactor, TakesBadScalesButNotSingularMatrices) {
  DenseFactor lu;
  EXPECT_TRUE(lu.factor({1, 0, 0, 1e-20}, 2));
  EXPECT_TRUE(lu.factor({1, 1, 1e-20, 2e-20}, 2));
  EXPECT_LT(lu.pivot_ratio(), 1e-19);
  EXPECT_FALSE(lu.factor({1, 2, 2, 4}, 2));
  EXPECT_FALSE(lu.factor({0.1, 0.2, 0.3, 0.6}, 2));
  EXPECT_FALSE(lu.factor({1, std::numeric_limits<double>::quiet_NaN(), 0, 1}, 2));
  EXPECT_FALSE(lu.factor({1, 0, 0, std::numeric_limits<double>::infinity()}, 2));
  EXPECT_THROW((void)lu.factor({1, 2, 3}, 2), Error);
}

}  // namespace lossline::numerics
