#include "planner/product/mixing.h"

#include <gtest/gtest.h>

#include <array>
#include <complex>
#include <limits>
#include <vector>

#include "planner/base/error.h"

namespace lossline::product {
namespace {

using Complex = std::complex<double>;
using Rule = Complex (*)(std::span<const Constituent>);
constexpr Rule rules[] = {lichtenecker, crim, looyenga, wiener_upper, wiener_lower, bruggeman};

void expect_same(Complex a, Complex b) {
  EXPECT_NEAR(std::abs(a - b), 0, 1e-11 * std::abs(b));
}

}  // namespace

TEST(MixingRules, LeaveAPureMaterialAndAMixtureWithItselfAsItIs) {
  const Complex eps{12, -3};
  for (const Rule rule : rules) {
    expect_same(rule(std::array<Constituent, 2>{{{1, eps}, {0, 80.0}}}), eps);
    expect_same(rule(std::array<Constituent, 3>{{{0.2, eps}, {0.5, eps}, {0.3, eps}}}), eps);
  }
  expect_same(maxwell_garnett(eps, 80.0, 0), eps);
  expect_same(maxwell_garnett(80.0, eps, 1), eps);
}

TEST(MixingRules, LieBetweenTheWienerBounds) {
  const Complex lossy{60, -20}, solid{3, -0.02};
  for (double v = 0.05; v < 1; v += 0.05) {
    const std::array<Constituent, 3> parts{{{0.5 * v, lossy}, {0.5 * v, 1.0}, {1 - v, solid}}};
    for (const Rule rule : rules) {
      EXPECT_GE(rule(parts).real(), wiener_lower(parts).real() * (1 - 1e-12));
      EXPECT_LE(rule(parts).real(), wiener_upper(parts).real() * (1 + 1e-12));
      EXPECT_GE(-rule(parts).imag(), 0);
      EXPECT_LE(-rule(parts).imag(), -wiener_upper(parts).imag() * (1 + 1e-12));
    }
  }
}

TEST(PowerLaw, ContainsTheNamedRules) {
  const std::array<Constituent, 2> parts{{{0.3, {40, -9}}, {0.7, {2, -0.1}}}};
  expect_same(power_law(parts, 1), wiener_upper(parts));
  expect_same(power_law(parts, -1), wiener_lower(parts));
  expect_same(power_law(parts, 0.5), crim(parts));
  expect_same(power_law(parts, 0), lichtenecker(parts));
  // a -> 0 meets the logarithmic rule to first order in a
  EXPECT_NEAR(std::abs(power_law(parts, 1e-6) - lichtenecker(parts)), 0, 1e-4);
}

TEST(Bruggeman, SolvesItsEquation) {
  const std::array<Constituent, 3> parts{{{0.3, {77, -9}}, {0.5, {4, -0.05}}, {0.2, 1.0}}};
  const Complex eps = bruggeman(parts);
  Complex sum = 0;
  for (const auto& part : parts) sum += part.share * (part.eps - eps) / (part.eps + 2.0 * eps);
  EXPECT_NEAR(std::abs(sum), 0, 1e-12);
}

TEST(DensityCorrection, IsUndoneAndLeavesAirAsItIs) {
  const Complex eps{2.6, -0.3};
  expect_same(at_density(at_density(eps, 770, 600), 600, 770), eps);
  expect_same(at_density(1.0, 770, 850), 1.0);
}

TEST(MixingRules, RefuseWhatIsNoMixture) {
  const double nan = std::numeric_limits<double>::quiet_NaN();
  for (const Rule rule : rules) {
    EXPECT_THROW((void)rule(std::array<Constituent, 2>{{{0.5, 3.0}, {0.4, 2.0}}}), Error);
    EXPECT_THROW((void)rule(std::array<Constituent, 2>{{{1.5, 3.0}, {-0.5, 2.0}}}), Error);
    EXPECT_THROW((void)rule(std::array<Constituent, 1>{{{1, Complex{3, 0.1}}}}), Error);
    EXPECT_THROW((void)rule(std::array<Constituent, 1>{{{1, nan}}}), Error);
    EXPECT_THROW((void)rule(std::array<Constituent, 1>{{{nan, 3.0}}}), Error);
    EXPECT_THROW((void)rule(std::vector<Constituent>{}), Error);
  }
  EXPECT_THROW((void)maxwell_garnett(3.0, 4.0, 1.1), Error);
  EXPECT_THROW((void)at_density(3.0, 0, 700), Error);
  EXPECT_THROW((void)power_law(std::array<Constituent, 1>{{{1, 3.0}}}, 2), Error);
}

}  // namespace lossline::product
