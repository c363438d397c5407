#include "planner/field/quadrature.h"

#include <cmath>

#include "planner/base/constants.h"
#include "planner/field/range.h"

namespace lossline::field {

Quadrature gauss_legendre(std::size_t n) {
  const double count = static_cast<double>(n);
  in_range("number of nodes", count, "(1)", 1, 1000);
  Quadrature rule{std::vector<double>(n), std::vector<double>(n)};
  for (std::size_t i = 0; i < n; ++i) {
    // Newton on the Legendre polynomial from the usual cosine guess; three to five rounds.
    double z = std::cos(pi * (static_cast<double>(i) + 0.75) / (count + 0.5));
    double slope = 1;
    for (int round = 0; round < 50; ++round) {
      double p = 1, before = 0;
      for (std::size_t j = 0; j < n; ++j) {
        const double k = static_cast<double>(j);
        const double next = ((2 * k + 1) * z * p - k * before) / (k + 1);
        before = p;
        p = next;
      }
      slope = count * (z * p - before) / (z * z - 1);
      const double step = p / slope;
      z -= step;
      if (std::abs(step) < 1e-15) break;
    }
    rule.node[n - 1 - i] = 0.5 * (z + 1);
    rule.weight[n - 1 - i] = 1 / ((1 - z * z) * slope * slope);
  }
  return rule;
}

}  // namespace lossline::field
