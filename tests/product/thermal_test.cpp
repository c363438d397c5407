#include <gtest/gtest.h>

#include <limits>

#include "planner/base/error.h"
#include "planner/product/composition.h"
#include "planner/product/diffusivity.h"
#include "planner/product/thin_layer.h"

namespace lossline::product {

const double nan = std::numeric_limits<double>::quiet_NaN();
constexpr FoodComposition potato{0.793, 0.0205, 0.001, 0.156, 0.021, 0.0085};

TEST(FoodProperties, OfAMixtureLieBetweenThoseOfItsParts) {
  const ThermalProperties mix = food_properties({0.5, 0, 0, 0.5, 0, 0}, 300);
  const ThermalProperties water = food_properties({1, 0, 0, 0, 0, 0}, 300);
  const ThermalProperties starch = food_properties({0, 0, 0, 1, 0, 0}, 300);
  EXPECT_NEAR(mix.heat_capacity, 0.5 * (water.heat_capacity + starch.heat_capacity), 1e-9);
  EXPECT_NEAR(1 / mix.density, 0.5 / water.density + 0.5 / starch.density, 1e-12);
  EXPECT_GT(mix.conductivity, starch.conductivity);
  EXPECT_LT(mix.conductivity, water.conductivity);
}

TEST(FoodComposition, DriesWithItsSolidsInProportion) {
  const FoodComposition dry = at_moisture(potato, 0.25);
  EXPECT_NEAR(dry.water, 0.2, 1e-12);
  EXPECT_NEAR(dry.protein / dry.carbohydrate, potato.protein / potato.carbohydrate, 1e-12);
  EXPECT_NEAR(dry.water + dry.protein + dry.fat + dry.carbohydrate + dry.fibre + dry.ash, 1, 1e-12);
  const FoodComposition same = at_moisture(potato, 0.793 / 0.207);
  EXPECT_NEAR(same.protein, potato.protein, 1e-12);
  EXPECT_THROW((void)at_moisture({1, 0, 0, 0, 0, 0}, 0.5), Error);
}

TEST(WoodHeatCapacity, AtZeroMoistureIsThatOfDryWood) {
  EXPECT_DOUBLE_EQ(wood_heat_capacity(0, 300), dry_wood_heat_capacity(300));
  EXPECT_GT(wood_heat_capacity(0.2, 300), wood_heat_capacity(0.1, 300));
}

TEST(Diffusivity, FormsAgreeWithEachOther) {
  const double at350 = arrhenius_diffusivity(6.391e-8, 21760, 350);
  EXPECT_NEAR(
      diffusivity_from(arrhenius_diffusivity(6.391e-8, 21760, 298.15), 298.15, 21760, 350) / at350,
      1, 1e-12);
  // much binding energy slows, none leaves K/(1+K)
  EXPECT_NEAR(bound_water_diffusivity(6.391e-8, 21760, 1032.6, 0, 350) / at350, 1032.6 / 1033.6,
              1e-12);
  EXPECT_LT(bound_water_diffusivity(6.391e-8, 21760, 1032.6, 3e4, 350), 0.1 * at350);
  EXPECT_DOUBLE_EQ(wetness_factor(0, 0.05, 0.02), 0.02);
  EXPECT_DOUBLE_EQ(wetness_factor(0.05, 0.05, 0), 0.5);
  EXPECT_DOUBLE_EQ(wetness_factor(-1, 0.05, 0.02), 0.02);
}

TEST(ThinLayer, PageWithExponentOneIsLewis) {
  EXPECT_DOUBLE_EQ(page_ratio(3e-4, 1, 1800), lewis_ratio(3e-4, 1800));
  EXPECT_DOUBLE_EQ(logarithmic_ratio(1, 3e-4, 0, 1800), lewis_ratio(3e-4, 1800));
}

TEST(ThermalProperties, RefuseWhatTheyDoNotCover) {
  EXPECT_THROW((void)food_properties({0.5, 0, 0, 0, 0, 0}, 300), Error);
  EXPECT_THROW((void)food_properties({1.5, -0.5, 0, 0, 0, 0}, 300), Error);
  EXPECT_THROW((void)food_properties(potato, nan), Error);
  EXPECT_THROW((void)food_properties(potato, 500), Error);
  EXPECT_THROW((void)wood_heat_capacity(0.5, 300), Error);
  EXPECT_THROW((void)wood_heat_capacity(nan, 300), Error);
  EXPECT_THROW((void)wood_conductivity(0.5, 0.1, nan), Error);
  EXPECT_THROW((void)wood_conductivity(5, 0.1, 0.1), Error);
}

}  // namespace lossline::product
