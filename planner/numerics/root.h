#pragma once
// A root of a function of one variable inside a bracket, and the search for the bracket. A search
// that does not succeed is an answer with a status, never an exception.
//
// Source: R. P. Brent, Algorithms for Minimization without Derivatives, Prentice-Hall 1973,
//   chapter 4 (inverse quadratic interpolation, safeguarded by bisection).

#include <algorithm>
#include <cmath>
#include <limits>
#include <utility>

namespace lossline::numerics {

/// How a search for a root ended.
enum class RootStatus {
  found,           ///< the bracket is as narrow as asked for
  not_bracketed,   ///< the function has the same sign at both ends
  not_finite,      ///< the function or an end of the bracket is not a finite number
  too_many_steps,  ///< the bracket is still wider than asked for
};

/// When to stop: bracket half-width <= absolute + relative |x|.
struct RootControl {
  double absolute = 0;
  double relative = 4 * std::numeric_limits<double>::epsilon();
  int most_steps = 300;  ///< ordinary roots take about 10, roots of high multiplicity 150
};

/// The answer of find_root.
struct Root {
  RootStatus status = RootStatus::not_bracketed;
  double x = std::numeric_limits<double>::quiet_NaN();         ///< best place found
  double residual = std::numeric_limits<double>::quiet_NaN();  ///< f(x)
  int evaluations = 0;
  [[nodiscard]] bool found() const { return status == RootStatus::found; }
};

/// The root of a continuous f in [low, high], where f changes sign.
template <class F>
Root find_root(F&& f, double low, double high, const RootControl& control = {}) {
  Root out;
  if (!(std::isfinite(low) && std::isfinite(high))) {
    out.status = RootStatus::not_finite;
    return out;
  }
  double a = low, b = high, fa = f(a), fb = f(b);
  auto finish = [&](RootStatus status) {
    out.status = status;
    out.x = b;
    out.residual = fb;
    return out;
  };
  out.evaluations = 2;
  if (!(std::isfinite(fa) && std::isfinite(fb))) return finish(RootStatus::not_finite);
  if (fa == 0) {
    std::swap(a, b);
    std::swap(fa, fb);
  }
  if (fb == 0) return finish(RootStatus::found);
  if ((fa > 0) == (fb > 0)) return finish(RootStatus::not_bracketed);
  double c = a, fc = fa, step = b - a, last = step;  // b: best, c: the other side, a: before b
  for (int i = 0; i < control.most_steps; ++i) {
    if (std::abs(fc) < std::abs(fb)) {
      a = b, b = c, c = a;
      fa = fb, fb = fc, fc = fa;
    }
    const double near = std::max(control.absolute + control.relative * std::abs(b),
                                 std::numeric_limits<double>::min());
    const double half = 0.5 * (c - b);
    if (std::abs(half) <= near || fb == 0) return finish(RootStatus::found);
    if (std::abs(last) >= near && std::abs(fa) > std::abs(fb)) {
      const double s = fb / fa;
      double p = 0, q = 0;
      if (a == c) {
        p = 2 * half * s;
        q = 1 - s;
      } else {
        const double u = fa / fc, r = fb / fc;
        p = s * (2 * half * u * (u - r) - (b - a) * (r - 1));
        q = (u - 1) * (r - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      p = std::abs(p);
      const bool inside = 2 * p < std::min(3 * half * q - std::abs(near * q), std::abs(last * q));
      last = inside ? step : half;
      step = inside ? p / q : half;
    } else {
      last = step = half;
    }
    a = b;
    fa = fb;
    b += std::abs(step) > near ? step : std::copysign(near, half);
    fb = f(b);
    ++out.evaluations;
    if (!std::isfinite(fb)) return finish(RootStatus::not_finite);
    if ((fb > 0) == (fc > 0)) {
      c = a;
      fc = fa;
      last = step = b - a;
    }
  }
  return finish(RootStatus::too_many_steps);
}

/// An interval at whose ends a function has opposite signs (or is zero).
struct Bracket {
  bool found = false;
  double low = 0, high = 0;
};

/// Widens [start - step, start + step] by doubling until f changes sign across it or both limits
/// are reached. f is not called outside [lowest, highest]; a value that is not finite ends the
/// search with found = false.
template <class F>
Bracket expand_bracket(F&& f, double start, double step, double lowest, double highest) {
  Bracket out{false, std::max(lowest, start - step), std::min(highest, start + step)};
  if (!(step > 0 && out.low <= out.high)) return out;
  double f_low = f(out.low), f_high = f(out.high);
  for (int i = 0; i < 2000; ++i) {
    if (!(std::isfinite(f_low) && std::isfinite(f_high))) return out;
    if (f_low == 0 || f_high == 0 || (f_low > 0) != (f_high > 0)) {
      out.found = true;
      return out;
    }
    if (out.low <= lowest && out.high >= highest) return out;
    step *= 2;
    // Widen the side where |f| is smaller: the sign change is more likely beyond it.
    const bool go_low =
        out.high >= highest || (out.low > lowest && std::abs(f_low) < std::abs(f_high));
    if (go_low) {
      out.low = std::max(lowest, out.low - step);
      f_low = f(out.low);
    } else {
      out.high = std::min(highest, out.high + step);
      f_high = f(out.high);
    }
  }
  return out;
}

}  // namespace lossline::numerics
