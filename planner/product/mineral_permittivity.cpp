#include "planner/product/mineral_permittivity.h"

#include <algorithm>
#include <cmath>
#include <limits>

#include "planner/base/constants.h"
#include "planner/product/range_check.h"
#include "planner/water/permittivity.h"

namespace lossline::product {
namespace {

using Complex = std::complex<double>;
constexpr Complex j{0, 1};
constexpr double huge = std::numeric_limits<double>::max();

void check_body(const MineralBody& body) {
  checked("share of sand", body.sand, "1", 0, 1);
  checked("share of clay", body.clay, "1", 0, 1 - body.sand + 1e-9);
  checked("solid density", body.solid_density, "kg/m3", 1, 3e4);
  checked("dry density", body.dry_density, "kg/m3", 1, body.solid_density);
  checked("eps' of the solid", body.solid.real(), "1", 1, huge);
  checked("eps'' of the solid", -body.solid.imag(), "1", 0, huge);
}

}  // namespace

Complex moist_mineral_permittivity(const MineralBody& body, double moisture, Complex water) {
  check_body(body);
  checked("moisture", moisture, "kg/kg", 0, 1e3);
  checked("eps' of the water", water.real(), "1", 1, huge);
  checked("eps'' of the water", -water.imag(), "1", 0, huge);
  const double pores = 1 - body.dry_density / body.solid_density;
  const double theta = std::min(1e-3 * moisture * body.dry_density, pores);
  const double wilting = 0.06774 - 0.064 * body.sand + 0.478 * body.clay;
  const double transition = 0.49 * wilting + 0.165;
  const double gamma = -0.57 * wilting + 0.481;
  const double below = std::min(theta, transition);
  const Complex film =
      mineral_film_water + (water - mineral_film_water) * (gamma * below / transition);
  return below * film + (theta - below) * water + (pores - theta) + (1 - pores) * body.solid;
}

Complex moist_mineral_permittivity(const MineralBody& body, double moisture, double T,
                                   double frequency, double conductivity) {
  checked("frequency", frequency, "Hz", 1e6, 1e12);
  checked("conductivity", conductivity, "S/m", 0, 1e3);
  const double conduction = conductivity / (2 * pi * frequency * electric_constant);
  return moist_mineral_permittivity(body, moisture,
                                    water::pure_water_ellison(frequency, T) - j * conduction);
}

Complex board_permittivity(const BoardMaterial& material, double frequency) {
  const double f = 1e-9 * checked("frequency", frequency, "Hz", 0.9 * material.frequency_min,
                                  material.frequency_max);
  const double sigma = material.c * std::pow(f, material.d);
  return {material.a, -sigma / (2 * pi * frequency * electric_constant)};
}

}  // namespace lossline::product
