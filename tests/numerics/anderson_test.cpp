#include "planner/numerics/anderson.h"

#include <gtest/gtest.h>

#include <cmath>
#include <functional>
#include <limits>

#include "planner/base/error.h"

namespace lossline::numerics {

using Vector = std::vector<double>;

struct Descent {
  int iterations = 0;
  Vector x;
};

Descent descend(const std::function<Vector(const Vector&)>& g, Vector x, AndersonControl control,
                double tolerance, int most) {
  Anderson anderson(std::move(control));
  Descent out;
  for (out.iterations = 0; out.iterations < most; ++out.iterations) {
    const Vector next = anderson.next(x, g(x));
    if (anderson.residual() <= tolerance) break;
    x = next;
  }
  out.x = x;
  return out;
}

// x -> M x + b with eigenvalues of M in [-0.4, 0.9]; the fixed point is (1, ..., 1).
Vector contraction(const Vector& x) {
  const double gain[] = {0.9, 0.7, 0.35, 0.1, -0.2, -0.4};
  const std::size_t n = x.size();
  // The gains act along the columns of a Householder reflection, so that M is not diagonal.
  Vector y(n);
  double along = 0;
  for (std::size_t i = 0; i < n; ++i) {
    y[i] = x[i] - 1;
    along += y[i];
  }
  const double twice = 2 * along / static_cast<double>(n);
  for (std::size_t i = 0; i < n; ++i) y[i] = gain[i] * (y[i] - twice);
  along = 0;
  for (const double v : y) along += v;
  const double back = 2 * along / static_cast<double>(n);
  for (double& v : y) v += 1 - back;
  return y;
}

// For a linear map of n different gains the method is GMRES in disguise [WN, theorem 2.2]: full
// memory ends in n + 1 steps. Plain iteration with gain 0.9 needs ln(1e-10)/ln(0.9) ~ 220.
TEST(Anderson, EndsALinearContractionOfGainNineTenthsInAHandfulOfSteps) {
  const Vector start{5, -3, 2, 0, 8, 1};
  AndersonControl full;
  full.depth = 6;
  const Descent fast = descend(contraction, start, full, 1e-10, 400);
  EXPECT_LE(fast.iterations, 9);
  for (const double v : fast.x) EXPECT_NEAR(v, 1, 1e-8);
  AndersonControl plain;
  plain.depth = 0;
  const Descent slow = descend(contraction, start, plain, 1e-10, 400);
  EXPECT_GT(slow.iterations, 150);
  EXPECT_LE(descend(contraction, start, {}, 1e-10, 400).iterations, 25);
}

TEST(Anderson, SolvesOneUnknownLikeASecant) {
  const auto g = [](const Vector& x) { return Vector{std::cos(x[0])}; };
  const Descent out = descend(g, {0}, {}, 1e-13, 60);
  EXPECT_LE(out.iterations, 10);
  EXPECT_NEAR(out.x[0], 0.73908513321516064, 1e-12);
}

TEST(Anderson, ConvergesWherePlainIterationDiverges) {
  const auto g = [](const Vector& x) { return Vector{1 - 1.8 * x[0], 2 + 0.5 * x[1]}; };
  const Descent out = descend(g, {3, -3}, {}, 1e-12, 60);
  EXPECT_NEAR(out.x[0], 1 / 2.8, 1e-10);
  EXPECT_NEAR(out.x[1], 4, 1e-10);
}

TEST(Anderson, IsNotDisturbedByRepeatedPointsOrAnAccidentallySingularMemory) {
  Anderson anderson;
  Vector x{1, 2};
  for (int i = 0; i < 5; ++i) {
    const Vector next = anderson.next(x, {2, 3});  // the same pair again and again
    EXPECT_TRUE(std::isfinite(next[0]) && std::isfinite(next[1]));
  }
  EXPECT_EQ(anderson.used(), 0U);
  const Vector at = anderson.next({2, 3}, {2, 3});
  EXPECT_EQ(at, (Vector{2, 3}));
}

TEST(Anderson, WeightsUnknownsOfDifferentSize) {
  const auto g = [](const Vector& x) {
    return Vector{0.9 * x[0] + 1e-9 * x[1] + 1e-3, 0.5 * x[1] + 1e4 * x[0] + 1e6};
  };
  AndersonControl control;
  control.weights = {1e3, 1e-6};
  const Descent out = descend(g, {0, 0}, control, 1e-9, 60);
  EXPECT_LE(out.iterations, 8);
}

TEST(Anderson, RefusesWhatIsNotANumber) {
  const double nan = std::numeric_limits<double>::quiet_NaN();
  Anderson anderson;
  EXPECT_THROW((void)anderson.next({1, nan}, {1, 2}), Error);
  EXPECT_THROW((void)anderson.next({1, 2}, {nan, 2}), Error);
  EXPECT_THROW((void)anderson.next({1, 2}, {1}), Error);
  AndersonControl bad;
  bad.damping = nan;
  EXPECT_THROW(Anderson{bad}, Error);
}

}  // namespace lossline::numerics
