#include "planner/product/composition.h"

#include <array>

#include "planner/base/constants.h"
#include "planner/product/range_check.h"

namespace lossline::product {
namespace {

/// Coefficients of c0 + c1 t + c2 t^2, t in degC.
using Quadratic = std::array<double, 3>;
struct ComponentFit {
  Quadratic heat_capacity;  ///< [kJ/(kg K)]
  Quadratic conductivity;   ///< [W/(m K)]
  Quadratic density;        ///< [kg/m3]
};

// [CO86], in the order of FoodComposition.
constexpr std::array<ComponentFit, 6> fits{{
    {{4.1762, -9.0864e-5, 5.4731e-6},
     {0.57109, 1.7625e-3, -6.7036e-6},
     {997.18, 3.1439e-3, -3.7574e-3}},  // water, t >= 0
    {{2.0082, 1.2089e-3, -1.3129e-6}, {0.17881, 1.1958e-3, -2.7178e-6}, {1329.9, -0.5184, 0}},
    {{1.9842, 1.4733e-3, -4.8008e-6}, {0.18071, -2.7604e-4, -1.7749e-7}, {925.59, -0.41757, 0}},
    {{1.5488, 1.9625e-3, -5.9399e-6}, {0.20141, 1.3874e-3, -4.3312e-6}, {1599.1, -0.31046, 0}},
    {{1.8459, 1.8306e-3, -4.6509e-6}, {0.18331, 1.2497e-3, -3.1683e-6}, {1311.5, -0.36589, 0}},
    {{1.0926, 1.8896e-3, -3.6817e-6}, {0.32962, 1.4011e-3, -2.9069e-6}, {2423.8, -0.28063, 0}},
}};

double value(const Quadratic& c, double t) {
  return c[0] + t * (c[1] + t * c[2]);
}

std::array<double, 6> shares(const FoodComposition& c) {
  std::array<double, 6> x{c.water, c.protein, c.fat, c.carbohydrate, c.fibre, c.ash};
  double sum = 0;
  for (const double share : x) sum += checked("mass share of a component", share, "1", 0, 1);
  checked("sum of the mass shares", sum, "1", 1 - 1e-3, 1 + 1e-3);
  for (double& share : x) share /= sum;
  return x;
}

}  // namespace

ThermalProperties food_properties(const FoodComposition& composition, double T) {
  const double t = checked("temperature of the food", T, "K", 273.15, 423.15) - celsius_zero;
  const auto x = shares(composition);
  double heat_capacity = 0, volume = 0, conductance = 0;
  for (std::size_t i = 0; i < x.size(); ++i) {
    const double part = x[i] / value(fits[i].density, t);  // [m3/kg]
    heat_capacity += 1e3 * x[i] * value(fits[i].heat_capacity, t);
    conductance += part * value(fits[i].conductivity, t);
    volume += part;
  }
  return {heat_capacity, conductance / volume, 1 / volume};
}

FoodComposition at_moisture(const FoodComposition& composition, double moisture) {
  const auto x = shares(composition);
  const double dry = checked("dry share of the food", 1 - x[0], "1", 1e-9, 1);
  const double scale = 1 / ((1 + checked("moisture", moisture, "kg/kg", 0, 1e6)) * dry);
  return {moisture / (1 + moisture),
          scale * x[1],
          scale * x[2],
          scale * x[3],
          scale * x[4],
          scale * x[5]};
}

double dry_wood_heat_capacity(double T) {
  return 1e3 * (0.1031 + 0.003867 * checked("temperature of the wood", T, "K", 250, 420));
}

double wood_heat_capacity(double moisture, double T) {
  const double x = 100 * checked("moisture of the wood", moisture, "kg/kg", 0, 0.3);
  const double dry = 1e-3 * dry_wood_heat_capacity(T);
  return 1e3 *
         ((dry + 4.18 * x / 100) / (1 + x / 100) + x * (-0.06191 + 2.36e-4 * T - 1.33e-4 * x));
}

double wood_conductivity(double basic_gravity, double shrinkage, double moisture) {
  const double Gb = checked("basic specific gravity", basic_gravity, "1", 0.2, 1);
  const double So = 100 * checked("volumetric shrinkage", shrinkage, "1", 0, 0.3);
  const double x = 100 * checked("moisture of the wood", moisture, "kg/kg", 0, 0.25);
  const double Gx = Gb / (1 - So * (1 - x / 30) / 100);
  return Gx * (0.1941 + 0.004064 * x) + 0.01864;
}

}  // namespace lossline::product
