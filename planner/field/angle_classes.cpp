#include "planner/field/angle_classes.h"

#include <cmath>

#include "planner/base/constants.h"
#include "planner/field/quadrature.h"

namespace lossline::field {

AngleClasses::AngleClasses(std::size_t n) {
  const Quadrature rule = gauss_legendre(n), round = gauss_legendre(azimuths);
  for (std::size_t k = 0; k < azimuths; ++k)
    lateral_weight_.push_back(2 * round.node[k] * round.weight[k]);
  mu_.reserve(n);
  weight_.reserve(n);
  lateral_.reserve(n * azimuths);
  for (const double t : rule.node) {
    const double mu = t * t, across = std::sqrt((1 - mu) * (1 + mu));
    mu_.push_back(mu);
    weight_.push_back(2 * t * rule.weight[weight_.size()]);
    // The angle from the face itself, pi/2 - phi, is pi/2 times the square of the node.
    for (const double u : round.node) lateral_.push_back(across * std::sin(0.5 * pi * u * u));
  }
}

}  // namespace lossline::field
