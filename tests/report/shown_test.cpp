#include "planner/report/shown.h"

#include <gtest/gtest.h>

#include <cmath>

#include "planner/report/trace.h"

namespace lossline::report {
namespace {

TEST(Shown, ConvertsToBothUnitSets) {
  EXPECT_NEAR(in_unit(Shown::temperature, 373.15, UnitSet::si_engineering), 100, 1e-9);
  EXPECT_NEAR(in_unit(Shown::temperature, 373.15, UnitSet::us_customary), 212, 1e-9);
  EXPECT_NEAR(in_unit(Shown::mass_rate, 1.0, UnitSet::us_customary), 7936.641, 1e-3);
  EXPECT_NEAR(in_unit(Shown::speed, 0.01, UnitSet::us_customary), 1.968504, 1e-6);
  EXPECT_NEAR(in_unit(Shown::pressure, 101325, UnitSet::us_customary), 14.69595, 1e-5);
  EXPECT_NEAR(in_unit(Shown::heating_rate, 1.0 / 60, UnitSet::us_customary), 1.8, 1e-12);
  EXPECT_NEAR(in_unit(Shown::energy_per_mass, 3.6e6, UnitSet::us_customary), 0.45359237, 1e-12);
  EXPECT_NEAR(in_unit(Shown::energy_per_product, 3.6e6, UnitSet::us_customary), 907.18474, 1e-8);
  EXPECT_NEAR(in_unit(Shown::areal_mass, 1.0, UnitSet::us_customary), 0.204816, 1e-6);
}

TEST(Shown, CutsToThreeFigures) {
  EXPECT_EQ(figures(0.067234), "0.0672");
  EXPECT_EQ(figures(61.24), "61.2");
  EXPECT_EQ(figures(1202.7), "1203");
  EXPECT_EQ(figures(0), "0");
  EXPECT_EQ(figures(std::nan("")), "?");
  EXPECT_EQ(both_bases(1.0 / 3), "25.0 % wb (0.333 db)");
}

TEST(Trace, RisesWithItsCurveAndMarksAStep) {
  EXPECT_EQ(trace({0, 1}, {0, 1}, 8, false), "_.:-=+*#");
  EXPECT_EQ(trace({0, 1, 1, 2}, {0, 0, 5, 5}, 4, false), "__##");
  EXPECT_EQ(trace({0, 1}, {3, 3}, 3, false), "___");
  EXPECT_EQ(trace({0}, {3}, 3, false), "");
  EXPECT_EQ(trace({0, 1}, {0, std::nan("")}, 3, false), "");
}

TEST(Trace, BarsAreNeverLongerThanTold) {
  EXPECT_EQ(bar(0.5, 4, false), "##");
  EXPECT_EQ(bar(7, 4, false), "####");
  EXPECT_EQ(bar(0.001, 4, false), ".");
  EXPECT_EQ(bar(-1, 4, false), "");
}

}  // namespace
}  // namespace lossline::report
