#pragma once
// Small dense systems of linear equations whose size is known at run time: LU decomposition with
// partial pivoting, factor once and solve for many right-hand sides. For a fixed size of a few
// unknowns see SmallFactor in rosenbrock.h.

#include <cstddef>
#include <vector>

namespace lossline::numerics {

/// The factors of a square matrix. Use from one thread while factoring; solving is const.
class DenseFactor {
 public:
  /// Factors a matrix given row by row.
  ///
  ///   matrix   n * n numbers, entry (i, j) at i * n + j
  ///   returns  false when the matrix is singular to rounding or not finite; then do not solve
  ///   throws   Error internal when the length is not n * n
  bool factor(std::vector<double> matrix, std::size_t n);

  /// Solves A x = b in place. b has n entries.
  void solve(std::vector<double>& b) const;

  [[nodiscard]] std::size_t size() const { return n_; }
  /// Smallest over largest pivot in magnitude, 0..1: a cheap sign of a nearly singular matrix.
  [[nodiscard]] double pivot_ratio() const { return pivot_ratio_; }

 private:
  std::size_t n_ = 0;
  std::vector<double> lu_;
  std::vector<std::size_t> pivot_;
  double pivot_ratio_ = 0;
};

}  // namespace lossline::numerics
