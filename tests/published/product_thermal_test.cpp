// Thermal properties by composition and of wood, diffusivities: published check values and values
// worked out from published constants. Tolerance: half a unit in the last printed digit.

#include <gtest/gtest.h>

#include "planner/product/composition.h"
#include "planner/product/diffusivity.h"

namespace lossline::product {
namespace {

constexpr double K(double celsius) {
  return celsius + 273.15;
}

}  // namespace

// Choi and Okos 1986.
TEST(FoodProperties, MatchWaterAndPotato) {
  const ThermalProperties water = food_properties({1, 0, 0, 0, 0, 0}, K(20));
  EXPECT_NEAR(1e-3 * water.heat_capacity, 4.177, 0.51e-3);
  EXPECT_NEAR(water.conductivity, 0.604, 0.51e-3);
  EXPECT_NEAR(water.density, 995.7, 0.051);
  const FoodComposition potato{0.793, 0.0205, 0.001, 0.156, 0.021, 0.0085};
  const ThermalProperties cool = food_properties(potato, K(20));
  EXPECT_NEAR(1e-3 * cool.heat_capacity, 3.652, 0.51e-3);
  EXPECT_NEAR(cool.conductivity, 0.549, 0.51e-3);
  EXPECT_NEAR(cool.density, 1074.6, 0.051);
  const ThermalProperties warm = food_properties(potato, K(60));
  EXPECT_NEAR(1e-3 * warm.heat_capacity, 3.675, 0.51e-3);
  EXPECT_NEAR(warm.conductivity, 0.597, 0.51e-3);
  EXPECT_NEAR(warm.density, 1062.2, 0.051);
}

// Water by the steam tables at 20 degC: cp 4.184 kJ/(kg K), k 0.598 W/(m K), rho 998.2 kg/m3; the
// fits of Choi and Okos are good to 1 %.
TEST(FoodProperties, AreNearTheSteamTablesForWater) {
  const ThermalProperties water = food_properties({1, 0, 0, 0, 0, 0}, K(20));
  EXPECT_NEAR(water.heat_capacity, 4184, 0.01 * 4184);
  EXPECT_NEAR(water.conductivity, 0.598, 0.01 * 0.598);
  EXPECT_NEAR(water.density, 998.2, 0.01 * 998.2);
}

// Glass and Zelinka, Wood Handbook 2010, chapter 4: worked example at 12 %, 340 K (eq. 4-17), and
// at Gb 0.54, So 12.3 %, 10 % (eq. 4-15).
TEST(WoodProperties, MatchTheWoodHandbook) {
  EXPECT_NEAR(1e-3 * wood_heat_capacity(0.12, 340), 1.9146, 0.51e-4);
  EXPECT_NEAR(wood_conductivity(0.54, 0.123, 0.10), 0.1567, 0.51e-4);
}

// Xiong et al. 1991, pasta, without the binding factor; printed to three digits.
TEST(Diffusivity, MatchesPasta) {
  EXPECT_NEAR(1e11 * arrhenius_diffusivity(6.391e-8, 21760, K(40)), 1.50, 0.0051);
  EXPECT_NEAR(1e11 * arrhenius_diffusivity(6.391e-8, 21760, K(60)), 2.48, 0.0051);
  EXPECT_NEAR(1e11 * arrhenius_diffusivity(6.391e-8, 21760, K(80)), 3.86, 0.0051);
}

}  // namespace lossline::product
