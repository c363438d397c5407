#include "planner/field/angle_classes.h"

#include <cmath>

#include "planner/base/constants.h"
#include "planner/field/quadrature.h"

namespace lossline::field {

AngleClasses::AngleClasses(std::size_t n) {
  const Quadrature rule = gauss_legendre(n);
  mu_.reserve(n);
  weight_.reserve(n);
  lateral_.reserve(n * azimuths);
  for (std::size_t i = 0; i < n; ++i) {
    const double t = rule.node[i];
    mu_.push_back(t * t);
    weight_.push_back(2 * t * rule.weight[i]);
    for (std::size_t k = 0; k < azimuths; ++k) {
      const double phi = (static_cast<double>(k) + 0.5) / azimuths * (0.5 * pi);
      lateral_.push_back(std::sqrt(1 - mu_[i] * mu_[i]) * std::cos(phi));
    }
  }
}

}  // namespace lossline::field
