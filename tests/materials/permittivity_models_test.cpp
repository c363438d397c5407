// Published equations and estimates as the march asks for them: followed, held and marked.

#include "planner/product/permittivity_models.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>

#include "tests/materials/fixtures.h"

namespace lossline {
namespace {

using materials::test::message_of;
using ::testing::HasSubstr;

EstimateInputs inputs() {
  EstimateInputs in;
  in.composition.dry_bulk_density = 700;
  in.composition.solid_density = 1500;
  in.composition.solid = {3.5, -0.1};
  in.composition.bound_moisture = 0.06;
  in.composition.conductivity = 0.1;
  return in;
}

// Second code, kraft board of 700 kg/m3 at 25 degC and 2.45 GHz, X = 0.20, printed with two and
// three decimals: half a unit of the last digit.
TEST(EstimateBand, MatchesTheSecondCode) {
  const EstimateBand band = estimate_band(inputs(), {});
  const auto near = [](const PermittivityPointer& curve, double re, double im) {
    const auto got = curve->at(0.20, 298.15, 2.45e9).value;
    EXPECT_NEAR(got.real(), re, 0.005);
    EXPECT_NEAR(got.imag(), -im, 0.0005);
  };
  near(band.low, 3.20, 0.138);
  near(band.nominal, 4.56, 0.362);
  near(band.high, 5.66, 0.573);
}

TEST(EstimateBand, LosesNothingAtZeroMoistureAndNeverReachesZeroLoss) {
  const auto dry = estimate_band(inputs(), {}).nominal->at(0, 298.15, 2.45e9);
  EXPECT_GT(-dry.value.imag(), 0.01);
  EXPECT_TRUE(dry.flags.has(flag::estimated));
}

TEST(EstimateBand, HoldsTheWaterBeyondBoilingAndSaysSo) {
  const auto nominal = estimate_band(inputs(), {}).nominal;
  const auto hot = nominal->at(0.2, 420, 2.45e9);
  EXPECT_EQ(hot.value, nominal->at(0.2, 373.15, 2.45e9).value);
  EXPECT_TRUE(hot.flags.has(flag::extrapolated));
  EXPECT_FALSE(nominal->at(0.2, 350, 2.45e9).flags.has(flag::extrapolated));
}

TEST(EstimateBand, MarksWaterThatThePoresCannotHold) {
  const auto nominal = estimate_band(inputs(), {}).nominal;
  // Pores of this board hold 1/700 - 1/1500 m3/kg, X = 0.762.
  EXPECT_FALSE(nominal->at(0.75, 300, 2.45e9).flags.has(flag::clamped));
  EXPECT_TRUE(nominal->at(0.80, 300, 2.45e9).flags.has(flag::clamped));
  EXPECT_EQ(nominal->at(0.80, 300, 2.45e9).value, nominal->at(2.0, 300, 2.45e9).value);
}

// Tissue whose volume shrinks by the water it loses has no air at any moisture, so the wet limit is
// water alone and the dry limit the solid alone.
TEST(EstimateBand, ShrinkingTissueRunsFromTheSolidToWater) {
  EstimateInputs in = inputs();
  in.composition.dry_bulk_density = in.composition.solid_density;
  in.composition.conductivity = 0;
  in.shrinkage = 1.5;
  const auto nominal = estimate_band(in, {}).nominal;
  EXPECT_NEAR(nominal->at(0, 298.15, 2.45e9).value.real(), 3.5, 1e-9);
  EXPECT_NEAR(nominal->at(900, 298.15, 2.45e9).value.real(), 77.16, 0.3);
}

TEST(EstimateBand, ConductionRisesWithTemperatureAtTheLowFrequency) {
  EstimateInputs in = inputs();
  in.composition.conductivity = 1;
  const auto nominal = estimate_band(in, {}).nominal;
  EXPECT_GT(-nominal->at(0.4, 350, 915e6).value.imag(), -nominal->at(0.4, 300, 915e6).value.imag());
}

TEST(Models, RefuseFrequenciesOutsideTheirBandWithTheRange) {
  const auto nominal = estimate_band(inputs(), {}).nominal;
  EXPECT_THAT(message_of([&] { (void)nominal->at(0.2, 300, 27.12e6); }),
              HasSubstr("no value at 27.12 MHz; available: 400 to 6000 MHz"));
  EXPECT_THAT(message_of([&] { (void)fresh_produce(0.01, {})->at(4, 300, 915e6); }),
              HasSubstr("no value at 915 MHz"));
}

TEST(Models, RefuseDriedProduceWithTheFreshEquation) {
  EXPECT_THAT(message_of([&] { (void)fresh_produce(0.01, {})->at(1, 300, 2.45e9); }),
              HasSubstr("must not be used for dried produce"));
}

TEST(Models, LeafIsHeldAtItsDryEndAndMarked) {
  const auto leaf = leaf_tissue(1.27, flag::from_memory);
  const auto dry = leaf->at(0.0, 295.15, 2.45e9);
  // The same moisture but for the rounding of 0.05/0.95.
  EXPECT_NEAR(std::abs(dry.value - leaf->at(0.05 / 0.95, 295.15, 2.45e9).value), 0, 1e-12);
  EXPECT_TRUE(dry.flags.has(flag::extrapolated) && dry.flags.has(flag::from_memory));
  EXPECT_GT(-dry.value.imag(), 0.0);
  EXPECT_TRUE(leaf->at(1.0, 295.15, 2.45e9).flags == flag::from_memory);
}

TEST(Models, WheatIsFollowedALittleBeyondItsFitThenHeld) {
  const auto wheat = bulk_wheat(760, {});
  const auto X = [](double wet) { return wet / (1 - wet); };
  EXPECT_TRUE(wheat->at(X(0.15), 297.15, 915e6).flags.none());
  EXPECT_TRUE(wheat->at(X(0.08), 297.15, 915e6).flags == flag::extrapolated);
  EXPECT_TRUE(wheat->at(X(0.02), 297.15, 915e6).flags == flag::clamped);
  EXPECT_TRUE(wheat->at(X(0.15), 330.0, 915e6).flags == flag::extrapolated);
}

TEST(Models, MineralsAreMarkedBelowTheirFittedFrequencies) {
  product::MineralBody body;
  body.sand = 0.95;
  body.clay = 0.02;
  body.dry_density = 1550;
  body.solid_density = 2650;
  const auto sand = moist_mineral(body, 0, {});
  EXPECT_TRUE(sand->at(0.05, 298.15, 2.45e9).flags.none());
  EXPECT_TRUE(sand->at(0.05, 298.15, 915e6).flags.has(flag::extrapolated));
  EXPECT_TRUE(sand->at(0.50, 298.15, 2.45e9).flags.has(flag::clamped));
}

TEST(Models, NeverAnswerNotANumber) {
  const auto nominal = estimate_band(inputs(), {}).nominal;
  EXPECT_THROW((void)nominal->at(std::nan(""), 300, 2.45e9), Error);
  EXPECT_THROW((void)nominal->at(0.1, std::nan(""), 2.45e9), Error);
  EXPECT_THROW((void)nominal->at(0.1, 300, std::nan("")), Error);
}

}  // namespace
}  // namespace lossline
