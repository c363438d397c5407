#pragma once
// Gauss-Legendre quadrature with any number of nodes, computed once and used often.
//
// Source [AS]: M. Abramowitz, I. A. Stegun, Handbook of Mathematical Functions, National Bureau of
//   Standards 1964, 25.4.29 and 25.4.30 (rule and weights), table 25.4 (values).

#include <cstddef>
#include <vector>

namespace lossline::numerics {

/// Nodes in increasing order and their weights: integral of f ~ sum of weights[i] f(nodes[i]).
struct Quadrature {
  std::vector<double> nodes;
  std::vector<double> weights;
};

/// Most nodes of a rule.
inline constexpr int quadrature_nodes_max = 2000;

/// The n-point rule on [a, b]; exact for polynomials up to degree 2n - 1.
///
///   n        number of nodes, 1 .. quadrature_nodes_max
///   a, b     ends of the interval, finite; b < a gives negative weights
///   throws   Error out_of_range
///
/// Newton's method on the Legendre polynomial by its three-term recurrence; cost n^2.
[[nodiscard]] Quadrature gauss_legendre(int n, double a, double b);

/// The integral of f by a rule. f may return anything with + and double * .
template <class F>
auto integral(const Quadrature& rule, F&& f) {
  auto sum = rule.weights.at(0) * f(rule.nodes.at(0));
  for (std::size_t i = 1; i < rule.nodes.size(); ++i)
    sum = sum + rule.weights[i] * f(rule.nodes[i]);
  return sum;
}

}  // namespace lossline::numerics
