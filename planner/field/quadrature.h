#pragma once
// Gauss-Legendre quadrature on the unit interval.
//
// Source: P. J. Davis, P. Rabinowitz, Methods of Numerical Integration, 2nd ed., Academic Press
//   1984, section 2.7 (from memory); exact for polynomials of degree 2n-1, which the tests check.

#include <cstddef>
#include <vector>

namespace lossline::field {

/// Nodes in (0, 1), ascending, and weights that sum to 1.
struct Quadrature {
  std::vector<double> node, weight;
};

/// The rule with n nodes.
///
///   n        1 .. 1000
///   throws   Error out_of_range
Quadrature gauss_legendre(std::size_t n);

}  // namespace lossline::field
