// The permittivity table: exact at its points, well behaved between them, marked at its edges.

#include "planner/product/permittivity_table.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <chrono>
#include <cmath>
#include <random>

#include "tests/materials/fixtures.h"

namespace lossline {
namespace {

using materials::test::message_of;
using ::testing::HasSubstr;

/// A smooth, monotonic made-up product: values only the interpolation sees.
std::complex<double> truth(double X, double T, double f) {
  const double root = 1.2 + 1.1 * X / (1 + 0.3 * X) - 0.001 * (T - 300);
  return {root * root * root,
          -std::exp(-2 + 3 * X / (1 + X) + 0.004 * (T - 300) - 0.2 * std::log(f / 1e9))};
}

std::vector<PermittivityPoint> grid(const std::vector<double>& X, const std::vector<double>& T,
                                    const std::vector<double>& f) {
  std::vector<PermittivityPoint> points;
  for (const double fi : f)
    for (const double Ti : T)
      for (const double Xi : X) points.push_back({fi, Xi, Ti, truth(Xi, Ti, fi)});
  return points;
}

const std::vector<double> X5 = {0.1, 0.3, 0.6, 1.0, 2.0};

TEST(PermittivityTable, GivesBackItsPoints) {
  const auto points = grid(X5, {293.15, 333.15}, {915e6, 2450e6});
  const PermittivityTable table(points);
  for (const PermittivityPoint& p : points) {
    const auto got = table.at(p.moisture, p.temperature, p.frequency);
    EXPECT_NEAR(got.value.real(), p.eps.real(), 1e-12 * p.eps.real());
    EXPECT_NEAR(got.value.imag(), p.eps.imag(), -1e-12 * p.eps.imag());
    EXPECT_TRUE((got.flags | flag::edge) == flag::edge);
  }
}

TEST(PermittivityTable, IsExactInTemperatureForLawsStraightInItsOwnSpace) {
  // truth() is straight in T as cube root and logarithm, so nothing may be lost between rows.
  const PermittivityTable table(grid(X5, {293.15, 333.15}, {915e6}));
  const auto got = table.at(0.6, 311.0, 915e6);
  EXPECT_NEAR(got.value.real() / truth(0.6, 311.0, 915e6).real(), 1, 1e-12);
  EXPECT_NEAR(got.value.imag() / truth(0.6, 311.0, 915e6).imag(), 1, 1e-12);
}

TEST(PermittivityTable, IsStraightInTheLogarithmOfFrequency) {
  const PermittivityTable table(grid(X5, {293.15, 333.15}, {915e6, 2450e6}));
  const double f = std::sqrt(915e6 * 2450e6);
  EXPECT_NEAR(table.at(0.6, 293.15, f).value.imag() / truth(0.6, 293.15, f).imag(), 1, 1e-12);
}

TEST(PermittivityTable, ConvergesAlongMoistureWithSecondOrderOrBetter) {
  // Halving the knot distance of a smooth monotonic curve must cut the error at least by four.
  const auto worst = [](int n) {
    std::vector<double> X;
    for (int i = 0; i <= n; ++i) X.push_back(2.0 * i / n);
    const PermittivityTable table(grid(X, {293.15}, {915e6}));
    double error = 0;
    for (double x = 0.2; x < 1.8; x += 0.0137)
      error = std::max(error,
                       std::abs(table.at(x, 293.15, 915e6).value / truth(x, 293.15, 915e6) - 1.0));
    return error;
  };
  const double coarse = worst(8), fine = worst(16);
  RecordProperty("order_x100", static_cast<int>(100 * std::log2(coarse / fine)));
  EXPECT_GT(coarse / fine, 4.0);
  EXPECT_LT(fine, 1e-3);
}

TEST(PermittivityTable, NeverOvershootsBetweenMonotonicPoints) {
  std::vector<PermittivityPoint> points;
  const std::vector<std::pair<double, double>> step = {
      {0, 0.1}, {0.1, 0.11}, {0.2, 5}, {0.3, 5.1}, {1, 5.2}};
  points.reserve(step.size());
  for (const auto& [X, loss] : step) points.push_back({915e6, X, 300, {10 * loss, -loss}});
  for (auto& p : points) p.eps = {p.eps.real() + 1, p.eps.imag()};
  const PermittivityTable table(points);
  double last = 0;
  for (double X = 0; X <= 1; X += 0.001) {
    const double loss = -table.at(X, 300, 915e6).value.imag();
    EXPECT_GE(loss, last - 1e-12) << X;
    EXPECT_LE(loss, 5.2 + 1e-12) << X;
    last = loss;
  }
}

TEST(PermittivityTable, UsesStraightLinesBelowFourMoistures) {
  const PermittivityTable table({{915e6, 0, 300, {8, -1}}, {915e6, 1, 300, {27, -4}}});
  // Cube roots 2 and 3, logarithms of 1 and 4: half way 2.5^3 and 2.
  EXPECT_NEAR(table.at(0.5, 300, 915e6).value.real(), 15.625, 1e-12);
  EXPECT_NEAR(table.at(0.5, 300, 915e6).value.imag(), -2.0, 1e-12);
}

TEST(PermittivityTable, TakesLossesLinearlyWhenOneIsZero) {
  const PermittivityTable table({{915e6, 0, 300, {8, 0}}, {915e6, 1, 300, {27, -4}}});
  EXPECT_NEAR(table.at(0.5, 300, 915e6).value.imag(), -2.0, 1e-12);
}

TEST(PermittivityTable, HoldsTheDryEndAndNeverLeadsItToZero) {
  const PermittivityTable table(grid(X5, {293.15}, {915e6}));
  const auto dry = table.at(0.0, 293.15, 915e6);
  EXPECT_EQ(dry.value, table.at(0.1, 293.15, 915e6).value);
  EXPECT_TRUE(dry.flags.has(flag::extrapolated));
}

TEST(PermittivityTable, JoinsTheDrySolidWhereItIsKnown) {
  PermittivityTableOptions options;
  options.dry = std::complex<double>(2.0, -0.01);
  const PermittivityTable table(grid(X5, {293.15}, {915e6}), options);
  EXPECT_NEAR(table.at(0.0, 293.15, 915e6).value.real(), 2.0, 1e-12);
  EXPECT_NEAR(table.at(0.0, 293.15, 915e6).value.imag(), -0.01, 1e-12);
  EXPECT_TRUE(table.at(0.05, 293.15, 915e6).flags.has(flag::extrapolated));
}

TEST(PermittivityTable, HoldsTheWetEndAndClampsBeyondTenPerCent) {
  const PermittivityTable table(grid(X5, {293.15}, {915e6}));
  const auto top = table.at(2.0, 293.15, 915e6);
  EXPECT_TRUE(top.flags == flag::edge);
  EXPECT_TRUE(table.at(2.15, 293.15, 915e6).flags == flag::extrapolated);
  EXPECT_TRUE(table.at(2.5, 293.15, 915e6).flags == flag::clamped);
  EXPECT_EQ(table.at(2.5, 293.15, 915e6).value, top.value);
}

TEST(PermittivityTable, GoesStraightOnForTenKelvinThenHolds) {
  const PermittivityTable table(grid(X5, {293.15, 333.15}, {915e6}));
  const auto near = table.at(0.6, 341.0, 915e6);
  EXPECT_NEAR(near.value.imag() / truth(0.6, 341.0, 915e6).imag(), 1, 1e-12);
  EXPECT_TRUE(near.flags == flag::extrapolated);
  const auto far = table.at(0.6, 400.0, 915e6);
  EXPECT_NEAR(far.value.imag() / truth(0.6, 343.15, 915e6).imag(), 1, 1e-12);
  EXPECT_TRUE(far.flags == flag::clamped);
  const auto cold = table.at(0.6, 250.0, 915e6);
  EXPECT_NEAR(cold.value.imag() / truth(0.6, 283.15, 915e6).imag(), 1, 1e-12);
  EXPECT_TRUE(cold.flags == flag::clamped);
}

TEST(PermittivityTable, IsFlatInTemperatureWhenItHasOne) {
  const PermittivityTable table(grid(X5, {293.15}, {915e6}));
  EXPECT_TRUE(table.at(0.6, 303.0, 915e6).flags.none());
  const auto hot = table.at(0.6, 350.0, 915e6);
  EXPECT_TRUE(hot.flags == flag::extrapolated);
  EXPECT_EQ(hot.value, table.at(0.6, 293.15, 915e6).value);
}

TEST(PermittivityTable, MarksTheEdges) {
  const PermittivityTable table(grid(X5, {293.15, 333.15}, {915e6}));
  EXPECT_TRUE(table.at(0.11, 313.0, 915e6).flags == flag::edge);
  EXPECT_TRUE(table.at(0.6, 333.0, 915e6).flags == flag::edge);
  EXPECT_TRUE(table.at(0.6, 313.0, 915e6).flags.none());
}

TEST(PermittivityTable, UsesANearFrequencyAndRefusesAFarOneWithTheRanges) {
  const PermittivityTable table(grid(X5, {293.15, 333.15}, {915e6}));
  EXPECT_EQ(table.at(0.6, 300, 896e6).value, table.at(0.6, 300, 915e6).value);
  EXPECT_THAT(message_of([&] { (void)table.at(0.6, 300, 2450e6); }),
              HasSubstr("no value at 2450 MHz; available: 915 MHz, moisture 0.1 to 2 dry basis, 20 "
                        "to 60 degC"));
}

TEST(PermittivityTable, RefusesImpossiblePointsAndStates) {
  const auto build = [](PermittivityPoint p) {
    return message_of([&] { (void)PermittivityTable({p}); });
  };
  EXPECT_THAT(build({915e6, 0, 300, {0.9, -1}}), HasSubstr("eps' = 0.9"));
  EXPECT_THAT(build({915e6, 0, 300, {2, 1}}), HasSubstr("eps'' = -1"));
  EXPECT_THAT(build({915e6, -0.1, 300, {2, -1}}), HasSubstr("moisture >= 0"));
  EXPECT_THAT(build({0, 0, 300, {2, -1}}), HasSubstr("frequency > 0"));
  EXPECT_THAT(build({915e6, 0, std::nan(""), {2, -1}}), HasSubstr("temperature > 0"));
  EXPECT_THAT(message_of([] { (void)PermittivityTable(std::vector<PermittivityPoint>{}); }),
              HasSubstr("no points"));
  EXPECT_THAT(message_of([] {
                (void)PermittivityTable({{915e6, 1, 300, {2, -1}}, {915e6, 1, 300, {3, -1}}});
              }),
              HasSubstr("two points at"));
  const PermittivityTable table(grid(X5, {293.15}, {915e6}));
  EXPECT_THROW((void)table.at(std::nan(""), 300, 915e6), Error);
  EXPECT_THROW((void)table.at(0.5, std::nan(""), 915e6), Error);
  EXPECT_THROW((void)table.at(0.5, 300, std::nan("")), Error);
  EXPECT_THROW((void)table.at(-0.1, 300, 915e6), Error);
}

TEST(PermittivityTable, CarriesTheMarksOfItsOrigin) {
  PermittivityTableOptions options;
  options.origin = flag::from_memory;
  const PermittivityTable table(grid(X5, {293.15, 333.15}, {915e6}), options);
  EXPECT_TRUE(table.at(0.6, 313, 915e6).flags == flag::from_memory);
}

// The stated cost is well under a microsecond; the limit leaves a factor of ten for a loaded
// machine and still catches an allocation per call.
TEST(PermittivityTable, AnswersWithinAMicrosecond) {
  const PermittivityTable table(grid({0, 0.1, 0.2, 0.4, 0.8, 1.2, 1.6, 2, 3, 4},
                                     {293.15, 313.15, 333.15, 353.15}, {915e6, 2450e6}));
  std::mt19937 random(2);
  std::uniform_real_distribution<double> X(0, 4), T(290, 360);
  const auto start = std::chrono::steady_clock::now();
  double sum = 0;
  constexpr int calls = 100000;
  for (int i = 0; i < calls; ++i) sum += table.at(X(random), T(random), 2450e6).value.real();
  const double each =
      std::chrono::duration<double>(std::chrono::steady_clock::now() - start).count() / calls;
  RecordProperty("nanoseconds", static_cast<int>(each * 1e9));
  EXPECT_LT(each, 3e-6) << sum;
}

}  // namespace
}  // namespace lossline
