#include "planner/numerics/uniform_table.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/error.h"
#include "tests/numerics/sweep.h"

namespace lossline::numerics {

ValueSlope wave(double x) {
  return {std::sin(x), std::cos(x)};
}

double worst(std::size_t n) {
  const UniformTable table = UniformTable::of(wave, 0, 3, n, Outside::hold);
  double error = 0;
  for (const double x : test::sweep(0, 3, 1e-3))
    error = std::max(error, std::abs(table.at(x).value - std::sin(x)));
  return error;
}

TEST(UniformTable, ReproducesACubicExactly) {
  const auto cubic = [](double x) { return ValueSlope{1 - 2 * x + x * x * x, -2 + 3 * x * x}; };
  const UniformTable table = UniformTable::of(cubic, -1, 2, 7, Outside::hold);
  for (const double x : test::sweep(-1, 2, 0.01)) {
    EXPECT_NEAR(table.at(x).value, cubic(x).value, 1e-14);
    EXPECT_NEAR(table.at(x).slope, cubic(x).slope, 1e-13);
  }
}

// Cubic Hermite interpolation is of fourth order.
TEST(UniformTable, GainsFourOrdersWithFinerSteps) {
  const double order = std::log2(worst(21) / worst(41));
  EXPECT_NEAR(order, 4, 0.1);
}

TEST(UniformTable, IsContinuousInValueAndSlopeAtItsEntriesAndEnds) {
  const UniformTable table = UniformTable::of(wave, 0, 3, 11, Outside::tangent);
  for (int i = 0; i <= 10; ++i) {
    const double x = 0.3 * i;
    EXPECT_NEAR(table.at(x - 1e-12).value, table.at(x + 1e-12).value, 1e-11);
    EXPECT_NEAR(table.at(x - 1e-12).slope, table.at(x + 1e-12).slope, 1e-10);
  }
  EXPECT_NEAR(table.at(5).value, std::sin(3.0) + 2 * std::cos(3.0), 1e-14);
  EXPECT_NEAR(table.at(-1).value, -1, 1e-14);
  const UniformTable held = UniformTable::of(wave, 0, 3, 11, Outside::hold);
  EXPECT_EQ(held.at(9).slope, 0);
  EXPECT_EQ(held.at(9).value, std::sin(3.0));
}

TEST(UniformTable, RefusesWhatIsNoTable) {
  const double nan = std::numeric_limits<double>::quiet_NaN();
  EXPECT_THROW(UniformTable(0, 1, {{1, 0}}, Outside::hold), Error);
  EXPECT_THROW(UniformTable(1, 1, {{1, 0}, {2, 0}}, Outside::hold), Error);
  EXPECT_THROW(UniformTable(0, nan, {{1, 0}, {2, 0}}, Outside::hold), Error);
  EXPECT_THROW(UniformTable(0, 1, {{1, nan}, {2, 0}}, Outside::hold), Error);
  EXPECT_TRUE(std::isnan(UniformTable::of(wave, 0, 3, 4, Outside::hold).at(nan).value));
}

}  // namespace lossline::numerics
