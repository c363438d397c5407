#pragma once
// Anderson acceleration of a vector fixed point x = g(x): the next x is the combination of the last
// few g that would make the residual g - x smallest if g were linear.
//
// Source [WN]: H. F. Walker, P. Ni, "Anderson acceleration for fixed-point iterations", SIAM
//   Journal on Numerical Analysis 49, 1715-1735, 2011: difference form, least squares by QR, old
//   columns dropped while the triangle is ill-conditioned.

#include <cstddef>
#include <deque>
#include <vector>

namespace lossline::numerics {

/// Settings.
struct AndersonControl {
  std::size_t depth = 5;   ///< most residuals remembered besides the present one; 0 = Picard
  double damping = 1;      ///< share of the residual taken, 0 < damping <= 1
  double fallback = 0.5;   ///< damping of a plain step when the combination is not trusted
  double growth = 4;       ///< residual growth over the best so far at which memory is dropped
  double condition = 1e8;  ///< ratio of the triangle's diagonal at which old columns go
  std::vector<double> weights{};  ///< of the unknowns in the least squares; empty = all one
};

/// One accelerated iteration; the caller evaluates g. Not for use by two threads at once.
class Anderson {
 public:
  explicit Anderson(AndersonControl control = {});

  /// The next x.
  ///
  ///   x, g     where g was evaluated, and g(x); finite, of one constant length
  ///   throws   Error out_of_range when an entry is not finite; internal when lengths differ
  [[nodiscard]] std::vector<double> next(const std::vector<double>& x,
                                         const std::vector<double>& g);

  /// Forgets the past, as after a change of g.
  void reset();

  /// Weighted Euclidean norm of g - x at the last call.
  [[nodiscard]] double residual() const { return residual_; }
  /// Number of past residuals in the last combination; 0 means a plain step.
  [[nodiscard]] std::size_t used() const { return used_; }

 private:
  struct Column {
    std::vector<double> df;  // difference of weighted residuals
    std::vector<double> dx;  // difference of x
    std::vector<double> dr;  // difference of residuals
  };
  [[nodiscard]] double weight(std::size_t i) const {
    return control_.weights.empty() ? 1.0 : control_.weights[i];
  }
  [[nodiscard]] std::vector<double> combination(const std::vector<double>& f);

  AndersonControl control_;
  std::deque<Column> columns_;  // newest first
  std::vector<double> x_, r_;
  double residual_ = 0, best_ = 0;
  std::size_t used_ = 0;
};

}  // namespace lossline::numerics
