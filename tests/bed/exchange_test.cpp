#include "planner/bed/exchange.h"

#include <gtest/gtest.h>

#include "planner/bed/piece_film.h"

namespace lossline::bed {
namespace {

BedMaterial board() {
  BedMaterial m;
  m.sorption = std::make_shared<const product::Sorption>(product::Sorption::free_water());
  m.heat_capacity = 1400;
  m.dry_density = 500;
  m.conductivity = 0.2;
  m.diffusivity = 1e-9;
  m.diffusivity_half_moisture = 0.05;
  m.permeability = 1e-14;
  m.vapour_factor = 0.1;
  m.saturation_moisture = 1.5;
  m.piece_dry_density = 800;
  m.piece_radius = 4e-3;
  m.void_share = 0.4;
  return m;
}

Surroundings in_air() {
  Surroundings s;
  s.dry_areal_mass = 10;
  s.heat_top = 25;
  return s;
}

}  // namespace

// The driving forces join in value and slope where their branches meet: a step there would cost the
// stepper its order. One-sided differences over 1e-6 of the pressure, so slopes agree to 1e-5 of
// the curvature there.
TEST(Vapour, JoinsItsBranchesSmoothly) {
  const double P = 101325, h = 1e-6 * P;
  const auto check = [&](auto f, double at) {
    EXPECT_NEAR(f(at - 1e-9 * P), f(at + 1e-9 * P), 1e-6 * P);
    const double left = (f(at) - f(at - h)) / h, right = (f(at + h) - f(at)) / h;
    EXPECT_NEAR(left / right, 1.0, 2e-3);
  };
  check([&](double p) { return diffusion_potential(p, P); }, stefan_cap * P);
  check([&](double p) { return humidity_potential(p, P); }, humidity_cap * P);
  check([&](double p) { return overpressure(p, P); }, P * (1 + overpressure_width));
  EXPECT_EQ(overpressure(0.99 * P, P), 0.0);
}

TEST(Exchange, IsNothingInEquilibriumWithTheAir) {
  const BedMaterial m = board();
  const double T = 320, P = standard_pressure;
  // Air saturated at the product's temperature over free water: neither heat nor water moves.
  const double p = m.sorption->activity(0.5, T).a * water::fast_saturation_pressure(T);
  const double Y = water_molar_mass / dry_air_molar_mass * p / (P - p);
  const auto ex = surface_exchange<double>(m, in_air(), 0.5, T, T, Y);
  EXPECT_NEAR(ex.water, 0.0, 1e-12);
  EXPECT_NEAR(ex.heat, 0.0, 1e-12);
}

TEST(Exchange, CondensesOnAColdProduct) {
  const auto ex = surface_exchange<double>(board(), in_air(), 0.2, 290, 340, 0.1);
  EXPECT_LT(ex.water, 0);
  EXPECT_GT(ex.heat, 0);
}

TEST(Exchange, FallsWithTheDiffusivityWhenTheSurfaceIsDry) {
  BedMaterial m = board();
  m.vapour_factor = 1e-6;
  double last = 1e9;
  for (const double D : {1e-8, 1e-9, 1e-10, 1e-11}) {
    m.diffusivity = D;
    const auto ex = surface_exchange<double>(m, in_air(), 0.1, 330, 350, 0.01);
    EXPECT_LT(ex.water, last);
    EXPECT_LE(ex.surface_moisture, 0.1);
    last = ex.water;
  }
}

TEST(Exchange, BringsThroughAirToTheSurfaceOfALongBed) {
  // Many transfer units: the air leaves in equilibrium with the granules, w = G (Y* - Y).
  BedMaterial m = board();
  m.diffusivity = 1e-6;
  Surroundings s = in_air();
  s.through = true;
  s.through_flow = 0.05;
  s.piece_heat = 400;
  const double T = 320, Y = 0.01;
  const auto ex = through_exchange<double>(m, s, 0.5, T, 350, Y);
  const double p = water::fast_saturation_pressure(T);
  const double saturated = water_molar_mass / dry_air_molar_mass * p / (s.pressure - p);
  EXPECT_NEAR(ex.water, s.through_flow * (saturated - Y), 2e-3 * ex.water);
  EXPECT_NEAR(ex.heat, s.through_flow * (1006 + 1880 * Y) * (350 - T), 1e-6 * ex.heat);
}

// Wakao and Kaguei 1982: Nu -> 2 as the flow stops.
TEST(PieceFilm, TendsToConductionInStillAir) {
  const double k = 0.0241 * std::pow(300 / 273.15, 0.82);
  EXPECT_NEAR(granule_heat_transfer(1e-9, 0.008, 300), 2 * k / 0.008, 0.01);
  EXPECT_GT(granule_heat_transfer(0.2, 0.008, 300), granule_heat_transfer(0.1, 0.008, 300));
}

}  // namespace lossline::bed
