#include "planner/bed/piece_film.h"

#include <cmath>

namespace lossline::bed {

double granule_heat_transfer(double flow, double diameter, double T) {
  const double viscosity = 1.72e-5 * std::pow(T / 273.15, 0.7);
  const double conductivity = 0.0241 * std::pow(T / 273.15, 0.82);
  constexpr double prandtl = 0.71;
  const double reynolds = flow * diameter / viscosity;
  const double nusselt = 2 + 1.1 * std::pow(reynolds, 0.6) * std::cbrt(prandtl);
  return nusselt * conductivity / diameter;
}

}  // namespace lossline::bed
