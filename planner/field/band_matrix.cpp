#include "planner/field/band_matrix.h"

#include <algorithm>
#include <cmath>

namespace lossline::field {

void BandMatrix::multiply(std::span<const double> x, std::span<double> y) const {
  for (std::size_t i = 0; i < n_; ++i) y[i] = at(i, i) * x[i];
  for (std::size_t i = 0; i < n_; ++i) {
    for (std::size_t j = first(i); j < i; ++j) {
      y[i] += at(i, j) * x[j];
      y[j] += at(i, j) * x[i];
    }
  }
}

bool BandMatrix::factor() {
  // Row by row; the unit lower factor stands in the band, D on the diagonal.
  for (std::size_t i = 0; i < n_; ++i) {
    double* row = a_.data() + i * (band_ + 1);
    const std::size_t from = first(i);
    double pivot = row[0];
    for (std::size_t j = from; j < i; ++j) {
      double v = row[i - j];  // becomes L(i,j) D(j)
      for (std::size_t k = std::max(from, first(j)); k < j; ++k) v -= row[i - k] * at(j, k);
      row[i - j] = v;
    }
    for (std::size_t j = from; j < i; ++j) {
      const double scaled = row[i - j];
      row[i - j] = scaled / at(j, j);
      pivot -= scaled * row[i - j];
    }
    if (!(pivot > 0) || !std::isfinite(pivot)) return false;
    row[0] = pivot;
  }
  return true;
}

void BandMatrix::solve(std::span<double> x) const {
  for (std::size_t i = 0; i < n_; ++i)
    for (std::size_t j = first(i); j < i; ++j) x[i] -= at(i, j) * x[j];
  for (std::size_t i = 0; i < n_; ++i) x[i] /= at(i, i);
  for (std::size_t i = n_; i-- > 0;)
    for (std::size_t j = first(i); j < i; ++j) x[j] -= at(i, j) * x[i];
}

bool solve_full(std::span<double> matrix, std::span<double> x) {
  const std::size_t n = x.size();
  auto at = [&](std::size_t i, std::size_t j) -> double& { return matrix[i * n + j]; };
  for (std::size_t k = 0; k < n; ++k) {
    std::size_t pivot = k;
    for (std::size_t i = k + 1; i < n; ++i)
      if (std::abs(at(i, k)) > std::abs(at(pivot, k))) pivot = i;
    if (!(std::abs(at(pivot, k)) > 0) || !std::isfinite(at(pivot, k))) return false;
    if (pivot != k) {
      for (std::size_t j = k; j < n; ++j) std::swap(at(k, j), at(pivot, j));
      std::swap(x[k], x[pivot]);
    }
    for (std::size_t i = k + 1; i < n; ++i) {
      const double m = at(i, k) / at(k, k);
      if (m == 0) continue;
      for (std::size_t j = k + 1; j < n; ++j) at(i, j) -= m * at(k, j);
      x[i] -= m * x[k];
    }
  }
  for (std::size_t k = n; k-- > 0;) {
    for (std::size_t j = k + 1; j < n; ++j) x[k] -= at(k, j) * x[j];
    x[k] /= at(k, k);
  }
  return true;
}

}  // namespace lossline::field
