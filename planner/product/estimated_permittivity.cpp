#include "planner/product/estimated_permittivity.h"

#include <algorithm>
#include <array>
#include <cmath>

#include "planner/base/constants.h"
#include "planner/product/mixing.h"
#include "planner/product/range_check.h"
#include "planner/water/permittivity.h"

namespace lossline::product {
namespace {

using Complex = std::complex<double>;

/// eps' and eps'' each held between the bounds.
Complex held_between(Complex eps, Complex lower, Complex upper) {
  auto hold = [](double value, double a, double b) {
    return std::clamp(value, std::min(a, b), std::max(a, b));
  };
  return {hold(eps.real(), lower.real(), upper.real()),
          hold(eps.imag(), lower.imag(), upper.imag())};
}

}  // namespace

PermittivityBand estimated_permittivity(const Composition& composition, double moisture,
                                        Complex free_water) {
  checked("solid density", composition.solid_density, "kg/m3", 1, 3e4);
  const double density = checked("dry bulk density", composition.dry_bulk_density, "kg/m3", 1e-3,
                                 composition.solid_density);
  checked("bound moisture", composition.bound_moisture, "kg/kg", 0, 100);
  checked("moisture", moisture, "kg/kg", 0, 1e3);

  const double solid = density / composition.solid_density;
  const double bound_kg = std::min(moisture, composition.bound_moisture);
  const double bound = std::min(1e-3 * density * bound_kg, 1 - solid);
  const double wanted = 1e-3 * density * (moisture - bound_kg);
  const double free = std::min(wanted, 1 - solid - bound);
  const std::array<Constituent, 4> parts{{{solid, composition.solid},
                                          {bound, composition.bound_water},
                                          {free, free_water},
                                          {std::max(1 - solid - bound - free, 0.0), 1.0}}};

  const Complex lower = wiener_lower(parts), upper = wiener_upper(parts);
  const Complex logarithmic = lichtenecker(parts), cube = looyenga(parts);
  PermittivityBand band;
  band.low = held_between(logarithmic, lower, upper);
  band.nominal = held_between(
      composition.fibrous_sheet ? std::sqrt(logarithmic) * std::sqrt(cube) : cube, lower, upper);
  band.high = held_between(crim(parts), lower, upper);
  band.pores_full = free < wanted || bound < 1e-3 * density * bound_kg;
  return band;
}

PermittivityBand estimated_permittivity(const Composition& composition, double moisture, double T,
                                        double frequency) {
  checked("frequency", frequency, "Hz", 1e6, 1e12);
  checked("conductivity", composition.conductivity, "S/m", 0, 1e3);
  const Complex conduction{0, -composition.conductivity / (2 * pi * frequency * electric_constant)};
  return estimated_permittivity(composition, moisture,
                                water::pure_water_ellison(frequency, T) + conduction);
}

}  // namespace lossline::product
