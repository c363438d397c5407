#include "planner/march/belt_system.h"

#include <gtest/gtest.h>

#include <limits>

namespace lossline::march {
namespace {

bed::BedMaterial wet_solid() {
  bed::BedMaterial m;
  m.sorption = std::make_shared<const product::Sorption>(product::Sorption::free_water());
  m.heat_capacity = 1300;
  m.dry_density = 500;
  m.conductivity = 0.2;
  m.conductivity_slope = 0.4;
  m.diffusivity = 1e-9;
  m.diffusivity_activation = 2e4;
  m.diffusivity_half_moisture = 0.05;
  m.permeability = 1e-10;
  m.vapour_factor = 0.2;
  m.saturation_moisture = 2.0;
  return m;
}

/// A segment of `seconds` residence at 1 m/s, no air, no field; callers change what they test.
BeltSystem still(const bed::BedMaterial& material, double seconds) {
  BeltSystem s;
  s.material = &material;
  s.around.dry_areal_mass = 10;
  s.speed = 1;
  s.x0 = 0;
  s.x1 = seconds;
  return s;
}

State start(const bed::BedMaterial& m, double T, double moisture, double cure = 0) {
  State y{};
  y[X] = moisture;
  y[alpha] = cure;
  y[E] = bed::enthalpy(m, T, moisture, cure);
  return y;
}

double temperature_of(const bed::BedMaterial& m, const State& y) {
  return bed::temperature(m, y[E], y[X], y[alpha]);
}

void run(const BeltSystem& system, State& y, double tolerance = 1e-8) {
  constexpr double free = std::numeric_limits<double>::infinity();
  const State floor{1e5 * tolerance, tolerance, tolerance, 1e4 * tolerance,
                    tolerance,       free,      free,      free};
  numerics::StepCount count;
  double h = 1e-3 * (system.x1 - system.x0);
  ASSERT_EQ(
      numerics::integrate(system, system.x0, system.x1, y, floor, {tolerance, 100000}, h, count),
      numerics::StepOutcome::reached);
}

}  // namespace

// Identity: sealed product heated by q alone warms by q t / (M (cs + cw X)).
TEST(BeltSystem, HeatsASealedProductByItsHeatCapacity) {
  bed::BedMaterial m = wet_solid();
  m.permeability = 0;
  BeltSystem s = still(m, 100);
  s.q0 = s.q1 = 2000;
  State y = start(m, 293.15, 0.5);
  run(s, y);
  const double rise = 2000.0 * 100 / (10 * (1300 + 0.5 * water::liquid_heat_capacity));
  EXPECT_NEAR(temperature_of(m, y) - 293.15, rise, 1e-7);
  EXPECT_NEAR(y[X], 0.5, 1e-12);
}

// Limit: with wide-open pores the product boils at the boiling point of the chamber and gives off
// heat over (vapour less liquid enthalpy). The overpressure that drives the outflow and its smooth
// start (0.3 % of P) are real parts of the model, hence 3e-3 on T and 1.5 % on the rate.
TEST(BeltSystem, BoilsAtTheChamberPressure) {
  for (const double P : {101325.0, 20000.0}) {
    bed::BedMaterial m = wet_solid();
    const double boiling = water::fast_boiling_temperature(P);
    BeltSystem s = still(m, 400);
    s.around.pressure = P;
    s.q0 = s.q1 = 5000;
    State y = start(m, boiling - 5, 1.0);
    run(s, y);
    State rate{};
    s.rate(s.x1, y, rate);
    EXPECT_NEAR(temperature_of(m, y) / boiling, 1.0, 3e-3) << P;
    const double latent = water::vapour_enthalpy(boiling) - water::liquid_enthalpy(boiling);
    EXPECT_NEAR(rate[water_out] / (5000 / latent), 1.0, 1.5e-2) << P;
  }
}

// Exact solution of the model's own balance: a very wet product in hot air rests at the wet bulb
// where the film's heat equals the latent heat, h (Ta - T) = beta (psi - psi_a) (hv - hl).
TEST(BeltSystem, RestsAtTheWetBulbInTheConstantRatePeriod) {
  bed::BedMaterial m = wet_solid();
  m.diffusivity = 1e-6;  // no inner resistance to moisture
  m.conductivity = 50;   // nor to heat
  BeltSystem s = still(m, 5000);
  s.around.dry_areal_mass = 5;
  s.around.heat_top = 30;
  s.air0 = {353.15, 0.02};
  State y = start(m, 300, 1.9);
  run(s, y);
  const double T = temperature_of(m, y), P = s.around.pressure;
  const double beta = bed::film_conductance(30, P);
  const double flow = beta * (bed::diffusion_potential(water::fast_saturation_pressure(T), P) -
                              bed::diffusion_potential(bed::vapour_pressure(0.02, P), P));
  const double latent = water::vapour_enthalpy(T) - water::liquid_enthalpy(T);
  EXPECT_NEAR(30 * (353.15 - T) / (flow * latent), 1.0, 2e-3);
  // A wet bulb of this model with other constants for water was computed to be 308.6674 K and
  // 5.516656e-4 kg/(m2 s); latent heats differ by 0.4 %, which is worth 0.1 K.
  EXPECT_NEAR(T, 308.6674, 0.2);
  State rate{};
  s.rate(s.x1, y, rate);
  EXPECT_NEAR(rate[water_out] / 5.516656e-4, 1.0, 0.01);
}

// Exact solution: order 1.5 at constant temperature, alpha = 1 - (1 + 0.5 k t)^-2; without heat of
// reaction and without exchange the temperature stays.
TEST(BeltSystem, CuresByTheClosedFormAtConstantTemperature) {
  bed::BedMaterial m = wet_solid();
  m.permeability = 0;
  product::NthOrder cure;
  cure.k.A = 0.01 * std::exp(5e4 / (gas_constant * 400));
  cure.k.E = 5e4;
  cure.n = 1.5;
  m.cure = cure;
  BeltSystem s = still(m, 600);
  State y = start(m, 400, 0.0);
  run(s, y, 1e-10);
  const double base = 1 + 0.5 * 0.01 * 600;
  EXPECT_NEAR(y[alpha], 1 - 1 / (base * base), 1e-7);
  EXPECT_NEAR(temperature_of(m, y), 400, 1e-9);
}

// Identity: adiabatic full cure warms the dry solid by heat of reaction over heat capacity.
TEST(BeltSystem, WarmsByTheHeatOfReaction) {
  bed::BedMaterial m = wet_solid();
  m.permeability = 0;
  m.heat_of_reaction = 260000;
  product::NthOrder cure;
  cure.k.A = 1e6;
  cure.k.E = 5e4;
  cure.n = 1;
  m.cure = cure;
  BeltSystem s = still(m, 2000);
  State y = start(m, 400, 0.0);
  run(s, y);
  EXPECT_NEAR(y[alpha], 1.0, 1e-6);
  EXPECT_NEAR(temperature_of(m, y) - 400, 260000.0 / 1300 * y[alpha], 1e-6);
}

// The stepper's order rests on an exact Jacobian: duals against central differences.
TEST(BeltSystem, HasTheJacobianOfItsRate) {
  bed::BedMaterial m = wet_solid();
  m.shrinkage = 0.3;
  m.heat_capacity_slope = 2;
  m.piece_dry_density = 800;
  m.piece_radius = 4e-3;
  m.void_share = 0.4;
  m.heat_of_reaction = 1e5;
  product::NthOrder cure;
  cure.k.A = 1e3;
  cure.k.E = 5e4;
  cure.n = 1.2;
  m.cure = cure;
  for (const bool through : {false, true}) {
    for (const double T : {310.0, 350.0, 373.3, 378.0}) {
      for (const double moisture : {0.02, 0.2, 0.9}) {
        BeltSystem s = still(m, 10);
        s.q0 = 1000;
        s.q1 = 3000;
        s.mode = AirMode::with_belt;
        s.air_flow = 0.5;
        s.around.heat_top = 25;
        s.around.heat_belt = 10;
        s.around.belt_open = 0.3;
        s.around.side_area = 0.4;
        s.around.through = through;
        s.around.through_flow = 0.2;
        s.around.piece_heat = 60;
        State y = start(m, T, moisture, 0.3);
        y[air_H] = water::air_enthalpy(350, 0.03);
        y[air_Y] = 0.03;
        numerics::Linearised<unknowns> lin;
        s.linearise(4, y, lin);
        const double scale[] = {1e3, 1e-3, 1e-1, 1e3, 1e-2};
        for (std::size_t j = 0; j < 5; ++j) {
          State up = y, down = y, f_up{}, f_down{};
          const double step = 1e-5 * scale[j];
          up[j] += step;
          down[j] -= step;
          s.rate(4, up, f_up);
          s.rate(4, down, f_down);
          for (std::size_t i = 0; i < unknowns; ++i) {
            const double difference = (f_up[i] - f_down[i]) / (2 * step);
            EXPECT_NEAR(lin.df_dy[i][j], difference,
                        1e-4 * std::abs(difference) + 1e-6 * std::abs(lin.f[i]) / scale[j])
                << "row " << i << " column " << j << " T " << T << " X " << moisture
                << (through ? " through" : " surface");
          }
        }
      }
    }
  }
}

}  // namespace lossline::march
