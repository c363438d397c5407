#include "planner/numerics/monotone_cubic.h"

#include <fmt/core.h>

#include <algorithm>
#include <cmath>
#include <utility>

#include "planner/base/error.h"

namespace lossline::numerics {
namespace {

void check(const std::vector<double>& x, const std::vector<double>& y) {
  if (x.size() < 2 || x.size() != y.size())
    throw Error(ErrorKind::bad_input,
                fmt::format("a curve needs at least two points and as many values: {} points, {} "
                            "values",
                            x.size(), y.size()));
  for (std::size_t i = 0; i < x.size(); ++i) {
    if (!(std::isfinite(x[i]) && std::isfinite(y[i])))
      throw Error(ErrorKind::bad_input,
                  fmt::format("point {} of a curve is not finite: ({}, {})", i + 1, x[i], y[i]));
    if (i > 0 && !(x[i] > x[i - 1]))
      throw Error(ErrorKind::bad_input,
                  fmt::format("points of a curve must increase: {} follows {}", x[i], x[i - 1]));
  }
}

// The slope at an end by the parabola through three points.
double end_slope(double h0, double h1, double d0, double d1) {
  const double m = ((2 * h0 + h1) * d0 - h0 * d1) / (h0 + h1);
  return m * d0 > 0 ? m : 0.0;
}

}  // namespace

MonotoneCubic::MonotoneCubic(std::vector<double> x, std::vector<double> y, Outside outside)
    : x_(std::move(x)), y_(std::move(y)), outside_(outside) {
  check(x_, y_);
  const std::size_t n = x_.size();
  std::vector<double> h(n - 1), d(n - 1);
  for (std::size_t i = 0; i + 1 < n; ++i) {
    h[i] = x_[i + 1] - x_[i];
    d[i] = (y_[i + 1] - y_[i]) / h[i];
  }
  slope_.assign(n, d[0]);
  if (n > 2) {
    slope_[0] = end_slope(h[0], h[1], d[0], d[1]);
    slope_[n - 1] = end_slope(h[n - 2], h[n - 3], d[n - 2], d[n - 3]);
    for (std::size_t i = 1; i + 1 < n; ++i)
      slope_[i] =
          d[i - 1] * d[i] > 0 ? (h[i] * d[i - 1] + h[i - 1] * d[i]) / (h[i - 1] + h[i]) : 0.0;
  }
  for (std::size_t i = 0; i + 1 < n; ++i) {  // [FC] region: a circle of radius 3
    if (d[i] == 0) {
      slope_[i] = slope_[i + 1] = 0;
      continue;
    }
    const double r = std::hypot(slope_[i] / d[i], slope_[i + 1] / d[i]);
    if (r > 3) {
      slope_[i] *= 3 / r;
      slope_[i + 1] *= 3 / r;
    }
  }
}

ValueSlope MonotoneCubic::at(double x) const {
  const bool below = x <= x_.front(), above = x >= x_.back();
  if (below || above) {
    const std::size_t end = below ? 0 : x_.size() - 1;
    // At the end point itself the slope is that of the curve.
    if (outside_ == Outside::hold && x != x_[end]) return {y_[end], 0};
    return {y_[end] + slope_[end] * (x - x_[end]), slope_[end]};
  }
  if (std::isnan(x)) return {x, x};
  const auto right = static_cast<std::size_t>(
      std::distance(x_.begin(), std::upper_bound(x_.begin(), x_.end(), x)));
  const std::size_t i = right - 1;
  const double h = x_[right] - x_[i];
  return hermite({y_[i], slope_[i]}, {y_[right], slope_[right]}, h, (x - x_[i]) / h);
}

}  // namespace lossline::numerics
