// Water and steam against IAPWS R7-97(2012), Revised Release on the IAPWS Industrial Formulation
// 1997 for the Thermodynamic Properties of Water and Steam [IF97], and against a table made with an
// independent implementation of it (data/sat_water_if97.csv, heading line).

#include <gtest/gtest.h>

#include <cmath>
#include <string>

#include "planner/base/constants.h"
#include "planner/water/bed_water.h"
#include "planner/water/if97.h"
#include "tests/published/product_csv.h"

namespace lossline::water {

// The release prints nine significant digits: half a unit in the last one.
double half_digit(double printed) {
  return 0.5 * std::pow(10.0, std::floor(std::log10(std::abs(printed))) - 8);
}
void expect_printed(double got, double printed, const char* what) {
  EXPECT_NEAR(got, printed, half_digit(printed)) << what;
}

TEST(SaturationPressure, MatchesIf97Table35) {
  expect_printed(saturation_pressure(300) * 1e-6, 0.353658941e-2, "300 K");
  expect_printed(saturation_pressure(500) * 1e-6, 0.263889776e1, "500 K");
  expect_printed(saturation_pressure(600) * 1e-6, 0.123443146e2, "600 K");
}

TEST(SaturationTemperature, MatchesIf97Table36) {
  expect_printed(saturation_temperature(0.1e6), 372.755919, "0.1 MPa");
  expect_printed(saturation_temperature(1e6), 453.035632, "1 MPa");
  expect_printed(saturation_temperature(10e6), 584.149488, "10 MPa");
}

void expect_state(const PhaseState& got, double v, double h_kJ, double cp_kJ, const char* what) {
  expect_printed(got.volume, v, what);
  expect_printed(got.enthalpy * 1e-3, h_kJ, what);
  expect_printed(got.heat_capacity * 1e-3, cp_kJ, what);
}

TEST(LiquidState, MatchesIf97Table5) {
  expect_state(liquid_state(300, 3e6), 0.100215168e-2, 0.115331273e3, 0.417301218e1, "300 K 3 MPa");
  expect_state(liquid_state(300, 80e6), 0.971180894e-3, 0.184142828e3, 0.401008987e1,
               "300 K 80 MPa");
  expect_state(liquid_state(500, 3e6), 0.120241800e-2, 0.975542239e3, 0.465580682e1, "500 K 3 MPa");
}

TEST(VapourState, MatchesIf97Table15) {
  expect_state(vapour_state(300, 0.0035e6), 0.394913866e2, 0.254991145e4, 0.191300162e1,
               "300 K 0.0035 MPa");
  expect_state(vapour_state(700, 0.0035e6), 0.923015898e2, 0.333568375e4, 0.208141274e1,
               "700 K 0.0035 MPa");
  expect_state(vapour_state(700, 30e6), 0.542946619e-2, 0.263149474e4, 0.103505092e2,
               "700 K 30 MPa");
}

// Printed to 0.01 kJ/kg.
TEST(LatentHeat, MatchesTheSteamTables) {
  struct Row {
    double celsius, kJ;
  };
  for (const Row& row : {Row{20, 2453.55}, Row{40, 2406.00}, Row{60, 2357.69}, Row{80, 2308.07},
                         Row{100, 2256.47}, Row{120, 2202.15}, Row{150, 2113.67}}) {
    const double T = row.celsius + celsius_zero;
    EXPECT_NEAR(latent_heat(T) * 1e-3, row.kJ, 0.006) << row.celsius;
    // The short polynomials of the solver: 0.1 %, the spread between steam-table formulations.
    EXPECT_NEAR((vapour_enthalpy(T) - liquid_enthalpy(T)) * 1e-3 / row.kJ, 1, 1e-3) << row.celsius;
  }
}

// 91 temperatures from 0.01 to 180 degC; printed to six significant digits (pressure) and 0.1 J/kg.
TEST(BoilingLine, MatchesTheTableOfAnIndependentImplementation) {
  const auto rows = test::table("sat_water_if97.csv");
  ASSERT_EQ(rows.size(), 91U);
  for (const auto& row : rows) {
    const double celsius = std::stod(row[0]), T = celsius + celsius_zero;
    EXPECT_NEAR(saturation_pressure(T) * 1e-3 / std::stod(row[1]), 1, 5e-6) << row[0];
    const double p = saturation_pressure(T);
    EXPECT_NEAR(1 / liquid_state(T, p).volume, std::stod(row[2]), 6e-6) << row[0];
    EXPECT_NEAR(1 / vapour_state(T, p).volume / std::stod(row[3]), 1, 6e-6) << row[0];
    EXPECT_NEAR(saturated_liquid_enthalpy(T) * 1e-3, std::stod(row[4]), 6e-5) << row[0];
    EXPECT_NEAR(saturated_vapour_enthalpy(T) * 1e-3, std::stod(row[5]), 6e-5) << row[0];
    EXPECT_NEAR(latent_heat(T) * 1e-3, std::stod(row[6]), 6e-5) << row[0];
    EXPECT_NEAR(liquid_state(T, p).heat_capacity * 1e-3, std::stod(row[8]), 6e-6) << row[0];
    EXPECT_NEAR(vapour_state(T, p).heat_capacity * 1e-3, std::stod(row[9]), 6e-6) << row[0];
    if (celsius >= 20 && celsius <= 150) {
      EXPECT_NEAR((vapour_enthalpy(T) - liquid_enthalpy(T)) * 1e-3 / std::stod(row[6]), 1, 1e-3)
          << row[0];
    }
  }
}

TEST(SaturationTemperature, GivesTheNormalBoilingPoint) {
  EXPECT_NEAR(saturation_temperature(standard_pressure) - celsius_zero, 99.974, 0.0006);
  EXPECT_NEAR(fast_boiling_temperature(standard_pressure) - celsius_zero, 99.974, 0.0006);
}

// Least energy to evaporate a kilogram: latent heat alone at 100 degC, 0.62680 kWh/kg; liquid of 20
// (25) degC to vapour at 99.974 degC, one atmosphere, 0.71987 (0.71406) kWh/kg; [IF97], five
// printed digits. The solver's polynomials: 0.1 %.
TEST(EnergyFloor, FollowsFromTheSteamTablesAndIsKeptByTheSolversPolynomials) {
  const double kWh = 3.6e6, boiling = saturation_temperature(standard_pressure);
  EXPECT_NEAR(latent_heat(373.15) / kWh, 0.62680, 6e-6);
  EXPECT_NEAR((vapour_enthalpy(373.15) - liquid_enthalpy(373.15)) / kWh / 0.62680, 1, 1e-3);
  struct Row {
    double celsius, floor;
  };
  for (const Row& row : {Row{20, 0.71987}, Row{25, 0.71406}}) {
    const double T = row.celsius + celsius_zero;
    const double exact =
        saturated_vapour_enthalpy(boiling) - liquid_state(T, standard_pressure).enthalpy;
    EXPECT_NEAR(exact / kWh, row.floor, 6e-6);
    EXPECT_NEAR((vapour_enthalpy(boiling) - liquid_enthalpy(T)) / kWh / row.floor, 1, 1e-3);
  }
}

// The ceiling is the reciprocal: 1.389 kg/h per kW from 20 degC, 1.595 from boiling; four digits.
TEST(EnergyFloor, IsTheReciprocalOfTheCeilingOnEvaporationPerKilowatt) {
  const double boiling = saturation_temperature(standard_pressure);
  const double from_20 =
      saturated_vapour_enthalpy(boiling) - liquid_state(293.15, standard_pressure).enthalpy;
  EXPECT_NEAR(3.6e6 / from_20, 1.389, 0.0006);
  EXPECT_NEAR(3.6e6 / latent_heat(373.15), 1.595, 0.0006);
}

}  // namespace lossline::water
