// Values of a line file in place of the card's.

#include "planner/product/overrides.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>

#include "tests/materials/fixtures.h"

namespace lossline {
namespace {

using ::testing::HasSubstr;

ProductCard shipped_card(const char* id) {
  return materials::Store::open(materials::test::shipped()).card(id);
}

ProductOverrides measured() {
  ProductOverrides out;
  out.provenance.evidence = Evidence::user_measured;
  out.provenance.grade = 'B';
  out.provenance.source = "the user's line file";
  out.permittivity_provenance = out.provenance;
  return out;
}

TEST(Overrides, LeaveTheCardAloneWhenThereAreNone) {
  const ProductCard before = shipped_card("carrot");
  const ProductCard after = with_overrides(before, ProductOverrides{});
  EXPECT_EQ(after.permittivity, before.permittivity);
  EXPECT_EQ(after.dry_heat_capacity->value, before.dry_heat_capacity->value);
  EXPECT_EQ(after.shrinkage->value, before.shrinkage->value);
}

TEST(Overrides, PutEveryScalarWithItsProvenance) {
  ProductOverrides given = measured();
  given.dry_heat_capacity = 1;
  given.dry_heat_capacity_slope = 2;
  given.dry_bulk_density = 3;
  given.dry_piece_density = 4;
  given.solid_density = 5;
  given.shrinkage = 6;
  given.conductivity = 7;
  given.conductivity_slope = 8;
  given.diffusivity = 9;
  given.diffusivity_activation = 10;
  given.diffusivity_half_moisture = 11;
  given.permeability = 12;
  given.vapour_factor = 13;
  given.saturation_moisture = 14;
  given.heat_of_reaction = 15;
  const ProductCard card = with_overrides(ProductCard{}, given);
  double expected = 0;
  for (const auto* property :
       {&card.dry_heat_capacity, &card.dry_heat_capacity_slope, &card.dry_bulk_density,
        &card.dry_piece_density, &card.solid_density, &card.shrinkage, &card.conductivity,
        &card.conductivity_slope, &card.diffusivity, &card.diffusivity_activation,
        &card.diffusivity_half_moisture, &card.permeability, &card.vapour_factor,
        &card.saturation_moisture, &card.heat_of_reaction}) {
    ASSERT_TRUE(property->has_value());
    EXPECT_EQ((*property)->value, ++expected);
    EXPECT_EQ((*property)->provenance.grade, 'B');
  }
}

TEST(Overrides, OneNumberHoldsEverywhere) {
  ProductOverrides given = measured();
  given.dry_heat_capacity = 1500;
  given.dry_bulk_density = 300;
  const ProductCard card = with_overrides(shipped_card("carrot"), given);
  EXPECT_FALSE(card.dry_heat_capacity_slope.has_value());
  EXPECT_FALSE(card.shrinkage.has_value());
  EXPECT_TRUE(card.conductivity_slope.has_value());
}

TEST(Overrides, ATableReplacesTheEstimateWithItsBand) {
  ProductOverrides given = measured();
  given.permittivity = {{915e6, 0.1, 300, {3, -0.2}}, {915e6, 1, 300, {20, -5}}};
  given.permittivity_phase = Phase::bulk;
  const ProductCard card = with_overrides(shipped_card("carrot"), given);
  EXPECT_EQ(card.permittivity_low, nullptr);
  EXPECT_EQ(card.permittivity_high, nullptr);
  EXPECT_EQ(card.permittivity_phase, Phase::bulk);
  EXPECT_EQ(card.permittivity_provenance.grade, 'B');
  EXPECT_NEAR(card.permittivity->at(1, 300, 915e6).value.real(), 20, 1e-12);
}

// The isotherm as it is written in a line file: X = A (a/(1-a))^B at the reference temperature, so
// the activity at X = A is one half there, and the last water binds with q0.
TEST(Overrides, AnIsothermHasActivityOneHalfAtItsScale) {
  ProductOverrides given = measured();
  SorptionOverride sorption;
  sorption.oswin_scale = 0.11;
  sorption.oswin_exponent = 0.4;
  sorption.reference_temperature = 333.15;
  sorption.heat_at_zero = 350e3;
  sorption.heat_decay_moisture = 0.08;
  given.sorption = sorption;
  const ProductCard card = with_overrides(shipped_card("carrot"), given);
  ASSERT_NE(card.sorption, nullptr);
  // The solver's table holds the isotherm to far better than a measurement; 1e-4 of activity.
  EXPECT_NEAR(card.sorption->activity(0.11, 333.15).a, 0.5, 1e-4);
  EXPECT_GT(card.sorption->net_heat(0.05).value, card.sorption->net_heat(0.2).value);
  EXPECT_EQ(card.sorption_provenance.grade, 'B');
}

TEST(Overrides, FreeWaterHasActivityOne) {
  ProductOverrides given = measured();
  given.sorption = SorptionOverride{.free_water = true};
  EXPECT_EQ(with_overrides(shipped_card("maize"), given).sorption->activity(0.2, 333.15).a, 1.0);
}

// First order: alpha = 0.9 after t90 at the reference temperature, so k = ln 10 / t90.
TEST(Overrides, CureFromTimeTo90) {
  ProductOverrides given = measured();
  given.cure = CureOverride{90, 453.15, 95e3};
  const ProductCard card = with_overrides(shipped_card("rubber_compound"), given);
  ASSERT_TRUE(card.cure.has_value());
  EXPECT_NEAR(product::rate(*card.cure, 0, 453.15), std::log(10.0) / 90, 1e-12);
}

TEST(Overrides, ATableThatCannotBeUsedIsAFaultOfTheLineFile) {
  ProductOverrides given = measured();
  given.permittivity = {{915e6, 0.1, 300, {0.5, -0.2}}};
  try {
    (void)with_overrides(ProductCard{}, given);
    FAIL() << "was accepted";
  } catch (const Error& error) {
    EXPECT_EQ(error.kind(), ErrorKind::bad_line_file);
    EXPECT_THAT(error.what(), HasSubstr("product.permittivity: eps' = 0.5"));
  }
}

}  // namespace
}  // namespace lossline
