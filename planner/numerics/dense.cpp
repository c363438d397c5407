#include "planner/numerics/dense.h"

#include <fmt/core.h>

#include <algorithm>
#include <cmath>
#include <limits>
#include <utility>

#include "planner/base/error.h"

namespace lossline::numerics {

bool DenseFactor::factor(std::vector<double> matrix, std::size_t n) {
  if (matrix.size() != n * n || n == 0)
    throw Error(ErrorKind::internal,
                fmt::format("a matrix of {} entries is not {} by {}", matrix.size(), n, n));
  n_ = n;
  lu_ = std::move(matrix);
  pivot_.resize(n);
  pivot_ratio_ = 0;
  double smallest = std::numeric_limits<double>::infinity(), largest = 0;
  // Largest entry of each row and column: a pivot that is only rounding of both is no pivot. Badly
  // scaled rows or columns are thereby not mistaken for singular ones.
  std::vector<double> row(n, 0.0), column(n, 0.0);
  for (std::size_t i = 0; i < n; ++i)
    for (std::size_t j = 0; j < n; ++j) {
      const double size = std::abs(lu_[i * n + j]);
      if (!std::isfinite(size)) return false;
      row[i] = std::max(row[i], size);
      column[j] = std::max(column[j], size);
    }
  const double rounding = static_cast<double>(n) * std::numeric_limits<double>::epsilon();
  for (std::size_t k = 0; k < n; ++k) {
    std::size_t pivot = k;
    for (std::size_t i = k + 1; i < n; ++i)
      if (std::abs(lu_[i * n + k]) > std::abs(lu_[pivot * n + k])) pivot = i;
    pivot_[k] = pivot;
    if (pivot != k) {
      for (std::size_t j = 0; j < n; ++j) std::swap(lu_[pivot * n + j], lu_[k * n + j]);
      std::swap(row[pivot], row[k]);
    }
    const double d = std::abs(lu_[k * n + k]);
    if (!(d > rounding * std::min(row[k], column[k]) && std::isfinite(d))) return false;
    smallest = std::min(smallest, d);
    largest = std::max(largest, d);
    for (std::size_t i = k + 1; i < n; ++i) {
      const double m = lu_[i * n + k] /= lu_[k * n + k];
      if (m == 0) continue;
      for (std::size_t j = k + 1; j < n; ++j) lu_[i * n + j] -= m * lu_[k * n + j];
    }
  }
  pivot_ratio_ = smallest / largest;
  return true;
}

void DenseFactor::solve(std::vector<double>& b) const {
  if (b.size() != n_)
    throw Error(ErrorKind::internal,
                fmt::format("a right-hand side of {} entries for {} unknowns", b.size(), n_));
  for (std::size_t k = 0; k < n_; ++k)
    if (pivot_[k] != k) std::swap(b[pivot_[k]], b[k]);
  for (std::size_t i = 1; i < n_; ++i)
    for (std::size_t j = 0; j < i; ++j) b[i] -= lu_[i * n_ + j] * b[j];
  for (std::size_t i = n_; i-- > 0;) {
    for (std::size_t j = i + 1; j < n_; ++j) b[i] -= lu_[i * n_ + j] * b[j];
    b[i] /= lu_[i * n_ + i];
  }
}

}  // namespace lossline::numerics
