#include "planner/numerics/anderson.h"

#include <fmt/core.h>

#include <algorithm>
#include <cmath>
#include <utility>

#include "planner/base/error.h"

namespace lossline::numerics {
namespace {

double dot(const std::vector<double>& a, const std::vector<double>& b) {
  double sum = 0;
  for (std::size_t i = 0; i < a.size(); ++i) sum += a[i] * b[i];
  return sum;
}

void check(const std::vector<double>& x, const std::vector<double>& g, std::size_t n) {
  if (x.size() != g.size() || x.size() != n)
    throw Error(ErrorKind::internal,
                fmt::format("fixed point of {} unknowns given {} and {}", n, x.size(), g.size()));
  for (std::size_t i = 0; i < n; ++i)
    if (!(std::isfinite(x[i]) && std::isfinite(g[i])))
      throw Error(ErrorKind::out_of_range,
                  fmt::format("unknown {} of a fixed point is not finite: x = {}, g = {}", i + 1,
                              x[i], g[i]));
}

}  // namespace

Anderson::Anderson(AndersonControl control) : control_(std::move(control)) {
  if (!(control_.damping > 0 && control_.damping <= 1))
    throw Error(ErrorKind::out_of_range,
                fmt::format("damping = {} is outside (0, 1]", control_.damping));
}

void Anderson::reset() {
  columns_.clear();
  x_.clear();
  r_.clear();
  best_ = 0;
  used_ = 0;
}

// Coefficients of the columns, newest first, by modified Gram-Schmidt. Newest columns come first
// in the triangle, so that an ill-conditioned tail is the oldest part and can simply be cut.
std::vector<double> Anderson::combination(const std::vector<double>& f) {
  std::vector<std::vector<double>> q, triangle;
  double largest = 0;
  for (const Column& column : columns_) {
    std::vector<double> v = column.df, r;
    for (const auto& unit : q) {
      const double along = dot(unit, v);
      r.push_back(along);
      for (std::size_t i = 0; i < v.size(); ++i) v[i] -= along * unit[i];
    }
    const double length = std::sqrt(dot(v, v));
    largest = std::max(largest, length);
    if (!(length > 0 && length * control_.condition >= largest)) break;
    r.push_back(length);
    for (double& entry : v) entry /= length;
    q.push_back(std::move(v));
    triangle.push_back(std::move(r));
  }
  columns_.resize(q.size());
  std::vector<double> gamma(q.size());
  for (std::size_t k = q.size(); k-- > 0;) {
    double right = dot(q[k], f);
    for (std::size_t j = k + 1; j < q.size(); ++j) right -= triangle[j][k] * gamma[j];
    gamma[k] = right / triangle[k][k];
  }
  return gamma;
}

std::vector<double> Anderson::next(const std::vector<double>& x, const std::vector<double>& g) {
  const std::size_t n = x_.empty() ? x.size() : x_.size();
  check(x, g, n);
  if (!control_.weights.empty() && control_.weights.size() != n)
    throw Error(ErrorKind::internal,
                fmt::format("{} weights for {} unknowns", control_.weights.size(), n));
  std::vector<double> r(n), f(n);
  for (std::size_t i = 0; i < n; ++i) {
    r[i] = g[i] - x[i];
    f[i] = weight(i) * r[i];
  }
  residual_ = std::sqrt(dot(f, f));
  const bool first = x_.empty();
  bool lost = false;
  if (first || residual_ < best_) {
    best_ = residual_;
  } else if (!(residual_ <= control_.growth * best_)) {
    lost = true;  // what was learned farther away misleads here
    columns_.clear();
    best_ = residual_;
  }
  if (!first && !lost && control_.depth > 0) {
    Column column{std::vector<double>(n), std::vector<double>(n), std::vector<double>(n)};
    for (std::size_t i = 0; i < n; ++i) {
      column.dx[i] = x[i] - x_[i];
      column.dr[i] = r[i] - r_[i];
      column.df[i] = weight(i) * column.dr[i];
    }
    columns_.push_front(std::move(column));
    if (columns_.size() > control_.depth) columns_.pop_back();
  }
  x_ = x;
  r_ = r;

  const std::vector<double> gamma = combination(f);
  used_ = gamma.size();
  const double damping = lost ? std::min(control_.damping, control_.fallback) : control_.damping;
  std::vector<double> out(n);
  bool finite = true;
  for (std::size_t i = 0; i < n; ++i) {
    out[i] = x[i] + damping * r[i];
    for (std::size_t k = 0; k < used_; ++k)
      out[i] -= gamma[k] * (columns_[k].dx[i] + damping * columns_[k].dr[i]);
    finite = finite && std::isfinite(out[i]);
  }
  if (finite) return out;
  columns_.clear();
  used_ = 0;
  for (std::size_t i = 0; i < n; ++i) out[i] = x[i] + control_.fallback * r[i];
  return out;
}

}  // namespace lossline::numerics
