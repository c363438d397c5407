#include "planner/product/plant_permittivity.h"

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

double gigahertz(double frequency) {
  return checked("frequency", frequency, "Hz", 1e6, 1e12) * 1e-9;
}

Complex physical(double eps_real, double eps_loss) {
  return {std::max(eps_real, 1.0), -std::max(eps_loss, 0.0)};
}

}  // namespace

LeafFractions leaf_fractions(double moisture) {
  const double m =
      checked("wet-basis moisture of a leaf", moisture, "1", leaf_moisture_min, leaf_moisture_max);
  return {1.7 - 0.74 * m + 6.16 * m * m, m * (0.55 * m - 0.076), 4.64 * m * m / (1 + 7.36 * m * m)};
}

Complex leaf_free_water(double frequency) {
  const double f = gigahertz(frequency);
  // 18 sigma/f is printed with sigma in S/m, f in GHz; sigma = 1.27 S/m gives 22.86/f
  return 4.9 + 75.0 / (1.0 + j * (f / 18)) - j * (18 * leaf_conductivity / f);
}

Complex leaf_bound_water(double frequency) {
  const double f = gigahertz(frequency);
  return 2.9 + 55.0 / (1.0 + std::sqrt(j * (f / 0.18)));
}

Complex leaf_permittivity(double moisture, double frequency, Complex free_water) {
  checked("frequency", frequency, "Hz", 0.2e9, 20e9);
  checked("eps' of the free water", free_water.real(), "1", 1, huge);
  checked("eps'' of the free water", -free_water.imag(), "1", 0, huge);
  const LeafFractions v = leaf_fractions(moisture);
  return v.residual + std::max(v.free, 0.0) * free_water + v.bound * leaf_bound_water(frequency);
}

Complex leaf_permittivity(double moisture, double frequency) {
  return leaf_permittivity(moisture, frequency, leaf_free_water(frequency));
}

Complex leaf_permittivity_at(double moisture, double frequency, double T, double conductivity) {
  checked("conductivity", conductivity, "S/m", 0, 1e3);
  checked("frequency", frequency, "Hz", 0.2e9, 20e9);
  const double conduction = conductivity / (2 * pi * frequency * electric_constant);
  return leaf_permittivity(moisture, frequency,
                           water::pure_water_ellison(frequency, T) - j * conduction);
}

Complex produce_permittivity(double moisture, double ash, double T) {
  const double M = 100 * checked("wet-basis moisture", moisture, "1", 0.5, 1);
  const double A = 100 * checked("share of ash", ash, "1", 0, 0.025);
  const double t = checked("temperature", T, "K", 278.15, 403.15) - celsius_zero;
  return physical(38.57 + 0.1255 * t + 0.4546 * M - 14.54 * A - 0.0037 * M * t + 0.07327 * A * t,
                  17.72 - 0.4519 * t + 0.001382 * t * t - 0.07448 * M + 22.93 * A - 13.44 * A * A +
                      0.002206 * M * t + 0.1505 * A * t);
}

Complex wheat_permittivity(double moisture, double bulk_density, double frequency) {
  const double M = 100 * checked("wet-basis moisture of wheat", moisture, "1", 0.05, 0.30);
  const double rho = 1e-3 * checked("bulk density of wheat", bulk_density, "kg/m3", 500, 1000);
  const double log_f = std::log10(1e-6 * checked("frequency", frequency, "Hz", 20e6, 2.5e9));
  const double root = 1 + 0.504 * M * rho / (std::sqrt(M) + log_f);
  const double loss = rho * rho * (0.146 + 0.004615 * M * M * (0.32 * log_f + 1.743 / log_f - 1));
  return physical(root * root, loss);
}

}  // namespace lossline::product
