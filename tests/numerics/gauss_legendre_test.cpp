#include "planner/numerics/gauss_legendre.h"

#include <gtest/gtest.h>

#include <cmath>
#include <limits>

#include "planner/base/error.h"

namespace lossline::numerics {

// Abramowitz & Stegun 1964, table 25.4, n = 2 (1/sqrt 3, closed form), n = 5: printed to 15 digits.
TEST(GaussLegendre, MatchesTheTableOfAbramowitzAndStegun) {
  const Quadrature two = gauss_legendre(2, -1, 1);
  EXPECT_NEAR(two.nodes[1], 1 / std::sqrt(3.0), 1e-15);
  EXPECT_NEAR(two.weights[0], 1, 1e-15);
  const Quadrature five = gauss_legendre(5, -1, 1);
  EXPECT_NEAR(five.nodes[4], 0.906179845938664, 1e-15);
  EXPECT_NEAR(five.nodes[3], 0.538469310105683, 1e-15);
  EXPECT_EQ(five.nodes[2], 0);
  EXPECT_NEAR(five.weights[4], 0.236926885056189, 1e-15);
  EXPECT_NEAR(five.weights[3], 0.478628670499366, 1e-15);
  EXPECT_NEAR(five.weights[2], 0.568888888888889, 1e-15);
}

TEST(GaussLegendre, IsExactUpToItsDegreeAndNoFurther) {
  for (const int n : {1, 2, 3, 7, 12, 40}) {
    const Quadrature rule = gauss_legendre(n, 0, 2);
    for (const int degree : {0, 1, n, 2 * n - 2, 2 * n - 1}) {
      const double got = integral(rule, [&](double x) { return std::pow(x - 0.5, degree); });
      const double want = (std::pow(1.5, degree + 1) - std::pow(-0.5, degree + 1)) / (degree + 1);
      EXPECT_NEAR(got / want, 1, 1e-12) << n << " nodes, degree " << degree;
    }
  }
  const double beyond = integral(gauss_legendre(3, -1, 1), [](double x) { return std::pow(x, 6); });
  EXPECT_GT(std::abs(beyond - 2.0 / 7), 1e-3);
}

TEST(GaussLegendre, HasPositiveWeightsThatSumToTheLengthForManyNodes) {
  for (const int n : {100, 501, quadrature_nodes_max}) {
    const Quadrature rule = gauss_legendre(n, -3, 5);
    double sum = 0;
    for (std::size_t i = 0; i < rule.nodes.size(); ++i) {
      EXPECT_GT(rule.weights[i], 0);
      if (i > 0) {
        EXPECT_GT(rule.nodes[i], rule.nodes[i - 1]);
      }
      sum += rule.weights[i];
    }
    EXPECT_NEAR(sum, 8, 1e-11) << n;
  }
}

TEST(GaussLegendre, RefusesNoNodesAndIntervalsThatAreNotFinite) {
  const double nan = std::numeric_limits<double>::quiet_NaN();
  EXPECT_THROW((void)gauss_legendre(0, 0, 1), Error);
  EXPECT_THROW((void)gauss_legendre(quadrature_nodes_max + 1, 0, 1), Error);
  EXPECT_THROW((void)gauss_legendre(3, nan, 1), Error);
  EXPECT_THROW((void)gauss_legendre(3, 0, nan), Error);
}

}  // namespace lossline::numerics
