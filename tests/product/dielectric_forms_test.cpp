#include "planner/product/dielectric_forms.h"

#include <gtest/gtest.h>

#include <array>
#include <complex>
#include <limits>

#include "planner/base/error.h"
#include "planner/product/mixing.h"

namespace lossline::product {
namespace {

using Complex = std::complex<double>;
const double nan = std::numeric_limits<double>::quiet_NaN();
constexpr Complex water{77, -9};

void expect_passive(Complex eps) {
  EXPECT_GE(eps.real(), 1);
  EXPECT_GE(-eps.imag(), 0);
}

}  // namespace

TEST(LeafPermittivity, IsPassiveWhereTheFitItselfIsNot) {
  // the unclamped fit has a negative eps'' at 5 % and 5.8 GHz
  const LeafFractions v = leaf_fractions(0.05);
  EXPECT_LT(v.free, 0);
  EXPECT_LT(
      -(v.residual + v.free * leaf_free_water(5.8e9) + v.bound * leaf_bound_water(5.8e9)).imag(),
      0);
  for (double m = 0.05; m <= 0.7; m += 0.01)
    for (const double f : {0.915e9, 2.45e9, 5.8e9}) expect_passive(leaf_permittivity(m, f));
}

TEST(LeafPermittivity, TakesAnyFreeWater) {
  EXPECT_EQ(leaf_permittivity(0.5, 2.45e9),
            leaf_permittivity(0.5, 2.45e9, leaf_free_water(2.45e9)));
  // without conduction the wet leaf loses less
  EXPECT_LT(-leaf_permittivity_at(0.6, 0.915e9, 295.15, 0).imag(),
            -leaf_permittivity_at(0.6, 0.915e9, 295.15).imag());
}

TEST(LeafPermittivity, AtItsOwnTemperatureIsNearTheFit) {
  // two models of the same water, 22 degC: within 5 % of the mixture
  const Complex fit = leaf_permittivity(0.6, 2.45e9);
  const Complex extended = leaf_permittivity_at(0.6, 2.45e9, 295.15);
  EXPECT_NEAR(std::abs(extended - fit) / std::abs(fit), 0, 0.05);
}

TEST(WheatPermittivity, RisesWithMoistureAndDensity) {
  for (double M = 0.10; M < 0.25; M += 0.01) {
    EXPECT_GT(wheat_permittivity(M + 0.01, 760, 2.45e9).real(),
              wheat_permittivity(M, 760, 2.45e9).real());
    EXPECT_GT(-wheat_permittivity(M + 0.01, 760, 2.45e9).imag(),
              -wheat_permittivity(M, 760, 2.45e9).imag());
    EXPECT_GT(wheat_permittivity(M, 800, 2.45e9).real(), wheat_permittivity(M, 760, 2.45e9).real());
  }
}

TEST(MoistMineral, IsContinuousAtTheTransitionAndHeldAtFullPores) {
  const MineralBody sand{0.95, 0.02, 1550, 2650};
  double before = moist_mineral_permittivity(sand, 0, water).real();
  for (double X = 0.001; X < 0.25; X += 0.001) {
    const double now = moist_mineral_permittivity(sand, X, water).real();
    EXPECT_GE(now, before);
    EXPECT_LT(now - before, 0.2);  // 1550 kg/m3 times 0.001 times eps' of water is 0.12
    before = now;
  }
  const double full = (1 - 1550.0 / 2650) / 1.55;
  EXPECT_EQ(moist_mineral_permittivity(sand, full + 0.1, water),
            moist_mineral_permittivity(sand, full + 0.2, water));
}

TEST(SegmentedPermittivity, MeetsAtTheCriticalMoisture) {
  const SegmentedPermittivity model{0.12, {1.6, 2, 10}, {0.2, 1, 8}};
  const Complex at = segmented_permittivity(model, 0.12);
  EXPECT_NEAR(at.real(), 1.6 * 1.6, 1e-12);
  EXPECT_NEAR(-at.imag(), 0.2, 1e-12);
  EXPECT_NEAR(segmented_permittivity(model, 0.22).real(), 2.6 * 2.6, 1e-12);
  EXPECT_NEAR(-segmented_permittivity(model, 0.02).imag(), 0.1, 1e-12);
  const SegmentedPermittivity steep{0.5, {1.5, 4, 4}, {0.1, 2, 2}};
  EXPECT_EQ(segmented_permittivity(steep, 0), Complex(1, -0.0));
}

TEST(EstimatedPermittivity, StaysOrderedAndWithinTheWienerBounds) {
  const Composition board{700, 1500, {3.5, -0.1}, 0.06, 0.1};
  for (double X = 0; X < 2; X += 0.05) {
    const PermittivityBand band = estimated_permittivity(board, X, water);
    expect_passive(band.low);
    EXPECT_LE(band.low.real(), band.nominal.real() + 1e-12);
    EXPECT_LE(band.nominal.real(), band.high.real() + 1e-12);
    EXPECT_LE(-band.low.imag(), -band.nominal.imag() + 1e-12);
    EXPECT_LE(-band.nominal.imag(), -band.high.imag() + 1e-12);
    EXPECT_EQ(band.pores_full, 0.7 * X > 1 - 700.0 / 1500) << X;
  }
}

TEST(EstimatedPermittivity, OfASheetOfFibresIsTheGeometricMean) {
  Composition sheet{450, 1500, {3.5, -0.1}, 0.10, 0.1};
  const PermittivityBand plain = estimated_permittivity(sheet, 0.2, water);
  sheet.fibrous_sheet = true;
  const PermittivityBand across = estimated_permittivity(sheet, 0.2, water);
  EXPECT_NEAR(std::abs(across.nominal * across.nominal - plain.low * plain.nominal), 0, 1e-12);
  EXPECT_EQ(across.low, plain.low);
}

TEST(EstimatedPermittivity, OfDryPoresIsTheSolidWithAir) {
  const Composition tile{900, 2320, {5, -0.05}, 0.01, 0.3};
  const double v = 900.0 / 2320;
  const std::array<Constituent, 2> parts{{{v, {5, -0.05}}, {1 - v, 1.0}}};
  EXPECT_NEAR(std::abs(estimated_permittivity(tile, 0, water).nominal - looyenga(parts)), 0, 1e-12);
}

TEST(DielectricForms, RefuseWhatTheyDoNotCover) {
  EXPECT_THROW((void)leaf_permittivity(0.75, 2.45e9), Error);
  EXPECT_THROW((void)leaf_permittivity(nan, 2.45e9), Error);
  EXPECT_THROW((void)produce_permittivity(0.3, 0.01, 300), Error);
  EXPECT_THROW((void)produce_permittivity(0.8, 0.01, nan), Error);
  EXPECT_THROW((void)wheat_permittivity(0.5, 760, 2.45e9), Error);
  EXPECT_THROW((void)wheat_permittivity(0.15, 760, 5.8e9), Error);
  EXPECT_THROW((void)moist_mineral_permittivity({0.8, 0.4, 1550, 2650}, 0.1, water), Error);
  EXPECT_THROW((void)moist_mineral_permittivity({0.8, 0.1, 2700, 2650}, 0.1, water), Error);
  EXPECT_THROW((void)moist_mineral_permittivity({0.8, 0.1, 1550, 2650}, -0.1, water), Error);
  EXPECT_THROW((void)board_permittivity(board::concrete, 0.433e9), Error);
  EXPECT_NO_THROW((void)board_permittivity(board::concrete, 0.915e9));
  EXPECT_THROW((void)segmented_permittivity({0.1, {1.5, 1, 1}, {0.1, 1, 1}}, nan), Error);
  EXPECT_THROW((void)estimated_permittivity({1600, 1500, {3.5, -0.1}}, 0.1, water), Error);
  EXPECT_THROW((void)estimated_permittivity({700, 1500, {3.5, -0.1}}, nan, water), Error);
}

}  // namespace lossline::product
