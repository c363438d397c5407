#include "planner/numerics/gauss_legendre.h"

#include <fmt/core.h>

#include <cmath>
#include <numbers>

#include "planner/base/error.h"

namespace lossline::numerics {
namespace {

struct Legendre {
  double value;
  double slope;
};

// P_n and its derivative inside (-1, 1), n >= 1.
Legendre legendre(int n, double x) {
  double before = 1, here = x;
  for (int k = 2; k <= n; ++k) {
    const double next = ((2.0 * k - 1) * x * here - (k - 1.0) * before) / k;
    before = here;
    here = next;
  }
  return {here, n * (x * here - before) / (x * x - 1)};
}

}  // namespace

Quadrature gauss_legendre(int n, double a, double b) {
  if (!(n >= 1 && n <= quadrature_nodes_max))
    throw Error(ErrorKind::out_of_range, fmt::format("number of quadrature nodes = {} is outside "
                                                     "[1, {}]",
                                                     n, quadrature_nodes_max));
  if (!(std::isfinite(a) && std::isfinite(b)))
    throw Error(ErrorKind::out_of_range,
                fmt::format("quadrature interval [{}, {}] is not finite", a, b));
  Quadrature rule;
  rule.nodes.resize(static_cast<std::size_t>(n));
  rule.weights.resize(static_cast<std::size_t>(n));
  const double middle = 0.5 * (a + b), half = 0.5 * (b - a);
  for (int i = 0; i < (n + 1) / 2; ++i) {
    // Tricomi's start is close enough for Newton to go to the right root, for every n.
    double x = std::cos(std::numbers::pi * (i + 0.75) / (n + 0.5));
    if (2 * i + 1 == n) x = 0;
    for (int step = 0; step < 20; ++step) {
      const Legendre p = legendre(n, x);
      const double change = p.value / p.slope;
      x -= change;
      if (std::abs(change) <= 1e-15) break;
    }
    const double slope = legendre(n, x).slope;
    const double weight = 2 / ((1 - x * x) * slope * slope) * half;
    const auto left = static_cast<std::size_t>(i), right = static_cast<std::size_t>(n - 1 - i);
    rule.nodes[left] = middle - half * x;
    rule.nodes[right] = middle + half * x;
    rule.weights[left] = rule.weights[right] = weight;
  }
  return rule;
}

}  // namespace lossline::numerics
