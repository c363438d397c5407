#include "planner/field/angle_classes.h"

#include <cmath>

#include "planner/base/constants.h"
#include "planner/field/range.h"
#include "planner/numerics/gauss_legendre.h"

namespace lossline::field {

AngleClasses::AngleClasses(std::size_t n) {
  in_range("number of angle classes", static_cast<double>(n), "(1)", 1, 1000);
  const auto rule = numerics::gauss_legendre(static_cast<int>(n), 0, 1);
  const auto round = numerics::gauss_legendre(static_cast<int>(azimuths), 0, 1);
  for (std::size_t k = 0; k < azimuths; ++k)
    lateral_weight_.push_back(2 * round.nodes[k] * round.weights[k]);
  mu_.reserve(n);
  weight_.reserve(n);
  lateral_.reserve(n * azimuths);
  for (const double t : rule.nodes) {
    const double mu = t * t, across = std::sqrt((1 - mu) * (1 + mu));
    mu_.push_back(mu);
    weight_.push_back(2 * t * rule.weights[weight_.size()]);
    // The angle from the face itself, pi/2 - phi, is pi/2 times the square of the node.
    for (const double u : round.nodes) lateral_.push_back(across * std::sin(0.5 * pi * u * u));
  }
}

}  // namespace lossline::field
