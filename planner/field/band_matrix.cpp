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

void BandMatrix::spread(std::span<double> full) const {
  std::fill(full.begin(), full.end(), 0.0);
  for (std::size_t i = 0; i < n_; ++i)
    for (std::size_t j = first(i); j <= i; ++j) full[i * n_ + j] = full[j * n_ + i] = at(i, j);
}

bool BandMatrix::factor() {
  // Row by row; the unit lower factor ends up in the band and 1/D on the diagonal.
  for (std::size_t i = 0; i < n_; ++i) {
    double* row = a_.data() + i * (band_ + 1);
    double pivot = row[0];
    for (std::size_t j = first(i); j < i; ++j) {
      double v = row[i - j];  // becomes L(i,j) D(j)
      for (std::size_t k = std::max(first(i), first(j)); k < j; ++k) v -= row[i - k] * at(j, k);
      row[i - j] = v;
    }
    for (std::size_t j = first(i); j < i; ++j) {
      const double unscaled = row[i - j];
      row[i - j] = unscaled * at(j, j);
      pivot -= unscaled * row[i - j];
    }
    if (!(pivot > 0) || !std::isfinite(pivot)) return false;
    row[0] = 1 / pivot;
  }
  return true;
}

void BandMatrix::solve(std::span<double> x, std::size_t columns) const {
  const auto subtract = [&](std::size_t to, double factor, std::size_t from) {
    double* y = x.data() + to * columns;
    const double* z = x.data() + from * columns;
    for (std::size_t c = 0; c < columns; ++c) y[c] -= factor * z[c];
  };
  for (std::size_t i = 0; i < n_; ++i)
    for (std::size_t j = first(i); j < i; ++j) subtract(i, at(i, j), j);
  for (std::size_t i = 0; i < n_; ++i)
    for (std::size_t c = 0; c < columns; ++c) x[i * columns + c] *= at(i, i);
  for (std::size_t i = n_; i-- > 0;)
    for (std::size_t j = first(i); j < i; ++j) subtract(j, at(i, j), i);
}

}  // namespace lossline::field
