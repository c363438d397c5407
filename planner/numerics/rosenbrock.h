#pragma once
// A linearly implicit stepper for small stiff systems dy/dx = f(x, y): the six-stage, order 4(3),
// stiffly accurate Rosenbrock method known as RODAS, with the exact Jacobian and the exact
// derivative along x. No iteration inside a step; linear invariants of f are kept to rounding.
//
// Source [HW]: E. Hairer, G. Wanner, Solving Ordinary Differential Equations II, 2nd ed., Springer
//   1996, section IV.7 and Table 7.3 for the method; the coefficients are from memory and are
//   proved by the order test in tests/numerics/rosenbrock_test.cpp, autonomous and not.

#include <algorithm>
#include <array>
#include <cmath>
#include <cstddef>

namespace lossline::numerics {

/// Step control.
struct StepControl {
  double relative_tolerance = 1e-6;
  long most_steps = 200'000;
};

/// Counters of one or more integrations.
struct StepCount {
  long accepted = 0;
  long rejected = 0;
};

/// How an integration ended.
enum class StepOutcome { reached, too_many_steps, step_too_small };

/// dy/dx and its derivatives at one place.
template <std::size_t N>
struct Linearised {
  std::array<double, N> f{};
  std::array<std::array<double, N>, N> df_dy{};
  std::array<double, N> df_dx{};
};

namespace rodas {
inline constexpr std::size_t stages = 6;
inline constexpr double gamma = 0.25;
inline constexpr std::array<double, 15> a{1.544,
                                          0.9466785280815826,
                                          0.2557011698983284,
                                          3.314825187068521,
                                          2.896124015972201,
                                          0.9986419139977817,
                                          1.221224509226641,
                                          6.019134481288629,
                                          12.53708332932087,
                                          -0.6878860361058950,
                                          1.221224509226641,
                                          6.019134481288629,
                                          12.53708332932087,
                                          -0.6878860361058950,
                                          1.0};
inline constexpr std::array<double, 15> c{-5.6688,
                                          -2.430093356833875,
                                          -0.2063599157091915,
                                          -0.1073529058151375,
                                          -9.594562251023355,
                                          -20.47028614809616,
                                          7.496443313967647,
                                          -10.24680431464352,
                                          -33.99990352819905,
                                          11.70890893206160,
                                          8.083246795921522,
                                          -7.981132988064893,
                                          -31.52159432874371,
                                          16.31930543123136,
                                          -6.058818238834054};
inline constexpr std::array<double, 6> place{0, 0.386, 0.21, 0.63, 1, 1};
inline constexpr std::array<double, 6> gamma_sum{0.25, -0.1043, 0.1035, -0.0362, 0, 0};
}  // namespace rodas

/// Solves the small system in place by Gaussian elimination with partial pivoting.
/// Factor once, solve for many right-hand sides.
template <std::size_t N>
class SmallFactor {
 public:
  /// returns false when the matrix is singular or not finite
  bool factor(const std::array<std::array<double, N>, N>& matrix) {
    lu_ = matrix;
    for (std::size_t k = 0; k < N; ++k) {
      std::size_t pivot = k;
      for (std::size_t i = k + 1; i < N; ++i)
        if (std::abs(lu_[i][k]) > std::abs(lu_[pivot][k])) pivot = i;
      pivot_[k] = pivot;
      if (pivot != k) std::swap(lu_[pivot], lu_[k]);
      const double d = lu_[k][k];
      if (!(std::abs(d) > 0) || !std::isfinite(d)) return false;
      for (std::size_t i = k + 1; i < N; ++i) {
        const double m = lu_[i][k] /= d;
        if (m == 0) continue;
        for (std::size_t j = k + 1; j < N; ++j) lu_[i][j] -= m * lu_[k][j];
      }
    }
    return true;
  }
  void solve(std::array<double, N>& b) const {
    // Rows were swapped whole, multipliers included, so all swaps come first.
    for (std::size_t k = 0; k < N; ++k)
      if (pivot_[k] != k) std::swap(b[pivot_[k]], b[k]);
    for (std::size_t k = 0; k < N; ++k)
      for (std::size_t i = k + 1; i < N; ++i) b[i] -= lu_[i][k] * b[k];
    for (std::size_t k = N; k-- > 0;) {
      for (std::size_t j = k + 1; j < N; ++j) b[k] -= lu_[k][j] * b[j];
      b[k] /= lu_[k][k];
    }
  }

