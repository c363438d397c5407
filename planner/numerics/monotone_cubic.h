#pragma once
// A smooth curve through given points that rises only where the points rise and falls only where
// they fall: piecewise cubic, continuous value and slope, no overshoot.
//
// Source [FC]: F. N. Fritsch, R. E. Carlson, "Monotone piecewise cubic interpolation", SIAM Journal
//   on Numerical Analysis 17, 238-246, 1980: slopes limited to the circle alpha^2 + beta^2 <= 9.

#include <cstddef>
#include <vector>

namespace lossline::numerics {

/// A value and its derivative.
struct ValueSlope {
  double value = 0;
  double slope = 0;
};

/// How a curve goes on beyond its first and its last point.
enum class Outside {
  hold,     ///< the end value, slope zero
  tangent,  ///< a straight line with the end slope
};

/// The monotone cubic through points. Immutable after construction; any thread.
class MonotoneCubic {
 public:
  /// Through (x[i], y[i]).
  ///
  ///   x        strictly increasing, finite, at least two
  ///   y        finite, as many
  ///   throws   Error bad_input
  MonotoneCubic(std::vector<double> x, std::vector<double> y, Outside outside);

  /// Value and slope at x; binary search. NaN gives NaN.
  [[nodiscard]] ValueSlope at(double x) const;
  [[nodiscard]] double operator()(double x) const { return at(x).value; }

  [[nodiscard]] const std::vector<double>& points() const { return x_; }
  /// The slopes at the points.
  [[nodiscard]] const std::vector<double>& slopes() const { return slope_; }

 private:
  std::vector<double> x_, y_, slope_;
  Outside outside_;
};

/// The cubic of [0, h] with given ends, at s = x/h in [0, 1].
[[nodiscard]] inline ValueSlope hermite(const ValueSlope& left, const ValueSlope& right, double h,
                                        double s) {
  const double rise = right.value - left.value;
  const double m0 = left.slope * h, m1 = right.slope * h;
  const double c2 = 3 * rise - 2 * m0 - m1, c3 = m0 + m1 - 2 * rise;
  return {left.value + s * (m0 + s * (c2 + s * c3)), (m0 + s * (2 * c2 + 3 * s * c3)) / h};
}

}  // namespace lossline::numerics
