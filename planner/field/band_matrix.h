#pragma once
// A symmetric positive definite band matrix: factor once, solve for many right-hand sides. A row
// of cavities couples next neighbours only, so this is nearly all the work of a network.
//
// Source: G. H. Golub, C. F. Van Loan, Matrix Computations, 4th ed., Johns Hopkins 2013, section
//   4.3 (band L D L^T).

#include <cstddef>
#include <span>
#include <vector>

namespace lossline::field {

/// Lower band of a symmetric matrix, n rows, `band` diagonals below the main one.
class BandMatrix {
 public:
  BandMatrix(std::size_t n, std::size_t band) : n_(n), band_(band), a_(n * (band + 1)) {}

  [[nodiscard]] std::size_t size() const { return n_; }
  void clear() { a_.assign(a_.size(), 0.0); }
  /// Adds to the element (row, column), row >= column, row - column <= band.
  void add(std::size_t row, std::size_t column, double value) {
    a_[row * (band_ + 1) + (row - column)] += value;
  }
  /// y = A x of the matrix not yet factored.
  void multiply(std::span<const double> x, std::span<double> y) const;
  /// Writes the matrix not yet factored into a full one, row by row.
  void spread(std::span<double> full) const;
  /// Replaces the matrix by its factors; false when it is not positive definite or not finite.
  [[nodiscard]] bool factor();
  /// Solves in place with the factors.
  ///
  ///   x        one right-hand side after another, interleaved: [unknown * columns + column]
  void solve(std::span<double> x, std::size_t columns = 1) const;

 private:
  [[nodiscard]] std::size_t first(std::size_t row) const { return row > band_ ? row - band_ : 0; }
  [[nodiscard]] double at(std::size_t row, std::size_t column) const {
    return a_[row * (band_ + 1) + (row - column)];
  }
  std::size_t n_, band_;
  std::vector<double> a_;
};

}  // namespace lossline::field
