#include "planner/field/band_matrix.h"

#include <gtest/gtest.h>

#include <limits>
#include <random>

namespace lossline::field {
namespace {

TEST(BandMatrix, SolvesWhatItMultiplied) {
  std::mt19937 engine(3);
  std::uniform_real_distribution<double> unit(0, 1);
  for (const std::size_t band : {std::size_t{1}, std::size_t{2}, std::size_t{5}}) {
    constexpr std::size_t n = 9;
    BandMatrix matrix(n, band);
    for (std::size_t i = 0; i < n; ++i) {
      matrix.add(i, i, 0.01);
      for (std::size_t j = i > band ? i - band : 0; j < i; ++j) {
        const double link = unit(engine);
        matrix.add(i, i, link);
        matrix.add(j, j, link);
        matrix.add(i, j, -link);
      }
    }
    std::vector<double> x(n), b(n), full(n * n), block(2 * n);
    for (double& v : x) v = unit(engine);
    matrix.multiply(x, b);
    matrix.spread(full);
    for (std::size_t i = 0; i < n; ++i) {
      double sum = 0;
      for (std::size_t j = 0; j < n; ++j) sum += full[i * n + j] * x[j];
      EXPECT_NEAR(sum, b[i], 1e-14);
      block[2 * i] = b[i];
      block[2 * i + 1] = -2 * b[i];
    }
    ASSERT_TRUE(matrix.factor());
    matrix.solve(b);
    matrix.solve(block, 2);
    for (std::size_t i = 0; i < n; ++i) {
      EXPECT_NEAR(b[i], x[i], 1e-11);
      EXPECT_NEAR(block[2 * i], x[i], 1e-11);
      EXPECT_NEAR(block[2 * i + 1], -2 * x[i], 1e-11);
    }
  }
}

TEST(BandMatrix, ReportsWhatItCannotFactor) {
  BandMatrix zero(2, 1);
  EXPECT_FALSE(zero.factor());
  BandMatrix unknown(2, 1);
  unknown.add(0, 0, 1);
  unknown.add(1, 1, std::numeric_limits<double>::quiet_NaN());
  EXPECT_FALSE(unknown.factor());
}

}  // namespace
}  // namespace lossline::field