 private:
  std::array<std::array<double, N>, N> lu_{};
  std::array<std::size_t, N> pivot_{};
};

/// Carries y from x to x_end.
///
///   system   offers `void linearise(double x, const std::array<double,N>& y, Linearised<N>&)`
///            and `void rate(double x, const std::array<double,N>& y, std::array<double,N>& f)`
///   y        start values on entry, end values on return
///   floor    absolute tolerance per component; components with an infinite floor are carried
///            but not controlled (accumulators)
///   h        first trial step on entry (> 0), the next good step on return
///   returns  reached, or why not; y then holds the last accepted state
template <std::size_t N, class System>
StepOutcome integrate(System& system, double x, double x_end, std::array<double, N>& y,
                      const std::array<double, N>& floor, const StepControl& control, double& h,
                      StepCount& count) {
  using Vector = std::array<double, N>;
  std::array<Vector, rodas::stages> u;
  Linearised<N> lin;
  SmallFactor<N> lu;
  bool fresh = true, after_rejection = false;
  const double span = x_end - x;
  while (x_end - x > 1e-13 * span) {
    const double left = x_end - x;
    double step = std::min(h, left);
    if (step < left && 2 * step > left) step = 0.5 * left;  // avoid a sliver at the end
    if (fresh) system.linearise(x, y, lin);
    fresh = false;
    std::array<std::array<double, N>, N> matrix;
    const double diagonal = 1 / (step * rodas::gamma);
    for (std::size_t i = 0; i < N; ++i)
      for (std::size_t j = 0; j < N; ++j)
        matrix[i][j] = (i == j ? diagonal : 0.0) - lin.df_dy[i][j];
    bool good = lu.factor(matrix);
    Vector end = y;
    for (std::size_t s = 0; good && s < rodas::stages; ++s) {
      const std::size_t row = s * (s - 1) / 2;
      Vector at = y;
      for (std::size_t j = 0; j < s; ++j)
        for (std::size_t k = 0; k < N; ++k) at[k] += rodas::a[row + j] * u[j][k];
      if (s == 0)
        u[s] = lin.f;
      else
        system.rate(x + rodas::place[s] * step, at, u[s]);
      for (std::size_t k = 0; k < N; ++k) {
        u[s][k] += step * rodas::gamma_sum[s] * lin.df_dx[k];
        for (std::size_t j = 0; j < s; ++j) u[s][k] += rodas::c[row + j] / step * u[j][k];
        good = good && std::isfinite(u[s][k]);
      }
      lu.solve(u[s]);
      if (s + 1 == rodas::stages) {  // stiffly accurate: the last stage point plus its increment
        for (std::size_t k = 0; k < N; ++k) end[k] = at[k] + u[s][k];
      }
    }
    double error = 0;
    std::size_t controlled = 0;
    if (good) {
      for (std::size_t k = 0; k < N; ++k) {
        if (std::isinf(floor[k])) continue;
        const double scale =
            floor[k] + control.relative_tolerance * std::max(std::abs(y[k]), std::abs(end[k]));
        const double e = u[rodas::stages - 1][k] / scale;
        error += e * e;
        ++controlled;
      }
      error = std::sqrt(error / static_cast<double>(std::max<std::size_t>(controlled, 1)));
    }
    if (!good || !std::isfinite(error)) error = 1e4;
    double factor = std::clamp(0.9 * std::pow(std::max(error, 1e-10), -0.25), 0.15, 6.0);
    if (error <= 1) {
      x = step == left ? x_end : x + step;
      y = end;
      ++count.accepted;
      if (after_rejection) factor = std::min(factor, 1.0);
      // A step shortened only to hit the end says little about the next one.
      h = step < h ? std::max(h, step * factor) : step * factor;
      fresh = true;
      after_rejection = false;
    } else {
      ++count.rejected;
      h = step * factor;
      after_rejection = true;
      if (!(h > 1e-12 * span)) return StepOutcome::step_too_small;
    }
    if (count.accepted + count.rejected > control.most_steps) return StepOutcome::too_many_steps;
  }
  return StepOutcome::reached;
}

}  // namespace lossline::numerics
