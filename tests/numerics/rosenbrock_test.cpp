#include "planner/numerics/rosenbrock.h"

#include <gtest/gtest.h>

#include <limits>

#include "planner/numerics/dual.h"

namespace lossline::numerics {
namespace {

/// dy/dx by a templated formula, with the derivatives by duals.
template <std::size_t N, class Formula>
struct Templated {
  Formula formula;
  void rate(double x, const std::array<double, N>& y, std::array<double, N>& f) const {
    f = formula(x, y);
  }
  void linearise(double x, const std::array<double, N>& y, Linearised<N>& lin) const {
    using D = Dual<static_cast<int>(N) + 1>;
    std::array<D, N> in;
    for (std::size_t i = 0; i < N; ++i) in[i] = D::variable(y[i], static_cast<int>(i));
    const auto out = formula(D::variable(x, static_cast<int>(N)), in);
    for (std::size_t i = 0; i < N; ++i) {
      lin.f[i] = out[i].value;
      lin.df_dx[i] = out[i].slope[N];
      for (std::size_t j = 0; j < N; ++j) lin.df_dy[i][j] = out[i].slope[j];
    }
  }
};

/// Error at x = 1 after `steps` equal steps: the tolerance is so loose that no step is changed.
template <std::size_t N, class Formula>
double fixed_step_error(Formula formula, std::array<double, N> y,
                        const std::array<double, N>& exact, int steps) {
  Templated<N, Formula> system{formula};
  std::array<double, N> floor;
  floor.fill(1e9);
  StepCount count;
  for (int i = 0; i < steps; ++i) {
    double h = 1.0 / steps;
    const auto outcome = integrate(system, i * h, (i + 1) * h, y, floor, {1e-6, 1000}, h, count);
    EXPECT_EQ(outcome, StepOutcome::reached);
  }
  EXPECT_EQ(count.accepted, steps);
  double error = 0;
  for (std::size_t k = 0; k < N; ++k) error = std::max(error, std::abs(y[k] - exact[k]));
  return error;
}

// dy/dx = -(y - cos x) - sin x + (y - cos x)^2, y(0) = 1: the solution is cos x.
const auto forced = [](const auto& x, const auto& y) {
  using std::cos;
  using S = std::decay_t<decltype(y[0])>;
  S c, s;
  if constexpr (std::is_same_v<S, double>) {
    c = std::cos(x);
    s = std::sin(x);
  } else {
    c = chain(x, std::cos(x.value), -std::sin(x.value));
    s = chain(x, std::sin(x.value), std::cos(x.value));
  }
  const S d = y[0] - c;
  return std::array<S, 1>{-1.0 * d - s + d * d};
};
// Lotka and Volterra's pair has no closed form; logistic growth has.
const auto logistic = [](const auto&, const auto& y) {
  using S = std::decay_t<decltype(y[0])>;
  return std::array<S, 1>{3.0 * y[0] * (1.0 - y[0])};
};

double measured_order(double coarse, double fine) {
  return std::log2(coarse / fine);
}

}  // namespace

// The method claims order 4; halving the step must cut the error by 2^4. Bounds 0.25: the next
// term of the error series still shows at these step counts.
TEST(Rosenbrock, HasOrderFourOnAutonomousAndForcedEquations) {
  const double e = 1 / (1 + 9 * std::exp(-3.0));
  const double a1 = fixed_step_error<1>(logistic, {0.1}, {e}, 16);
  const double a2 = fixed_step_error<1>(logistic, {0.1}, {e}, 32);
  EXPECT_NEAR(measured_order(a1, a2), 4.0, 0.25) << a1 << ' ' << a2;
  const double b1 = fixed_step_error<1>(forced, {1.2}, {0}, 16);  // only to run it off the solution
  EXPECT_GT(b1, 0);
  const double c1 = fixed_step_error<1>(forced, {1.0}, {std::cos(1.0)}, 8);
  const double c2 = fixed_step_error<1>(forced, {1.0}, {std::cos(1.0)}, 16);
  EXPECT_NEAR(measured_order(c1, c2), 4.0, 0.35) << c1 << ' ' << c2;
}

TEST(Rosenbrock, DampsAnInfinitelyStiffComponentInOneStep) {
  // y' = -1e9 (y - x): L-stability leaves the smooth solution y = x - 1e-9 after a single step.
  const auto stiff = [](const auto& x, const auto& y) {
    using S = std::decay_t<decltype(y[0])>;
    return std::array<S, 1>{-1e9 * (y[0] - x)};
  };
  Templated<1, decltype(stiff)> system{stiff};
  std::array<double, 1> y{1.0};
  StepCount count;
  double h = 1;
  integrate(system, 0.0, 1.0, y, {1e9}, {1e-6, 1000}, h, count);
  EXPECT_EQ(count.accepted, 1);
  EXPECT_NEAR(y[0], 1.0, 1e-6);
}

TEST(Rosenbrock, KeepsALinearInvariantToRounding) {
  // a -> b -> c with rates 40 and 3: a + b + c is constant.
  const auto chain_of_three = [](const auto&, const auto& y) {
    using S = std::decay_t<decltype(y[0])>;
    const S ab = 40.0 * y[0] * y[0], bc = 3.0 * y[1];
    return std::array<S, 3>{-ab, ab - bc, bc};
  };
  Templated<3, decltype(chain_of_three)> system{chain_of_three};
  std::array<double, 3> y{1, 0, 0};
  StepCount count;
  double h = 1e-3;
  ASSERT_EQ(integrate(system, 0.0, 2.0, y, {1e-8, 1e-8, 1e-8}, {1e-7, 10000}, h, count),
            StepOutcome::reached);
  EXPECT_NEAR(y[0] + y[1] + y[2], 1.0, 1e-14);
}

TEST(Rosenbrock, MeetsItsToleranceByItself) {
  Templated<1, decltype(logistic)> system{logistic};
  for (const double tolerance : {1e-4, 1e-6, 1e-8}) {
    std::array<double, 1> y{0.1};
    StepCount count;
    double h = 0.5;
    integrate(system, 0.0, 2.0, y, {tolerance}, {tolerance, 10000}, h, count);
    EXPECT_NEAR(y[0], 1 / (1 + 9 * std::exp(-6.0)), 5 * tolerance) << tolerance;
  }
}

TEST(Rosenbrock, ReportsInsteadOfLoopingWhereTheRateIsNotFinite) {
  const auto broken = [](const auto&, const auto& y) {
    using S = std::decay_t<decltype(y[0])>;
    return std::array<S, 1>{y[0] * std::numeric_limits<double>::quiet_NaN()};
  };
  Templated<1, decltype(broken)> system{broken};
  std::array<double, 1> y{1};
  StepCount count;
  double h = 0.1;
  EXPECT_EQ(integrate(system, 0.0, 1.0, y, {1e-6}, {1e-6, 1000}, h, count),
            StepOutcome::step_too_small);
}

// The manufactured belt march: the load takes the share M/(M+Mh) of a constant power,
// dM/ds = -M/(M+Mh). Closed form M(s) = Mh W((M0/Mh) exp((M0-s)/Mh)), W Lambert's function; values
// for M0 = 1, Mh = 0.1 computed with SciPy 1.10.1 to six digits. The demand is 0.1 % (a step
// error); the stepper is far inside, so half a unit of the last printed digit is asked.
TEST(Rosenbrock, FollowsTheLoadShareMarch) {
  const auto march = [](const auto&, const auto& y) {
    using S = std::decay_t<decltype(y[0])>;
    return std::array<S, 1>{-1.0 * y[0] / (y[0] + 0.1)};
  };
  Templated<1, decltype(march)> system{march};
  struct Row {
    double s, M;
  };
  for (const Row& row : {Row{0.5, 0.558288}, Row{0.9, 0.241916}, Row{1.2, 0.068334}}) {
    std::array<double, 1> y{1.0};
    StepCount count;
    double h = 0.1;
    integrate(system, 0.0, row.s, y, {1e-9}, {1e-9, 10000}, h, count);
    EXPECT_NEAR(y[0], row.M, 0.6e-6) << row.s;
  }
}

}  // namespace lossline::numerics
