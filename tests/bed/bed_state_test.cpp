#include "planner/bed/bed_state.h"

#include <gtest/gtest.h>

namespace lossline::bed {
namespace {

BedMaterial oswin_solid(double slope) {
  product::Oswin oswin;
  oswin.k0 = 0.10;
  oswin.n0 = 0.4;
  BedMaterial m;
  m.sorption = std::make_shared<const product::Sorption>(
      product::Sorption(product::Isotherm(oswin), 330, product::SorptionHeat{3e5, 0.08}));
  m.heat_capacity = 1400;
  m.heat_capacity_slope = slope;
  m.heat_of_reaction = 5e4;
  return m;
}

}  // namespace

TEST(BedState, GivesBackTheTemperatureItsEnthalpyWasMadeFrom) {
  for (const double slope : {0.0, 3.0, -1.0}) {
    const BedMaterial m = oswin_solid(slope);
    for (double T = 260; T <= 480; T += 20)
      for (const double X : {0.0, 0.03, 0.4, 1.5})
        for (const double a : {0.0, 0.6, 1.0})
          EXPECT_NEAR(temperature(m, enthalpy(m, T, X, a), X, a), T, 1e-9)
              << "slope " << slope << " X " << X;
  }
}

TEST(BedState, CostsTheHeatOfSorptionToRemoveBoundWater) {
  // At constant temperature the enthalpy of the wet solid falls by (cw t - q_net) per water
  // removed.
  const BedMaterial m = oswin_solid(0);
  const double T = 330, h = 1e-6;
  for (const double X : {0.02, 0.1, 0.3}) {
    const double slope = (enthalpy(m, T, X + h, 0) - enthalpy(m, T, X - h, 0)) / (2 * h);
    const double expected = water::liquid_enthalpy(T) - m.sorption->net_heat(X).value;
    EXPECT_NEAR(slope, expected, 1e-4 * std::abs(expected)) << X;
  }
}

TEST(BedState, TakesTheQuadraticRootThatIsContinuousAtZeroSlope) {
  const BedMaterial flat = oswin_solid(0), nearly = oswin_solid(1e-9);
  const double E = enthalpy(flat, 350, 0.2, 0);
  EXPECT_NEAR(temperature(nearly, E, 0.2, 0.0), temperature(flat, E, 0.2, 0.0), 1e-6);
}

}  // namespace lossline::bed
