#include "planner/numerics/root.h"

#include <gtest/gtest.h>

#include <cmath>

namespace lossline::numerics {

constexpr double nan = std::numeric_limits<double>::quiet_NaN();

TEST(FindRoot, FindsKnownRoots) {
  const Root cosine = find_root([](double x) { return std::cos(x) - x; }, 0, 1);
  ASSERT_TRUE(cosine.found());
  EXPECT_NEAR(cosine.x, 0.73908513321516064, 1e-15);  // Dottie number, OEIS A003957
  EXPECT_LT(cosine.evaluations, 15);
  const Root cubic = find_root([](double x) { return x * x * x - 2 * x - 5; }, 2, 3);
  ASSERT_TRUE(cubic.found());
  EXPECT_NEAR(cubic.x, 2.0945514815423266, 1e-14);  // Wallis 1685
  const Root sine = find_root([](double x) { return std::sin(x); }, 3, 4);
  EXPECT_NEAR(sine.x, 3.14159265358979324, 1e-15);
}

TEST(FindRoot, CopesWithFlatSteepAndStepFunctions) {
  const Root flat = find_root([](double x) { return std::pow(x - 0.3, 9); }, -1, 2);
  ASSERT_TRUE(flat.found());
  EXPECT_NEAR(flat.x, 0.3, 1e-9);
  const Root steep = find_root([](double x) { return std::expm1(500 * (x - 0.7)); }, 0, 1);
  ASSERT_TRUE(steep.found());
  EXPECT_NEAR(steep.x, 0.7, 1e-14);
  const Root jump = find_root([](double x) { return x < 0.123 ? -1.0 : 1.0; }, 0, 1);
  ASSERT_TRUE(jump.found());
  EXPECT_NEAR(jump.x, 0.123, 1e-15);
}

TEST(FindRoot, TakesARootAtAnEnd) {
  EXPECT_EQ(find_root([](double x) { return x; }, 0, 1).x, 0);
  EXPECT_EQ(find_root([](double x) { return x - 1; }, 0, 1).x, 1);
}

TEST(FindRoot, SaysWhyItDidNotSucceed) {
  EXPECT_EQ(find_root([](double x) { return x * x + 1; }, -1, 1).status, RootStatus::not_bracketed);
  EXPECT_EQ(find_root([](double) { return nan; }, -1, 1).status, RootStatus::not_finite);
  EXPECT_EQ(find_root([](double x) { return std::abs(x) < 0.6 ? nan : x; }, -1, 1.1).status,
            RootStatus::not_finite);
  EXPECT_EQ(find_root([](double x) { return x; }, nan, 1).status, RootStatus::not_finite);
  RootControl few;
  few.most_steps = 3;
  const Root early = find_root([](double x) { return std::cos(x) - x; }, -50, 50, few);
  EXPECT_EQ(early.status, RootStatus::too_many_steps);
  EXPECT_TRUE(std::isfinite(early.x));
}

TEST(ExpandBracket, WidensToTheSignChangeWithinItsLimits) {
  const auto f = [](double x) { return x - 37; };
  const Bracket up = expand_bracket(f, 0, 1, -10, 100);
  ASSERT_TRUE(up.found);
  EXPECT_LE(up.low, 37);
  EXPECT_GE(up.high, 37);
  EXPECT_LE(up.high, 100);
  const Bracket down = expand_bracket([](double x) { return std::log(x); }, 50, 1, 0.01, 60);
  ASSERT_TRUE(down.found);
  EXPECT_GE(down.low, 0.01);
  EXPECT_LE(down.low, 1);
}

TEST(ExpandBracket, GivesUpAtTheLimits) {
  EXPECT_FALSE(expand_bracket([](double x) { return x - 37; }, 0, 1, -10, 30).found);
  EXPECT_FALSE(expand_bracket([](double) { return nan; }, 0, 1, -10, 30).found);
  EXPECT_FALSE(expand_bracket([](double x) { return x; }, 0, nan, -10, 30).found);
}

}  // namespace lossline::numerics
